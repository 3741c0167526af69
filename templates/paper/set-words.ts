import { breakRich } from '@/lib/typeset/break-rich';
import type { RichLine } from '@/lib/typeset/rich-line';
import type { Typesetter } from '@/lib/typeset/typesetter';
import type { Ink } from './ink';
import { baseline, type PaperTone, type TextLook } from './paper-look';

export type Side = 'left' | 'right' | 'centre';

/** A set line with the room it needs: its ink from its own top, and its height. */
export type SetLine = { readonly ink: Ink[]; readonly height: number; readonly width: number };

/** Air between a tall formula and the lines above and below it, points. */
const AIR = 1.2;

/** Sets rich text in lines of at most `width`, standing at x to the given side of that width. */
export function setLines(
  text: string,
  look: TextLook,
  tone: PaperTone,
  width: number,
  typesetter: Typesetter,
  side: Side = 'left',
): SetLine[] {
  return breakRich(text, look, width, typesetter).map((line) => {
    const share = side === 'left' ? 0 : side === 'right' ? 1 : 0.5;
    return setLine(line, look, tone, share * (width - line.width));
  });
}

function setLine(line: RichLine, look: TextLook, tone: PaperTone, x: number): SetLine {
  const y = Math.max(baseline(look), line.height + AIR);
  const below = Math.max(look.leading - baseline(look), line.depth + AIR);
  return { ink: lineInk(line, tone, x, y, look.tracking), height: y + below, width: line.width };
}

export function lineInk(line: RichLine, tone: PaperTone, x: number, y: number, tracking?: number): Ink[] {
  return line.items.map((item, index) => {
    const next = line.items[index + 1];
    const at = { x: x + item.x, y, size: item.size, tone };
    if (item.kind === 'math') return { kind: 'math', ...at, laid: item.laid, tex: item.tex };
    const space = next !== undefined && next.x - item.x - item.width > 0.5;
    return { kind: 'words', ...at, shaped: item.shaped, tracking, space };
  });
}

/** One line of plain words as ink with its baseline at (x, y); `side` says which end of it x is. */
export function wordInk(
  text: string,
  look: TextLook,
  tone: PaperTone,
  at: { x: number; y: number; side?: Side },
  typesetter: Typesetter,
): Ink & { kind: 'words' } {
  const shaped = typesetter.text(text, look.regular);
  const width = (shaped.width + (look.tracking ?? 0) * [...text].length) * look.size;
  const share = at.side === 'right' ? 1 : at.side === 'centre' ? 0.5 : 0;
  return {
    kind: 'words',
    x: at.x - share * width,
    y: at.y,
    size: look.size,
    shaped,
    tone,
    tracking: look.tracking,
  };
}
