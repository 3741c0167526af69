import type { Refusal } from '@/lib/model/refusal';
import { integralOfProduct } from '../diagrams/piecewise';
import type { Bar, Equilibrium } from '../statics/equilibrium';
import { listed } from '../statics/name-force';
import { tolerance } from '../tolerance';
import { endForces, memberDiagram } from './member-state';
import type { PrimaryBasis } from './self-stress';
import type { SolvedCase, SolvedForces } from './solve-redundants';
import { unitState } from './unit-state';

/** Members whose axial force bending cannot determine: held lengthwise, and they do not stretch. */
export function openMembers(eq: Equilibrium, basis: PrimaryBasis): string[] {
  const bars = new Set(basis.open.flatMap((o) => [...o.state.keys()].map((q) => eq.barOf[q] as number)));
  return [...bars]
    .filter((b) => b !== -1)
    .sort((a, b) => a - b)
    .map((b) => (eq.bars[b] as Bar).member.id);
}

/**
 * Their axial force is taken as zero, which is what any finite EA gives when no load, strain or support movement acts
 * along them. When one does, the answer hangs on EA, and the case is refused.
 */
export function refuseOpenAxial(
  eq: Equilibrium,
  basis: PrimaryBasis,
  solved: SolvedForces,
): Refusal | undefined {
  if (basis.open.length === 0) return undefined;
  for (const [id, c] of solved.cases) {
    const what = loadedAlong(eq, basis, c) ? 'loads' : strainedAlong(eq, basis, c) ? 'strains' : undefined;
    if (!what) continue;
    const members = openMembers(eq, basis);
    return {
      code: 'needs-EA',
      message: `Case ${id} ${what} ${listed(members)} lengthwise, held at both ends and said not to stretch: bending cannot share the force out. State EA (the area).`,
      place: { path: 'members', member: members[0], case: id },
    };
  }
  return undefined;
}

function loadedAlong(eq: Equilibrium, basis: PrimaryBasis, c: SolvedCase): boolean {
  const size = c.final.reduce((m, v) => Math.max(m, Math.abs(v)), 0);
  return basis.open.some((o) =>
    [...unitState(eq, o.state, 1).members.keys()].some((b) => {
      const ends = endForces(eq, b, (q) => c.final[q] as number, c.load);
      const { L } = (eq.bars[b] as Bar).axis;
      const N = integralOfProduct(memberDiagram(eq, b, ends, c.load).N, [{ from: 0, to: L, c: [1] }]) / L;
      return Math.abs(N) > tolerance.along * Math.max(size, Math.abs(N));
    }),
  );
}

function strainedAlong(eq: Equilibrium, basis: PrimaryBasis, c: SolvedCase): boolean {
  return basis.open.some((o) => {
    const state = unitState(eq, o.state, 1);
    const terms = [...state.members].map(([b, u]) => {
      const local = c.load.local[b];
      return u.N * (local ? local.strain * (eq.bars[b] as Bar).axis.L + local.misfit : 0);
    });
    for (const m of c.movements) {
      const R = state.reactions.get(m.column);
      if (R !== undefined) terms.push(-R * m.value);
    }
    const size = terms.reduce((t, v) => t + Math.abs(v), 0);
    return Math.abs(terms.reduce((t, v) => t + v, 0)) > tolerance.along * size;
  });
}
