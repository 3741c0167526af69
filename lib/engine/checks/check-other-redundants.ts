import { otherBasis } from '../force-method/other-basis';
import type { PrimaryBasis } from '../force-method/self-stress';
import { type SolvedForces, solveRedundants } from '../force-method/solve-redundants';
import type { Solution } from '../solution';
import type { Equilibrium } from '../statics/equilibrium';
import { checkOf } from './check-of';
import { difference } from './difference';

/**
 * The structure solved once more with other redundants, as few of the first among them as can be: which they are, how
 * well conditioned, and how far the forces of every case are from those of the first. Undefined where nothing is
 * redundant and where no other set is fairly conditioned.
 */
export function checkOtherRedundants(
  eq: Equilibrium,
  basis: PrimaryBasis,
  solved: SolvedForces,
  EI0: number,
): (Solution['other'] & { checks: Solution['checks'] }) | undefined {
  const other = otherBasis(eq, basis);
  if (!other) return undefined;
  const again = solveRedundants(eq, other, eq.analysis.cases, EI0);
  const checks = [...solved.cases].map(([id, c]) => {
    const second = again?.cases.get(id)?.final;
    const pairs = eq.quantities.map((q, i) => ({
      a: (c.final[i] as number) * (eq.scale[i] as number),
      b: second === undefined ? Number.NaN : (second[i] as number) * (eq.scale[i] as number),
      moment: q.kind === 'moment' || (q.kind === 'reaction' && q.component === 'turn'),
    }));
    const residual = second ? difference(eq, c, pairs) : Number.POSITIVE_INFINITY;
    return checkOf('other-redundants', 'other redundants give the same forces', residual, id);
  });
  const redundants = other.redundants.map((q) => eq.quantities[q] as Solution['redundants'][number]);
  return { redundants, condition: again?.condition ?? Number.POSITIVE_INFINITY, checks };
}
