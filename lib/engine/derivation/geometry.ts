import type { Analysis } from '@/lib/model/analysis';
import type { Joint, Member } from '@/lib/model/structure';

/** A member where it stands: its joints, length, plan length and rise (both with sign), slope. */
export interface Placed {
  member: Member;
  start: Joint;
  end: Joint;
  L: number;
  dx: number;
  dy: number;
  cos: number;
  sin: number;
  /** Level, upright or inclined. */
  lie: 'level' | 'upright' | 'inclined';
}

/** Every member by its id, in the order of the analysis. */
export function placeMembers({ joints, members }: Pick<Analysis, 'joints' | 'members'>): Map<string, Placed> {
  const byId = new Map(joints.map((j) => [j.id, j]));
  return new Map(
    members.map((member) => {
      const start = byId.get(member.start);
      const end = byId.get(member.end);
      if (!start || !end) throw new Error(`member ${member.id} ends at a joint that is not there`);
      const [dx, dy] = [end.x - start.x, end.y - start.y];
      const L = Math.hypot(dx, dy);
      const lie = Math.abs(dy) <= 1e-12 * L ? 'level' : Math.abs(dx) <= 1e-12 * L ? 'upright' : 'inclined';
      return [member.id, { member, start, end, L, dx, dy, cos: dx / L, sin: dy / L, lie }];
    }),
  );
}

/** All members in one level line, each from left to right: a beam. */
export function isBeam(placed: ReadonlyMap<string, Placed>): boolean {
  return [...placed.values()].every((p) => p.lie === 'level' && p.dx > 0);
}
