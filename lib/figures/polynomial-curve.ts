import { extremes } from '@/lib/engine/diagrams/piecewise';
import type { Piece, PiecewisePolynomial } from '@/lib/engine/diagrams/piecewise-polynomial';
import { derive, evaluate } from '@/lib/engine/diagrams/polynomial';
import { rootsBetween } from '@/lib/engine/diagrams/roots';

/** Value of one piece at s. */
export const valueOn = ({ from, c }: Piece, s: number): number => evaluate(c, s - from);

export const slopeOf = ({ from, to, c }: Piece): Piece => ({ from, to, c: derive(c) });

/** Roots of a piece between its ends, the ends left out. */
export function rootsInside({ from, to, c }: Piece): number[] {
  const h = to - from;
  return rootsBetween(c, 0, h)
    .filter((x) => x > 1e-9 * h && x < (1 - 1e-9) * h)
    .map((x) => from + x);
}

/** The greatest amount of a curve, whatever its sign; nought where there is none. */
export function greatestOf(curve: PiecewisePolynomial): number {
  if (curve.length === 0) return 0;
  const { max, min } = extremes(curve);
  return Math.max(Math.abs(max.value), Math.abs(min.value));
}

/** Highest power whose share on the piece is not lost in rounding. */
function degree({ from, to, c }: Piece): number {
  const terms = c.map((v, k) => Math.abs(v) * (to - from) ** k);
  const greatest = Math.max(...terms, 0);
  return Math.max(
    0,
    terms.findLastIndex((t) => t > greatest * 1e-12),
  );
}

export const isConstant = (piece: Piece): boolean => degree(piece) === 0;

/** Control ordinates of cubic Bézier arcs over equal parts of [from, to]: s runs linearly along each. */
export interface Arc {
  from: number;
  to: number;
  ordinates: readonly [number, number, number, number];
}

/** Arcs of a piece: exact up to the third power (Bernstein form); above, six Hermite arcs. */
export function arcsOf(piece: Piece): Arc[] {
  const parts = degree(piece) <= 3 ? 1 : 6;
  const slope = slopeOf(piece);
  return Array.from({ length: parts }, (_, i) => {
    const at = (k: number) => piece.from + ((piece.to - piece.from) * k) / parts;
    const [from, to] = [at(i), at(i + 1)];
    const third = (to - from) / 3;
    const [a, b] = [valueOn(piece, from), valueOn(piece, to)];
    return { from, to, ordinates: [a, a + valueOn(slope, from) * third, b - valueOn(slope, to) * third, b] };
  });
}
