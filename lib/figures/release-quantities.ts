import type { Quantity } from '@/lib/model/quantity';
import type { Member, Support } from '@/lib/model/structure';
import type { Frame } from './member-axis';

/** The frame with quantities taken out: supports let go, hinges put in. A cut of N is drawn, not modelled, here. */
export function releaseQuantities(frame: Frame, quantities: readonly Quantity[]): Frame {
  const joints = frame.joints.map((joint) => {
    const gone = quantities.flatMap((q) =>
      q.kind === 'reaction' && q.joint === joint.id ? [q.component] : [],
    );
    if (!joint.support || gone.length === 0) return joint;
    const support: Support = { ...joint.support };
    for (const component of gone) support[component] = 'free';
    const held = [support.x, support.y, support.turn].some((r) => r !== 'free');
    return { ...joint, support: held ? support : undefined };
  });
  const members = frame.members.map((member): Member => {
    const ends = quantities.flatMap((q) => (q.kind === 'moment' && q.member === member.id ? [q.end] : []));
    if (ends.length === 0) return member;
    const releases = { start: [...(member.releases?.start ?? [])], end: [...(member.releases?.end ?? [])] };
    for (const end of ends) if (!releases[end].includes('moment')) releases[end].push('moment');
    return { ...member, releases };
  });
  return { ...frame, joints, members };
}
