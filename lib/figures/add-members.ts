import type { Sheet } from './fit-drawing';
import type { Frame, MemberAxis } from './member-axis';
import type { Style } from './sketch';
import { beyond, type Point, scale } from './vector';

export interface MemberLook {
  /** Dashes along the right-hand face of the walk, where a positive moment has its tension. */
  innerFace?: boolean;
  /** Thin lines, for drawings whose subject is something else. */
  thin?: boolean;
  /** Pale: the structure at rest beneath its motion. */
  pale?: boolean;
}

const faceOff = 4.6;

/** Members, their inner faces, and a dot where free ends and members meet. */
export function addMembers(
  { sketch, view }: Sheet,
  frame: Frame,
  axes: ReadonlyMap<string, MemberAxis>,
  look: MemberLook,
): void {
  const width = look.pale ? 0.8 : look.thin ? 1.4 : 2.2;
  for (const { member, start, end } of axes.values()) {
    const [a, b] = [view.at(start), view.at(end)];
    if (look.innerFace) addInnerFace(sketch.line.bind(sketch), a, b);
    const ref = { of: 'member', id: member.id } as const;
    sketch.line(a, b, { stroke: look.pale ? 'ink3' : 'ink', width, ref });
  }
  if (look.thin || look.pale) return;
  for (const joint of frame.joints) {
    if (joint.support) continue;
    sketch.circle(view.at(joint), 2, { fill: 'ink', ref: { of: 'joint', id: joint.id } });
  }
}

/** On the page y runs down, so the right-hand side of the walk is its left turned: (−dy, dx). */
function addInnerFace(line: (a: Point, b: Point, style: Style) => void, a: Point, b: Point): void {
  const length = Math.hypot(b.x - a.x, b.y - a.y);
  if (length < 4 * faceOff) return;
  const along = scale({ x: b.x - a.x, y: b.y - a.y }, 1 / length);
  const right = { x: -along.y, y: along.x };
  const at = (s: number) => beyond(beyond(a, along, s), right, faceOff);
  line(at(faceOff), at(length - faceOff), { stroke: 'ink3', width: 0.7, dash: [3, 2.2] });
}

/** Which joints are hinges as a whole, and which member ends carry a hinge of their own. */
export function hingesOf(frame: Frame): {
  joints: Set<string>;
  ends: { member: string; end: 'start' | 'end' }[];
} {
  const ends = frame.members.flatMap((m) =>
    (['start', 'end'] as const).map((end) => ({
      member: m.id,
      end,
      joint: m[end],
      hinged: m.releases?.[end].includes('moment') ?? false,
    })),
  );
  const joints = new Set<string>();
  const own: { member: string; end: 'start' | 'end' }[] = [];
  for (const { id, support } of frame.joints) {
    const here = ends.filter((e) => e.joint === id);
    const hinged = here.filter((e) => e.hinged);
    if (hinged.length === 0) continue;
    const supportTurns = support === undefined || support.turn === 'free';
    if (hinged.length >= here.length - (supportTurns ? 1 : 0)) joints.add(id);
    else own.push(...hinged.map(({ member, end }) => ({ member, end })));
  }
  return { joints, ends: own };
}

/** Hinges as circles, and slides where shear or axial force is released. */
export function addReleases(
  { sketch, view }: Sheet,
  frame: Frame,
  axes: ReadonlyMap<string, MemberAxis>,
): void {
  const hinges = hingesOf(frame);
  const circle = (at: Point, id: string) =>
    sketch.circle(at, 2.7, { stroke: 'ink', width: 1.2, fill: 'paper', ref: { of: 'member', id } });
  for (const { id, ...p } of frame.joints) {
    const one = frame.members.find((m) => m.start === id || m.end === id);
    if (hinges.joints.has(id) && one) circle(view.at(p), one.id);
  }
  for (const axis of axes.values()) {
    const { member } = axis;
    for (const end of ['start', 'end'] as const) {
      const inward = view.direction(end === 'start' ? axis.along : scale(axis.along, -1));
      const at = view.at(axis[end]);
      if (hinges.ends.some((e) => e.member === member.id && e.end === end))
        circle(beyond(at, inward, 5), member.id);
      const side = { x: -inward.y, y: inward.x };
      for (const [what, bars] of [
        ['axial', side],
        ['shear', inward],
      ] as const) {
        if (!member.releases?.[end].includes(what)) continue;
        const centre = beyond(at, inward, 12);
        addSlide(sketch, centre, bars, member.id);
      }
    }
  }
}

/** Two short bars a little apart across the direction in which the parts may slide. */
function addSlide(sketch: Sheet['sketch'], centre: Point, off: Point, id: string): void {
  const along = { x: -off.y, y: off.x };
  for (const k of [-2.4, 2.4]) {
    const middle = beyond(centre, off, k);
    sketch.line(beyond(middle, along, -6), beyond(middle, along, 6), {
      stroke: 'ink',
      width: 1.1,
      ref: { of: 'member', id },
    });
  }
}
