import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { Solution } from '../solution';
import { equilibrium } from '../statics/equilibrium';

/** Every quantity that could be among the redundants: those of the structure that equilibrium alone does not fix. */
export function proposedChoices(solution: Solution): Quantity[] {
  const fixed = new Set(solution.fixed.map((f) => quantityKey(f.quantity)));
  return equilibrium(solution.analysis).quantities.filter((q) => !fixed.has(quantityKey(q)));
}
