import type { PrimaryBasis } from '../force-method/self-stress';
import type { SolvedForces } from '../force-method/solve-redundants';
import type { Determinacy } from '../solution';
import { tolerance } from '../tolerance';
import type { Equilibrium } from './equilibrium';

/** The count of the structure and the rank of its equilibrium matrix. */
export function describeDeterminacy(eq: Equilibrium, basis: PrimaryBasis, solved: SolvedForces): Determinacy {
  const { joints, members } = eq.analysis;
  const open = solved.cases.values().next().value?.open ?? new Set<number>();
  const openAxial = new Set<string>();
  for (const i of open) {
    for (const b of solved.units[i]?.members.keys() ?? []) openAxial.add(eq.bars[b]?.member.id as string);
  }
  return {
    members: members.length,
    joints: joints.length,
    reactions: eq.quantities.filter((q) => q.kind === 'reaction').length,
    releases: members.reduce(
      (n, m) => n + (m.releases ? m.releases.start.length + m.releases.end.length : 0),
      0,
    ),
    unknowns: eq.quantities.length,
    equations: eq.rowCount - eq.trivialRows.size,
    rank: basis.lu.basis.length,
    degree: basis.redundants.length,
    bendingDegree: basis.redundants.length - open.size,
    openAxial: [...openAxial],
    smallestPivot: basis.lu.smallestPivot,
    tolerance: tolerance.pivot,
  };
}
