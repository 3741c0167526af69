import type { Piece, PiecewisePolynomial } from '@/lib/engine/diagrams/piecewise-polynomial';

/** Value of one piece at s (Horner). */
export function valueAt({ from, c }: Piece, s: number): number {
  let v = 0;
  for (let k = c.length - 1; k >= 0; k--) v = v * (s - from) + (c[k] ?? 0);
  return v;
}

export function derivative({ from, to, c }: Piece): Piece {
  return { from, to, c: c.slice(1).map((v, k) => v * (k + 1)) };
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

/**
 * Where a piece changes its sign inside its stretch, ascending. Between two neighbouring stationary points a
 * polynomial is monotone, so each sign change there is one root, found by bisection to the last bit.
 */
export function signChanges(piece: Piece): number[] {
  if (degree(piece) === 0) return [];
  const stops = [piece.from, ...signChanges(derivative(piece)), piece.to];
  const roots: number[] = [];
  for (let i = 1; i < stops.length; i++) {
    let [a, b] = [stops[i - 1] as number, stops[i] as number];
    const sign = Math.sign(valueAt(piece, a));
    if (sign * Math.sign(valueAt(piece, b)) >= 0) continue;
    for (let n = 0; n < 80 && b - a > 0; n++) {
      const m = (a + b) / 2;
      if (m === a || m === b) break;
      if (Math.sign(valueAt(piece, m)) === sign) a = m;
      else b = m;
    }
    roots.push((a + b) / 2);
  }
  return roots;
}

export function greatestOf(curve: PiecewisePolynomial): number {
  let greatest = 0;
  for (const piece of curve) {
    for (const s of [piece.from, ...signChanges(derivative(piece)), piece.to]) {
      greatest = Math.max(greatest, Math.abs(valueAt(piece, s)));
    }
  }
  return greatest;
}

export function isConstant(piece: Piece): boolean {
  return degree(piece) === 0;
}

/** Control ordinates of cubic Bézier arcs over equal parts of [from, to]: s runs linearly along each. */
export interface Arc {
  from: number;
  to: number;
  ordinates: readonly [number, number, number, number];
}

/** Arcs of a piece: exact up to the third power (Bernstein form); above, six Hermite arcs. */
export function arcsOf(piece: Piece): Arc[] {
  const parts = degree(piece) <= 3 ? 1 : 6;
  const slope = derivative(piece);
  return Array.from({ length: parts }, (_, i) => {
    const at = (k: number) => piece.from + ((piece.to - piece.from) * k) / parts;
    const [from, to] = [at(i), at(i + 1)];
    const third = (to - from) / 3;
    const [a, b] = [valueAt(piece, from), valueAt(piece, to)];
    return { from, to, ordinates: [a, a + valueAt(slope, from) * third, b - valueAt(slope, to) * third, b] };
  });
}

/** Value of a piecewise polynomial at s; where pieces jump, of the one on the left. */
export function curveAt(curve: PiecewisePolynomial, s: number): number {
  const piece = curve.find((p) => s <= p.to) ?? curve.at(-1);
  return piece ? valueAt(piece, s) : 0;
}

export function slopeAt(curve: PiecewisePolynomial, s: number): number {
  return curveAt(curve.map(derivative), s);
}
