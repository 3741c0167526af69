import { cross, type Point, subtract } from './vector';

export type PathCommand = ['M' | 'L', Point] | ['C', Point, Point, Point] | ['Z'];

/** Hundredths of a point; no negative zero. */
export const round = (v: number): number => Math.round(v * 100) / 100 || 0;

/** SVG path data (SVG 1.1 §8.3), moved by `o`. */
export function pathData(commands: readonly PathCommand[], o: Point): string {
  const write = (p: Point) => `${round(p.x + o.x)} ${round(p.y + o.y)}`;
  return commands.map(([c, ...points]) => `${c}${points.map(write).join(' ')}`).join('');
}

/** The run of a path as straight pieces, eight to a curve. */
export function flatten(commands: readonly PathCommand[]): Point[] {
  const run: Point[] = [];
  for (const command of commands) {
    if (command[0] === 'Z') continue;
    if (command[0] !== 'C') {
      run.push(command[1]);
      continue;
    }
    const [, b, c, d] = command;
    const a = run.at(-1) ?? b;
    const bent =
      Math.abs(cross(subtract(b, a), subtract(d, a))) + Math.abs(cross(subtract(c, a), subtract(d, a)));
    const pieces = bent < 1e-6 ? 1 : 8;
    for (let i = 1; i <= pieces; i++) {
      const t = i / pieces;
      const w = [(1 - t) ** 3, 3 * t * (1 - t) ** 2, 3 * t * t * (1 - t), t ** 3] as const;
      run.push({
        x: w[0] * a.x + w[1] * b.x + w[2] * c.x + w[3] * d.x,
        y: w[0] * a.y + w[1] * b.y + w[2] * c.y + w[3] * d.y,
      });
    }
  }
  return run;
}
