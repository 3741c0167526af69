import { memberDisplacements } from './diagrams/displacements';
import { type JointMotion, knownEnds } from './diagrams/known-ends';
import { jointDisplacements } from './force-method/joint-displacements';
import { endForces, memberDiagram } from './force-method/member-state';
import type { Reference } from './force-method/reference';
import type { PrimaryBasis } from './force-method/self-stress';
import type { SolvedCase, SolvedForces } from './force-method/solve-redundants';
import type { CaseResult } from './solution';
import type { Equilibrium } from './statics/equilibrium';

/** Reactions, diagrams and displacements of the structure under every case. */
export function assembleCases(
  eq: Equilibrium,
  basis: PrimaryBasis,
  solved: SolvedForces,
  reference: Reference,
): Record<string, CaseResult> {
  const assembled = [...solved.cases].map(([id, c]): [string, CaseResult] => {
    const forces = eq.bars.map((_, b) =>
      memberDiagram(
        eq,
        b,
        endForces(eq, b, (q) => c.final[q] as number, c.load),
        c.load,
      ),
    );
    const motions = jointMotions(eq, jointDisplacements(eq, basis, c, forces, solved.held));
    const reactions = eq.quantities.flatMap((quantity, q) =>
      quantity.kind === 'reaction'
        ? [{ quantity, value: (c.final[q] as number) * (eq.scale[q] as number) }]
        : [],
    );
    return [
      id,
      {
        reactions,
        members: memberResults(eq, c, forces, motions),
        joints: Object.fromEntries(
          eq.analysis.joints.map((joint, j) => [joint.id, motions[j] as JointMotion]),
        ),
        displacementsTimesEI0: reference.value === undefined,
      },
    ];
  });
  return Object.fromEntries(assembled);
}

function jointMotions(eq: Equilibrium, moved: Float64Array): JointMotion[] {
  return eq.analysis.joints.map((_, j) => ({
    x: moved[3 * j] as number,
    y: moved[3 * j + 1] as number,
    rotation: eq.trivialRows.has(3 * j + 2) ? undefined : (moved[3 * j + 2] as number),
  }));
}

function memberResults(
  eq: Equilibrium,
  c: SolvedCase,
  forces: readonly ReturnType<typeof memberDiagram>[],
  motions: readonly JointMotion[],
): CaseResult['members'] {
  const results: CaseResult['members'] = {};
  eq.bars.forEach(({ member, axis, start, end, stretches }, b) => {
    const [d, local, u, v] = [forces[b], c.load.local[b], motions[start], motions[end]];
    if (!d || !local || !u || !v) throw new Error(`no member ${member.id}`);
    const ends = knownEnds(member, axis, u, v);
    results[member.id] = { ...d, ...memberDisplacements(d, stretches, local, ends, axis.L) };
  });
  return results;
}
