import type { PiecewisePolynomial } from '@/lib/engine/diagrams/piecewise-polynomial';
import { greatestOf, isConstant, rootsInside, slopeOf, valueOn } from './polynomial-curve';

/** A value that a diagram tells. `at`: an end of the member, or inside. */
export interface MarkedValue {
  s: number;
  value: number;
  at: 'start' | 'end' | 'inside';
}

/** Below this share of the greatest value of the diagram a value is not told. */
const least = 0.004;

/** Values at the ends, on both sides of jumps, at peaks and in the middle of constant stretches. */
export function markedValues(curve: PiecewisePolynomial, greatest: number): MarkedValue[] {
  const marks: MarkedValue[] = [];
  const put = (s: number, value: number, at: MarkedValue['at']) => {
    if (Math.abs(value) > least * greatest) marks.push({ s, value, at });
  };
  const same = (a: number, b: number) => Math.abs(a - b) <= 1e-7 * greatest;
  curve.forEach((piece, i) => {
    const [before, after] = [curve[i - 1], curve[i + 1]];
    const [a, b] = [valueOn(piece, piece.from), valueOn(piece, piece.to)];
    if (isConstant(piece) && same(a, b)) {
      const goesOn = before && isConstant(before) && same(valueOn(before, piece.from), a);
      if (!goesOn) put((piece.from + piece.to) / 2, a, 'inside');
      return;
    }
    if (!before) put(piece.from, a, 'start');
    else if (!same(valueOn(before, piece.from), a)) put(piece.from, a, 'inside');
    for (const s of rootsInside(slopeOf(piece))) put(s, valueOn(piece, s), 'inside');
    if (!after) put(piece.to, b, 'end');
    else if (!same(valueOn(after, piece.to), b)) put(piece.to, b, 'inside');
    else if (isPeak(curve, i)) put(piece.to, b, 'inside');
  });
  return marks;
}

/** Whether the diagram turns back where piece i meets the next. */
function isPeak(curve: PiecewisePolynomial, i: number): boolean {
  const [piece, after] = [curve[i], curve[i + 1]];
  if (!piece || !after) return false;
  // A little inside, since a smooth peak has no slope where the pieces meet.
  const left = valueOn(slopeOf(piece), piece.to - 1e-3 * (piece.to - piece.from));
  const right = valueOn(slopeOf(after), after.from + 1e-3 * (after.to - after.from));
  return left * right < 0;
}

/** Where the diagram passes through zero inside the member. */
export function zerosOf(curve: PiecewisePolynomial): number[] {
  const greatest = greatestOf(curve);
  const zeros = curve.flatMap(rootsInside);
  curve.slice(1).forEach((piece, i) => {
    const before = curve[i];
    if (!before) return;
    const [a, b] = [valueOn(before, before.to), valueOn(piece, piece.from)];
    if (Math.max(Math.abs(a), Math.abs(b)) < 1e-9 * greatest && greatest > 0) zeros.push(piece.from);
  });
  return zeros;
}
