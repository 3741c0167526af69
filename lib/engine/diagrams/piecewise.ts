import type { Piece, PiecewisePolynomial } from './piecewise-polynomial';
import { add, type Coefficients, derive, evaluate, integrate, multiply, shift } from './polynomial';
import { rootsBetween } from './roots';

/** Value at s; where two pieces meet, the one on the given side. */
export function valueAt(f: PiecewisePolynomial, s: number, side: 'left' | 'right' = 'right'): number {
  const piece = side === 'right' ? lastPiece(f, (p) => p.from <= s) : f.find((p) => s <= p.to);
  const found = piece ?? (side === 'right' ? f[0] : f[f.length - 1]);
  if (!found) throw new Error('a diagram without pieces has no value');
  return evaluate(found.c, s - found.from);
}

function lastPiece(f: PiecewisePolynomial, test: (p: Piece) => boolean): Piece | undefined {
  for (let i = f.length - 1; i >= 0; i--) {
    const piece = f[i];
    if (piece && test(piece)) return piece;
  }
  return undefined;
}

/** The places where pieces begin and end, in order. */
export function breaks(f: PiecewisePolynomial): number[] {
  return [...f.map((p) => p.from), ...f.slice(-1).map((p) => p.to)];
}

/** The same function cut at further places. */
export function cutAt(f: PiecewisePolynomial, places: readonly number[]): readonly Piece[] {
  const inside = (p: Piece) => places.filter((s) => s > p.from && s < p.to);
  if (f.every((p) => !places.some((s) => s > p.from && s < p.to))) return f;
  return f.flatMap((p) => {
    const inner = [...new Set(inside(p))].sort((a, b) => a - b);
    const ends = [p.from, ...inner, p.to];
    return ends.slice(1).map((to, i) => {
      const from = ends[i] as number;
      return { from, to, c: from === p.from ? p.c : shift(p.c, from - p.from) };
    });
  });
}

/** Σ factor · f, on the union of all breaks. */
export function sum(terms: readonly { f: PiecewisePolynomial; factor: number }[]): Piece[] {
  const [first, ...others] = terms;
  if (!first) return [];
  const alike = others.every(({ f }) => sameBreaks(f, first.f));
  const places = alike ? [] : terms.flatMap((t) => breaks(t.f));
  const cut = terms.map((t) => ({ pieces: cutAt(t.f, places), factor: t.factor }));
  return cutAt(first.f, places).map((p, i) => ({
    from: p.from,
    to: p.to,
    c: cut.reduce<Coefficients>((c, t) => add(c, (t.pieces[i] as Piece).c, t.factor), []),
  }));
}

function sameBreaks(f: PiecewisePolynomial, g: PiecewisePolynomial): boolean {
  return f.length === g.length && f.every((p, i) => p.from === g[i]?.from && p.to === g[i]?.to);
}

/** Antiderivative, continuous, with value `start` at the beginning. */
export function integral(f: PiecewisePolynomial, start: number): Piece[] {
  let value = start;
  return f.map((p) => {
    const c = integrate(p.c, value);
    value = evaluate(c, p.to - p.from);
    return { from: p.from, to: p.to, c };
  });
}

/** Slope of every piece; jumps leave no trace. */
export function derivative(f: PiecewisePolynomial): Piece[] {
  return f.map((p) => ({ from: p.from, to: p.to, c: derive(p.c) }));
}

/** ∫ f g over the member. */
export function integralOfProduct(f: PiecewisePolynomial, g: PiecewisePolynomial): number {
  const a = cutAt(f, breaks(g));
  const b = cutAt(g, breaks(f));
  return a.reduce((total, p, i) => {
    const c = integrate(multiply(p.c, (b[i] as Piece).c), 0);
    return total + evaluate(c, p.to - p.from);
  }, 0);
}

export interface Place {
  s: number;
  value: number;
}

/** Greatest and least value with their places: ends and jumps of pieces and zeros of the slope are all there can be. */
export function extremes(f: PiecewisePolynomial): { max: Place; min: Place } {
  const [first] = f;
  if (!first) throw new Error('a diagram without pieces has no extreme');
  let max: Place = { s: first.from, value: evaluate(first.c, 0) };
  let min = max;
  const look = (p: Piece, x: number) => {
    const value = evaluate(p.c, x);
    if (value > max.value) max = { s: p.from + x, value };
    if (value < min.value) min = { s: p.from + x, value };
  };
  for (const p of f) {
    const h = p.to - p.from;
    look(p, 0);
    if (p.c.length > 2) for (const x of rootsBetween(derive(p.c), 0, h)) look(p, x);
    look(p, h);
  }
  return { max, min };
}

/** Places where the function is zero or jumps through zero; stretches that are zero throughout are left out. */
export function zeros(f: PiecewisePolynomial): number[] {
  const found: number[] = [];
  f.forEach((p, i) => {
    found.push(...rootsBetween(p.c, 0, p.to - p.from).map((x) => p.from + x));
    const next = f[i + 1];
    if (next && evaluate(p.c, p.to - p.from) * evaluate(next.c, 0) < 0) found.push(p.to);
  });
  return [...new Set(found)].sort((a, b) => a - b);
}

/** The part of the function between two places. */
export function between(f: PiecewisePolynomial, from: number, to: number): readonly Piece[] {
  return cutAt(f, [from, to]).filter((p) => p.from >= from && p.to <= to);
}
