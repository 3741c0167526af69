import type { SolvedCase } from '../force-method/solve-redundants';
import type { Equilibrium } from '../statics/equilibrium';
import { largest, sizeOfCase } from './size-of-case';

/** One force found in two ways. */
export interface Pair {
  a: number;
  b: number;
  moment: boolean;
}

/** Moments below this part of force times length are those of a structure that hardly bends. */
const unbent = 1e-6;

/** How far two sets of forces of one case are apart: forces beside the largest force, moments beside the largest moment. */
export function difference(eq: Equilibrium, c: SolvedCase, pairs: readonly Pair[]): number {
  // Couples that cancel leave no force but moments in the member between them.
  const size = largest(
    [sizeOfCase(eq, c)],
    pairs.map((p) => (p.moment ? p.a / eq.length : p.a)),
  );
  if (size === 0) return largest(pairs.map((p) => p.b));
  // Beside a very short member forces are huge and moments are not: moments are held against moments.
  const bent = largest(pairs.map((p) => (p.moment ? p.a : 0)));
  const moment = Math.max(bent, unbent * size * eq.length);
  let off = 0;
  for (const p of pairs) off = Math.max(off, Math.abs(p.a - p.b) / (p.moment ? moment : size));
  return off;
}
