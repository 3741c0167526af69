import { type Ink, moved } from './ink';
import type { SetLine } from './set-words';
import type { Strip } from './strip';

/** A strip without margin notes, to be filled in. */
export function plainStrip(
  block: string,
  height: number,
  ink: readonly Ink[],
  more: Partial<Strip> = {},
): Strip {
  return { block, height, before: 0, ink, keep: false, noteHeight: 0, ...more };
}

/** Lines one under another as one piece of ink. */
export function stackLines(lines: readonly SetLine[], x = 0, top = 0): { ink: Ink[]; height: number } {
  const ink: Ink[] = [];
  let y = top;
  for (const line of lines) {
    ink.push(...line.ink.map((mark) => moved(mark, x, y)));
    y += line.height;
  }
  return { ink, height: y - top };
}

/** Lines as strips that a page may break between, but for the first two and the last two. */
export function lineStrips(block: string, lines: readonly SetLine[], keepLast: boolean): Strip[] {
  return lines.map((line, index) => {
    const last = index === lines.length - 1;
    const keep = last ? keepLast : index === 0 || index === lines.length - 2;
    return plainStrip(block, line.height, line.ink, { keep });
  });
}
