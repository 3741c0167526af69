import type { SolvedCase } from '../force-method/solve-redundants';
import type { Equilibrium } from '../statics/equilibrium';

/**
 * The largest force of a case, its loads among them, and what its strains and movements would call for in a member held
 * fast: what rounding is to be held against where all forces are none.
 */
export function sizeOfCase(eq: Equilibrium, c: SolvedCase): number {
  const strained = eq.bars.map(({ member, axis: { L } }, b) => {
    const local = c.load.local[b];
    if (!local) return 0;
    const part = Math.abs(local.strain) + Math.abs(local.curvature) * L + Math.abs(local.misfit) / L;
    return (part * member.EI) / L ** 2;
  });
  const stiffest = eq.bars.reduce((most, { member }) => Math.max(most, member.EI), 0);
  const moved = c.movements.map((m) => {
    const part = m.component === 'turn' ? m.value : m.value / eq.length;
    return (part * stiffest) / eq.length ** 2;
  });
  return largest(c.final, c.load.rows, strained, moved);
}

/** The largest number of some lists by size; zero of none. */
export function largest(...lists: Iterable<number>[]): number {
  let most = 0;
  for (const list of lists) for (const v of list) most = Math.max(most, Math.abs(v));
  return most;
}
