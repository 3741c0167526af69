import type { Analysis } from '@/lib/model/analysis';
import { type KnownEnds, memberDisplacements } from '../diagrams/displacements';
import { knownEnds } from '../diagrams/known-ends';
import { memberAxis } from '../diagrams/local-loads';
import { memberForces } from '../diagrams/member-forces';
import { sum } from '../diagrams/piecewise';
import type { PiecewisePolynomial } from '../diagrams/piecewise-polynomial';
import { stretches } from '../diagrams/stretches';
import { type Dislocation, dislocate } from '../stiffness/dislocate';

/**
 * Effect of a unit force that may stand anywhere: of a force along and a force across each member at s, positive as in
 * Solution. The effect of a force with components p along and q across is p · along(s) + q · across(s).
 */
export interface InfluenceLine {
  members: Record<string, { along: PiecewisePolynomial; across: PiecewisePolynomial }>;
}

/**
 * Influence lines by the theorem of Müller-Breslau: the structure displaced by a unit dislocation that only the force in
 * question does work on is its influence line. Exact: cubic in bending, with the kink or jump at the section itself. In
 * the order asked; undefined when the structure moves freely or the force is one that members which do not stretch
 * leave open.
 */
export function influenceLines(
  analysis: Analysis,
  forces: readonly Dislocation[],
): InfluenceLine[] | undefined {
  const moved = dislocate(analysis, forces);
  if (!moved) return undefined;
  const place = new Map(analysis.joints.map((j, i) => [j.id, i]));
  return forces.map((force, k): InfluenceLine => {
    const state = moved[k];
    const lines = analysis.members.map((m, i): [string, InfluenceLine['members'][string]] => {
      const [a, b] = [place.get(m.start) as number, place.get(m.end) as number];
      const [p, q, u, v] = [analysis.joints[a], analysis.joints[b], state?.joints[a], state?.joints[b]];
      const ends = state?.members[i];
      if (!p || !q || !u || !v || !ends) throw new Error(`member ${m.id} has no joint`);
      const axis = memberAxis(p, q);
      const nothing = { spread: [], points: [], strain: 0, curvature: 0, misfit: 0 };
      const diagrams = memberForces(ends, nothing, axis.L);
      const jump = force.kind !== 'reaction' && force.member === m.id ? jumpOf(force, axis.L) : undefined;
      const known = withoutJump(knownEnds(m, axis, u, v), jump);
      const smooth = memberDisplacements(diagrams, stretches(m, axis.L), nothing, known, axis.L);
      const add = (f: PiecewisePolynomial, by: PiecewisePolynomial | undefined) =>
        by ? sum([f, by].map((g) => ({ f: g, factor: 1 }))) : f;
      return [m.id, { along: add(smooth.along, jump?.along), across: add(smooth.across, jump?.across) }];
    });
    return { members: Object.fromEntries(lines) };
  });
}

interface Jump {
  along: PiecewisePolynomial;
  across: PiecewisePolynomial;
  /** What the jump adds at the end of the member. */
  end: { along: number; across: number; rotation: number };
}

/** A unit kink (M), slip (V, against the sense of across) or gap (N) at a section, as displacement beyond it. */
function jumpOf({ kind, at }: Exclude<Dislocation, { kind: 'reaction' }>, L: number): Jump {
  const beyond = (c: readonly number[]): PiecewisePolynomial => {
    const before = { from: 0, to: at, c: [0] };
    const after = { from: at, to: L, c };
    return [before, after].filter((p) => p.to > p.from);
  };
  const none = beyond([0]);
  switch (kind) {
    case 'M':
      return { along: none, across: beyond([0, 1]), end: { along: 0, across: L - at, rotation: 1 } };
    case 'V':
      return { along: none, across: beyond([-1]), end: { along: 0, across: -1, rotation: 0 } };
    case 'N':
      return { along: beyond([1]), across: none, end: { along: 1, across: 0, rotation: 0 } };
  }
}

/** What is known of the ends of the member without its jump. */
function withoutJump(ends: KnownEnds, jump: Jump | undefined): KnownEnds {
  if (!jump) return ends;
  const less = (value: number | undefined, by: number) => (value === undefined ? undefined : value - by);
  return {
    ...ends,
    along1: less(ends.along1, jump.end.along),
    across1: less(ends.across1, jump.end.across),
    rotation1: less(ends.rotation1, jump.end.rotation),
  };
}
