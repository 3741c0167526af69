import type { Analysis } from '@/lib/model/analysis';
import type { Member } from '@/lib/model/structure';
import { add, type Point, scale, size, subtract, unit } from './vector';

/** What a drawing needs of an analysis: the structure and its unit set. */
export type Frame = Pick<Analysis, 'units' | 'joints' | 'members'>;

/** The line of a member in the model's own axes (y up), walked from start to end. */
export interface MemberAxis {
  member: Member;
  start: Point;
  end: Point;
  length: number;
  /** Unit vectors along the walk and to its left. */
  along: Point;
  left: Point;
  /** The point at distance s from the start. */
  at(s: number): Point;
}

/** Axes of all members, by id. Throws when a member names a joint that is not there. */
export function memberAxes(frame: Frame): Map<string, MemberAxis> {
  const joints = new Map(frame.joints.map((j) => [j.id, j]));
  return new Map(
    frame.members.map((member) => {
      const start = joints.get(member.start);
      const end = joints.get(member.end);
      if (!start || !end) throw new Error(`member ${member.id} ends at a joint that is not there`);
      const along = unit(subtract(end, start));
      return [
        member.id,
        {
          member,
          start,
          end,
          length: size(subtract(end, start)),
          along,
          left: { x: -along.y, y: along.x },
          at: (s) => add(start, scale(along, s)),
        },
      ];
    }),
  );
}

/** Directions in which members leave a joint, unit vectors. */
export function directionsFrom(joint: string, axes: ReadonlyMap<string, MemberAxis>): Point[] {
  const directions: Point[] = [];
  for (const { member, along } of axes.values()) {
    if (member.start === joint) directions.push(along);
    if (member.end === joint) directions.push(scale(along, -1));
  }
  return directions;
}
