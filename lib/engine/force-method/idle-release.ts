import type { Quantity } from '@/lib/model/quantity';
import type { Mechanism } from '@/lib/model/refusal';
import type { Equilibrium } from '../statics/equilibrium';
import { endJoint, forceName, listed } from '../statics/name-force';

type EndMoment = Extract<Quantity, { kind: 'moment' }>;

/** Ends of members that meet at a joint and are not released there, and whether a support holds it against turning. */
function rigidEnds(eq: Equilibrium, joint: string): { ends: number; held: boolean } {
  const ends = eq.bars.flatMap(({ member }) =>
    (['start', 'end'] as const).filter(
      (e) => member[e] === joint && member.releases?.[e].includes('moment') !== true,
    ),
  ).length;
  const support = eq.analysis.joints.find((j) => j.id === joint)?.support;
  return { ends, held: support !== undefined && support.turn !== 'free' };
}

/** Why a release opens nothing, in a sentence; undefined when it does open something. */
export function releasesNothing(eq: Equilibrium, q: Quantity): string | undefined {
  if (q.kind === 'reaction') {
    const known = eq.analysis.joints.find((j) => j.id === q.joint);
    if (!known) return `There is no joint ${q.joint}.`;
    if (!known.support || known.support[q.component] === 'free')
      return `There is no ${forceName(eq, q)}: the joint is free that way already.`;
    return undefined;
  }
  const member = eq.analysis.members.find((m) => m.id === q.member);
  if (!member) return `There is no member ${q.member}.`;
  if (q.kind === 'axial')
    return member.releases?.start.includes('axial') || member.releases?.end.includes('axial')
      ? `A cut of ${q.member} lengthwise releases nothing: it slides there already.`
      : undefined;
  const joint = endJoint(eq, q);
  if (member.releases?.[q.end].includes('moment'))
    return `A hinge at ${joint} of ${q.member} releases nothing: the hinge is there already.`;
  const { ends, held } = rigidEnds(eq, joint);
  if (ends > 1 || held) return undefined;
  const pin = eq.analysis.joints.find((j) => j.id === joint)?.support !== undefined;
  return `A hinge at ${joint} releases nothing: ${pin ? 'the support lets it turn' : 'the end is free to turn'} already.`;
}

/** Released moments of one joint that are one moment, or add up to zero: then the joint turns and no member moves. */
export function sameForce(
  eq: Equilibrium,
  released: readonly Quantity[],
  mechanism: Mechanism,
): string | undefined {
  if (mechanism.pieces.length > 0 || released.length < 2) return undefined;
  const first = released.find((q): q is EndMoment => q.kind === 'moment');
  if (!first) return undefined;
  const joint = endJoint(eq, first);
  const names = listed(released.map((q) => forceName(eq, q)));
  if (released.length === 2) return `${names} are one moment. Release one of them.`;
  return `${names} keep joint ${joint} in equilibrium together: the last of them follows from the others. Release one fewer.`;
}
