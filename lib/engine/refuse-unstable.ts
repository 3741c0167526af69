import type { Refusal } from '@/lib/model/refusal';
import type { PrimaryBasis } from './force-method/self-stress';
import { describeMechanism } from './statics/describe-mechanism';
import type { Equilibrium } from './statics/equilibrium';
import { mechanismOf } from './statics/mechanism';
import { leftNullVector } from './statics/solve-lu';

/** The structure itself moves: its motion, in words and as a drawing needs it. */
export function refuseUnstable(eq: Equilibrium, basis: PrimaryBasis): Refusal | undefined {
  const { lu } = basis;
  const free = lu.freeRows.find((r) => !eq.trivialRows.has(r));
  if (free === undefined) return undefined;
  const mechanism = mechanismOf(eq, leftNullVector(lu, free));
  const { code, message } = describeMechanism(eq, mechanism);
  const joint = Object.keys(mechanism.joints)[0] ?? eq.analysis.joints[Math.floor(free / 3)]?.id;
  const equations = eq.rowCount - eq.trivialRows.size;
  return {
    code: `unstable-${code}`,
    message: `The structure is unstable: ${equations} equations, rank ${lu.basis.length}. ${message}${wayOut(code)}`,
    place: { path: 'joints', joint, member: mechanism.pieces[0]?.members[0] },
    mechanism,
  };
}

function wayOut(code: string): string {
  switch (code) {
    case 'parallel':
      return ' Add a support that holds it that way.';
    case 'concurrent':
      return ' Add a reaction that passes elsewhere, or hold a joint against turning.';
    case 'not-connected':
      return ' Join it to the rest, or support it.';
    default:
      return ' Take out a release, or add a support or a member that stops it.';
  }
}

/** A couple on a joint where nothing can turn against it. */
export function refuseCoupleOnHinge(eq: Equilibrium): Refusal | undefined {
  if (eq.trivialRows.size === 0) return undefined;
  const places = new Map(eq.analysis.joints.map((j, i) => [j.id, i]));
  for (const [k, c] of eq.analysis.cases.entries()) {
    for (const [i, load] of c.loads.entries()) {
      if (load.kind !== 'joint' || load.couple === 0) continue;
      if (!eq.trivialRows.has(3 * (places.get(load.joint) as number) + 2)) continue;
      return {
        code: 'couple-on-hinge',
        message: `Joint ${load.joint} is a hinge: nothing there takes the couple of case ${c.id}.`,
        place: { path: `cases.${k}.loads.${i}`, joint: load.joint, case: c.id, load: i },
      };
    }
  }
  return undefined;
}
