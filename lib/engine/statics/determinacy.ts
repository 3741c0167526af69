import { openMembers } from '../force-method/open-axial';
import type { PrimaryBasis } from '../force-method/self-stress';
import type { Determinacy } from '../solution';
import { tolerance } from '../tolerance';
import type { Equilibrium } from './equilibrium';

/** The count of the structure and the rank of its equilibrium matrix. */
export function describeDeterminacy(eq: Equilibrium, basis: PrimaryBasis): Determinacy {
  const { joints, members } = eq.analysis;
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
    degree: basis.redundants.length + basis.open.length,
    bendingDegree: basis.redundants.length,
    openAxial: openMembers(eq, basis),
    smallestPivot: basis.lu.smallestPivot,
    tolerance: tolerance.pivot,
  };
}
