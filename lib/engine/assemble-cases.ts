import { memberDisplacements } from './diagrams/displacements';
import { stretches } from './diagrams/stretches';
import { jointDisplacements } from './force-method/joint-displacements';
import { endForces, memberDiagram } from './force-method/member-state';
import type { Reference } from './force-method/reference';
import type { PrimaryBasis } from './force-method/self-stress';
import type { SolvedForces } from './force-method/solve-redundants';
import type { CaseResult } from './solution';
import type { Equilibrium } from './statics/equilibrium';

/** Reactions, diagrams and displacements of the structure under every case. */
export function assembleCases(
  eq: Equilibrium,
  basis: PrimaryBasis,
  solved: SolvedForces,
  reference: Reference,
): Record<string, CaseResult> {
  return Object.fromEntries(
    [...solved.cases].map(([id, c]) => {
      const moved = jointDisplacements(eq, basis, c, solved.held);
      const at = (j: number) => ({ x: moved[3 * j] as number, y: moved[3 * j + 1] as number });
      const members = Object.fromEntries(
        eq.bars.map((bar, b) => {
          const forces = memberDiagram(
            eq,
            b,
            endForces(eq, b, (q) => c.final[q] as number, c.load),
            c.load,
          );
          const { c: cos, s: sin, L } = bar.axis;
          const [u, v] = [at(bar.start), at(bar.end)];
          const ends = {
            along0: u.x * cos + u.y * sin,
            across0: u.y * cos - u.x * sin,
            across1: v.y * cos - v.x * sin,
          };
          const local = c.load.local[b];
          if (!local) throw new Error('a member without its loads');
          return [
            bar.member.id,
            { ...forces, ...memberDisplacements(forces, stretches(bar.member, L), local, ends, L) },
          ];
        }),
      );
      const joints = Object.fromEntries(
        eq.analysis.joints.map((joint, j) => {
          const rotation = eq.trivialRows.has(3 * j + 2) ? undefined : (moved[3 * j + 2] as number);
          return [joint.id, { ...at(j), rotation }];
        }),
      );
      const reactions = eq.quantities.flatMap((quantity, q) =>
        quantity.kind === 'reaction'
          ? [{ quantity, value: (c.final[q] as number) * (eq.scale[q] as number) }]
          : [],
      );
      return [id, { reactions, members, joints, displacementsTimesEI0: reference.value === undefined }];
    }),
  );
}
