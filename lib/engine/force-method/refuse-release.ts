import type { Quantity } from '@/lib/model/quantity';
import type { Choice } from '../solution';
import { describeMechanism } from '../statics/describe-mechanism';
import type { Equilibrium } from '../statics/equilibrium';
import { mechanismOf } from '../statics/mechanism';
import { forceName, listed } from '../statics/name-force';
import { solveBasisTransposed } from '../statics/solve-lu';
import { tolerance } from '../tolerance';
import { sameForce } from './idle-release';
import type { PrimaryBasis } from './self-stress';

/**
 * The motion that releasing a set allows: the set opens by `opened`, everything else keeps its length and angle. The
 * joints move as the kept quantities of the known primary structure say.
 */
export function refuseRelease(
  eq: Equilibrium,
  proposed: PrimaryBasis,
  columns: readonly number[],
  opened: Float64Array,
): Extract<Choice, { good: false }> {
  const openings = new Map(columns.map((c, i) => [c, opened[i] as number]));
  const y = solveBasisTransposed(
    proposed.lu,
    proposed.lu.basis.map((q) => openings.get(q) ?? 0),
  );
  const largest = Math.max(...opened.map(Math.abs));
  const released = columns.filter((_, i) => Math.abs(opened[i] as number) > tolerance.fixed * largest);
  const names = released.map((q) => eq.quantities[q] as Quantity);
  const mechanism = mechanismOf(eq, y);
  const same = sameForce(eq, names, mechanism);
  if (same) return { good: false, code: 'same-force', message: same };
  const said = describeMechanism(
    eq,
    mechanism,
    columns.map((q) => eq.quantities[q] as Quantity),
  );
  const all = names.map((q) => forceName(eq, q));
  const who =
    all.length > 1 ? `${listed(all)} cannot be released together.` : `${all[0]} cannot be the redundant.`;
  return { good: false, code: said.code, message: `${who} ${said.message}`, mechanism };
}
