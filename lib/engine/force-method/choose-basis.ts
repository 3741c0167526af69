import type { Quantity } from '@/lib/model/quantity';
import type { Choice } from '../solution';
import type { Equilibrium } from '../statics/equilibrium';
import { solveBasis } from '../statics/solve-lu';
import { tolerance } from '../tolerance';
import type { PrimaryBasis, SelfStress } from './self-stress';
import { tryRedundants } from './try-redundants';

/** The primary structure that a choice of redundants leaves, or why it cannot be used. */
export type ChosenBasis = { good: true; basis: PrimaryBasis } | Extract<Choice, { good: false }>;

/** The primary structure of a chosen set, its unit states combined from those of the proposed set. */
export function chooseBasis(
  eq: Equilibrium,
  proposed: PrimaryBasis,
  quantities: readonly Quantity[],
): ChosenBasis {
  const tried = tryRedundants(eq, proposed, quantities);
  if (!tried.good) return tried;
  const { columns, lu } = tried;
  const basis: PrimaryBasis = { ...proposed, redundants: columns };
  if (proposed.local) return { good: true, basis };
  const states = columns.map((own, j) => {
    const right = new Float64Array(columns.length);
    right[j] = 1;
    const { z } = solveBasis(lu, right);
    return combine(eq, proposed.states, lu.basis, z, columns, own);
  });
  return { good: true, basis: { ...basis, states } };
}

/** Σ factor × state, with exact 1 and 0 at the redundants and without entries that are rounding. */
function combine(
  eq: Equilibrium,
  states: readonly SelfStress[],
  order: readonly number[],
  factors: Float64Array,
  redundants: readonly number[],
  own: number,
): SelfStress {
  const total = new Float64Array(eq.quantities.length);
  const size = new Float64Array(eq.quantities.length);
  order.forEach((i, k) => {
    const factor = factors[k] as number;
    if (factor === 0) return;
    for (const [q, v] of states[i] as SelfStress) {
      total[q] = (total[q] as number) + factor * v;
      size[q] = Math.max(size[q] as number, Math.abs(factor * v));
    }
  });
  for (const q of redundants) total[q] = 0;
  const kept: SelfStress = new Map([[own, 1]]);
  total.forEach((v, q) => {
    if (Math.abs(v) > tolerance.entry * (size[q] as number)) kept.set(q, v);
  });
  return kept;
}
