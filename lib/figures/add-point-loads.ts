import type { Load } from '@/lib/model/load';
import { addTurnArrow } from './add-arrows';
import { pen, senseOf } from './add-distributed';
import type { ShapeRef } from './drawing';
import type { Sheet } from './fit-drawing';
import { magnitude } from './magnitude';
import { directionsFrom, type Frame, type MemberAxis } from './member-axis';
import type { LabelSpot } from './place-labels';
import { type LoadStack, sideOf } from './stack-loads';
import type { SupportSign } from './support-symbol';
import { beyond, cross, dot, mix, type Point, scale, unit } from './vector';

type PointLoad = Extract<Load, { kind: 'point' }>;
const arrow = 27;

/** One arrow whose tip is on the member; it starts above what stands there already. */
export function addPointLoad(
  { view, sketch, size }: Sheet,
  frame: Frame,
  axis: MemberAxis,
  load: PointLoad,
  stack: LoadStack,
  ref: ShapeRef,
): void {
  const force = scale(senseOf(load.direction, axis), load.value < 0 ? -1 : 1);
  const text = `$${magnitude(Math.abs(load.value), 'force', frame.units)}$`;
  const tip = view.at(axis.at(load.at));
  const along = view.direction(force);
  if (Math.abs(cross(force, axis.along)) < 0.2) {
    const out = view.direction(axis.left);
    const foot = beyond(tip, out, Math.max(7, stack.clear(axis.member.id, 1, load.at, load.at)));
    sketch.arrow(beyond(foot, along, -arrow), foot, { ...pen, width: 1.3, ref });
    const spots: [LabelSpot] = [{ at: beyond(foot, along, -arrow / 2), toward: out, gap: 3.5 }];
    sketch.label({ text, size, tone: 'pen', spots, rank: 1, ref });
    return;
  }
  const side = sideOf(force, axis.left);
  const floor = stack.clear(axis.member.id, side, load.at, load.at);
  const tail = beyond(tip, along, -Math.max(arrow, floor + 14));
  addForce({ sketch, size }, tail, beyond(tip, along, -1.5), text, ref);
  stack.put(axis.member.id, side, load.at, load.at, Math.max(arrow, floor + 14) + size * 1.3);
}

/** A force arrow with its value at the tail. */
export function addForce(
  { sketch, size }: Pick<Sheet, 'sketch' | 'size'>,
  tail: Point,
  tip: Point,
  text: string,
  ref: ShapeRef,
): void {
  const back = unit({ x: tail.x - tip.x, y: tail.y - tip.y });
  const side = { x: -back.y, y: back.x };
  sketch.arrow(tail, tip, { ...pen, width: 1.3, ref });
  sketch.label({
    text,
    size,
    tone: 'pen',
    own: [{ a: tail, b: tip }],
    spots: [
      { at: tail, toward: back, gap: 2 },
      { at: mix(tail, tip, 0.15), toward: side, gap: 3 },
      { at: mix(tail, tip, 0.15), toward: scale(side, -1), gap: 3 },
    ],
    rank: 1,
    ref,
  });
}

/** A couple: three quarters of a circle with an arrowhead. */
export function addCouple(
  { sketch, size }: Sheet,
  at: Point,
  value: number,
  frame: Frame,
  ref: ShapeRef,
): void {
  const [from, to] = value > 0 ? [0.3, 0.3 - 1.5 * Math.PI] : [Math.PI - 0.3, 2.5 * Math.PI - 0.3];
  addTurnArrow(sketch, at, 10, from, to, { ...pen, width: 1.2, ref });
  const text = `$${magnitude(Math.abs(value), 'couple', frame.units)}$`;
  const spots: [LabelSpot, ...LabelSpot[]] = [
    { at, toward: { x: 0, y: -1 }, gap: 13 },
    { at, toward: { x: 0.8, y: -1 }, gap: 10 },
    { at, toward: { x: -0.8, y: -1 }, gap: 10 },
    { at, toward: { x: 0, y: 1 }, gap: 13 },
  ];
  sketch.label({ text, size, tone: 'pen', spots, rank: 1, ref });
}

/** Forces and couple on a joint; an arrow that would run along a member is drawn away from the joint instead. */
export function addJointLoad(
  sheet: Sheet,
  frame: Frame,
  axes: ReadonlyMap<string, MemberAxis>,
  signs: ReadonlyMap<string, SupportSign>,
  load: Extract<Load, { kind: 'joint' }>,
  floor: (toward: Point) => number,
  ref: ShapeRef,
): void {
  const joint = frame.joints.find((j) => j.id === load.joint);
  if (!joint) return;
  const at = sheet.view.at(joint);
  const lines = directionsFrom(load.joint, axes);
  const sign = signs.get(load.joint);
  if (sign && sign.kind !== 'none') lines.push(sign.ground);
  for (const [value, axis] of [
    [load.x, { x: 1, y: 0 }],
    [load.y, { x: 0, y: 1 }],
  ] as const) {
    if (value === 0) continue;
    const force = scale(axis, Math.sign(value));
    const along = sheet.view.direction(force);
    const text = `$${magnitude(Math.abs(value), 'force', frame.units)}$`;
    const taken = lines.some((l) => dot(l, force) < -0.9);
    const open = !lines.some((l) => dot(l, force) > 0.9);
    const length = Math.max(arrow, floor(scale(force, -1)) + 14);
    if (taken && open) addForce(sheet, beyond(at, along, 4), beyond(at, along, 4 + arrow), text, ref);
    else addForce(sheet, beyond(at, along, -length), beyond(at, along, -3), text, ref);
  }
  if (load.couple !== 0) addCouple(sheet, at, load.couple, frame, ref);
}
