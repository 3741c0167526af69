import type { Member } from '@/lib/model/structure';
import type { Sheet } from './fit-drawing';
import type { MemberAxis } from './member-axis';
import type { LabelSpot } from './place-labels';
import { scale } from './vector';

/** Rich text beside the middle of members, on the right of the walk: a stiffness, a section, a name. */
export function addMemberTexts(
  { sketch, view, size }: Sheet,
  axes: ReadonlyMap<string, MemberAxis>,
  textOf: (member: Member) => string | undefined,
): void {
  for (const { member, at, length, left } of axes.values()) {
    const text = textOf(member);
    if (text === undefined) continue;
    const right = scale(view.direction(left), -1);
    const spot = (share: number): LabelSpot => ({ at: view.at(at(share * length)), toward: right, gap: 7 });
    sketch.label({
      text,
      size: size * 0.92,
      tone: 'ink2',
      rank: 2,
      ref: { of: 'member', id: member.id },
      spots: [spot(0.5), spot(0.35), spot(0.65), { ...spot(0.5), toward: view.direction(left) }],
    });
  }
}
