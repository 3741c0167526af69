import type { Load } from '@/lib/model/load';
import type { Joint, Member } from '@/lib/model/structure';

/** Direction and length of a member; `c`, `s` are the cosine and sine of its slope. */
export interface MemberAxis {
  L: number;
  c: number;
  s: number;
}

/** Loads of one case on one member in its own axes: along from start to end, across to the left of the walk. */
export interface LocalLoads {
  spread: { from: number; to: number; along: [number, number]; across: [number, number]; index: number }[];
  points: { at: number; along: number; across: number; couple: number; index: number }[];
  /** Temperature rise, curvature κ = −α ΔT/h and lack of fit, summed. */
  strain: number;
  curvature: number;
  misfit: number;
}

export function memberAxis(start: Joint, end: Joint): MemberAxis {
  const dx = end.x - start.x;
  const dy = end.y - start.y;
  const L = Math.hypot(dx, dy);
  return { L, c: dx / L, s: dy / L };
}

/** The part of `value` in a direction that falls along and across the member. */
function components(direction: 'x' | 'y' | 'along' | 'across', axis: MemberAxis): [number, number] {
  switch (direction) {
    case 'along':
      return [1, 0];
    case 'across':
      return [0, 1];
    case 'x':
      return [axis.c, -axis.s];
    case 'y':
      return [axis.s, axis.c];
  }
}

/** Gathers what the loads of a case do to one member. */
export function localLoads(loads: readonly Load[], member: Member, axis: MemberAxis): LocalLoads {
  const local: LocalLoads = { spread: [], points: [], strain: 0, curvature: 0, misfit: 0 };
  loads.forEach((load, index) => {
    if (load.kind === 'self-weight') {
      const named = load.members === undefined || load.members.includes(member.id);
      if (!named || member.weight === undefined) return;
      const w = -member.weight;
      local.spread.push({
        from: 0,
        to: axis.L,
        along: [w * axis.s, w * axis.s],
        across: [w * axis.c, w * axis.c],
        index,
      });
      return;
    }
    if (load.kind === 'joint' || load.kind === 'settlement' || load.member !== member.id) return;
    switch (load.kind) {
      case 'distributed': {
        const [along, across] = components(load.direction, axis);
        const projected = load.per === 'projection' && (load.direction === 'x' || load.direction === 'y');
        const plan = projected ? Math.abs(load.direction === 'y' ? axis.c : axis.s) : 1;
        const ends = (part: number): [number, number] => [load.w1 * part * plan, load.w2 * part * plan];
        local.spread.push({
          from: load.from ?? 0,
          to: load.to ?? axis.L,
          along: ends(along),
          across: ends(across),
          index,
        });
        break;
      }
      case 'point': {
        const [along, across] = components(load.direction, axis);
        local.points.push({
          at: load.at,
          along: load.value * along,
          across: load.value * across,
          couple: 0,
          index,
        });
        break;
      }
      case 'couple':
        local.points.push({ at: load.at, along: 0, across: 0, couple: load.value, index });
        break;
      case 'temperature':
        if (member.alpha !== undefined) {
          local.strain += member.alpha * load.rise;
          if (member.depth !== undefined) local.curvature -= (member.alpha * load.difference) / member.depth;
        }
        break;
      case 'misfit':
        local.misfit += load.value;
        break;
    }
  });
  return local;
}
