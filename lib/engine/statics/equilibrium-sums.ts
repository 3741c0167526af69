import type { Equilibrium } from './equilibrium';
import type { Body, BodyForce } from './rigid-body';
import type { StaticsLine } from './statics-line';

export type Sum = Extract<StaticsLine, { kind: 'equation' }>['sum'];

/** Arms (in mean member lengths) and cosines below this count as none. */
const none = 1e-9;

/** Arm (with sign) of a force in a moment sum, cosine in a force sum. */
export function coefficient(f: BodyForce, sum: Sum): number {
  if (sum.kind === 'force') return f.couple === undefined ? f.ux * sum.x + f.uy * sum.y : 0;
  return f.couple === undefined ? (f.x - sum.x) * f.uy - (f.y - sum.y) * f.ux : f.couple;
}

/** What is no coefficient but rounding, in a sum of this kind. */
export const negligible = (eq: Equilibrium, sum: Sum) => none * (sum.kind === 'moment' ? eq.length : 1);

/** Moments about the joints of a body, then forces upwards and to the right. */
export function jointSums(eq: Equilibrium, body: Body): Sum[] {
  const members = new Set(body.members);
  const joints = new Set<number>();
  for (const { member, start, end } of eq.bars) if (members.has(member.id)) joints.add(start).add(end);
  return [
    ...[...joints]
      .sort((a, b) => a - b)
      .flatMap((j): Sum[] => {
        const joint = eq.analysis.joints[j];
        return joint ? [{ kind: 'moment', x: joint.x, y: joint.y, joint: joint.id }] : [];
      }),
    { kind: 'force', x: 0, y: 1 },
    { kind: 'force', x: 1, y: 0 },
  ];
}

/** The unknowns that enter a sum on a body. */
export function unknownsOf(eq: Equilibrium, body: Body, sum: Sum): Map<string, number> {
  const found = new Map<string, number>();
  for (const f of body.forces) {
    const c = coefficient(f, sum);
    if (Math.abs(c) > negligible(eq, sum)) found.set(f.key, c);
  }
  return found;
}

/** The sum that none of these forces enters: about the point where two meet, or across those that are parallel. */
export function meetingSum(eq: Equilibrium, forces: readonly BodyForce[]): Sum | undefined {
  const straight = forces.filter((f) => f.couple === undefined);
  const [a, b] = straight;
  if (!a) return undefined;
  const cross = b ? a.ux * b.uy - a.uy * b.ux : 0;
  if (Math.abs(cross) <= none) return { kind: 'force', x: upright(-a.uy), y: upright(a.ux) };
  if (!b || straight.length !== forces.length) return undefined;
  const t = ((b.x - a.x) * b.uy - (b.y - a.y) * b.ux) / cross;
  const at = { x: a.x + t * a.ux, y: a.y + t * a.uy };
  const joint = eq.analysis.joints.find((j) => Math.hypot(j.x - at.x, j.y - at.y) <= none * eq.length);
  return joint ? { kind: 'moment', x: joint.x, y: joint.y, joint: joint.id } : { kind: 'moment', ...at };
}

const upright = (v: number) => (Math.abs(v) <= none ? 0 : v);
