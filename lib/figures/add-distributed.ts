import type { Load } from '@/lib/model/load';
import type { ShapeRef } from './drawing';
import type { Sheet } from './fit-drawing';
import { magnitude } from './magnitude';
import type { Frame, MemberAxis } from './member-axis';
import type { LabelSpot } from './place-labels';
import type { Ink, Style } from './sketch';
import { type LoadStack, sideOf } from './stack-loads';
import { beyond, cross, mix, type Point, scale, unit } from './vector';

export type Distributed = Extract<Load, { kind: 'distributed' }>;

export const pen: Style = { stroke: 'pen', width: 1 };
export interface DistributedLook {
  /** Greatest intensity of the case, and the height, points, that it is drawn with. */
  greatest: number;
  tallest: number;
  stack: LoadStack;
  ref: ShapeRef;
  /** The value is written on a neighbour that goes on with the same load. */
  mute?: boolean;
}

const spacing = 15;
/** Share of the tallest that the faintest load still has. */
const faintest = 0.45;
const gap = 1.6;

/** The unit direction, in model axes, in which a positive value of a load acts. */
export function senseOf(direction: Distributed['direction'], axis: MemberAxis): Point {
  switch (direction) {
    case 'x':
      return { x: 1, y: 0 };
    case 'y':
      return { x: 0, y: 1 };
    case 'along':
      return axis.along;
    case 'across':
      return axis.left;
  }
}

/** A row of arrows under a line whose height follows the load; `greatest` intensity of the case is drawn tallest. */
export function addDistributed(
  sheet: Sheet,
  frame: Frame,
  axis: MemberAxis,
  load: Distributed,
  look: DistributedLook,
): void {
  const { view, sketch, size } = sheet;
  const [from, to] = [load.from ?? 0, load.to ?? axis.length];
  const sense = senseOf(load.direction, axis);
  if (Math.abs(cross(sense, axis.along)) < 0.2) {
    addAlong(sheet, frame, axis, load, look);
    return;
  }
  const mean = load.w1 + load.w2 < 0 ? -1 : 1;
  const force = scale(sense, mean);
  const back = view.direction(scale(force, -1));
  const side = sideOf(force, axis.left);
  const floor = look.stack.clear(axis.member.id, side, from, to);
  const [a, b] = footOf(sheet, axis, load, from, to, back, floor === 0 ? gap : floor);
  const height = (w: number) =>
    look.tallest * (((1 - faintest) * mean * w) / look.greatest + faintest * Math.sign(mean * w));
  const head = (t: number) => load.w1 + (load.w2 - load.w1) * t;
  const top = (t: number) => beyond(mix(a, b, t), back, height(head(t)));
  const style = { ...pen, ref: look.ref };
  const outline = [a, top(0), ...crossing(load.w1, load.w2).map((t) => mix(a, b, t)), top(1), b];
  sketch.poly(outline, false, style);
  if (floor > 0 || load.per === 'projection') sketch.line(a, b, { ...style, width: 0.7 });
  for (const k of [0.3, 0.6]) sketch.shade(mix(a, top(0), k), mix(b, top(1), k));
  const count = Math.max(2, Math.round(Math.hypot(b.x - a.x, b.y - a.y) / spacing));
  for (let i = 0; i <= count; i++) {
    const [tip, tail] = [mix(a, b, i / count), top(i / count)];
    const long = Math.hypot(tip.x - tail.x, tip.y - tail.y);
    if (long > 4) sketch.arrow(tail, tip, style, Math.min(5, long * 0.7));
  }
  const peak = Math.max(height(load.w1), height(load.w2), 0);
  look.stack.put(axis.member.id, side, from, to, (floor === 0 ? gap : floor) + peak + size * 1.25);
  const own = outline.slice(1).map((p, i): Ink => ({ a: outline[i] as Point, b: p }));
  const write = (w: number) => magnitude(Math.abs(w), 'distributed', frame.units);
  const plan = load.per === 'projection' ? (load.direction === 'y' ? ' on plan' : ' on elevation') : '';
  const put = (w: number, t: number, aside?: Point) => {
    const out = height(w) < 0 ? scale(back, -1) : back;
    const spots: [LabelSpot, ...LabelSpot[]] = [{ at: top(t), toward: out, gap: 2.5 }];
    if (aside)
      spots.unshift({
        at: top(t),
        toward: unit({ x: aside.x * 0.55 + out.x, y: aside.y * 0.55 + out.y }),
        gap: 1.5,
      });
    for (const k of [0.35, 0.65, 0.2, 0.8]) spots.push({ at: top(aside ? t : k), toward: out, gap: 2.5 });
    sketch.label({ text: `$${write(w)}$${plan}`, size, tone: 'pen', spots, own, rank: 1, ref: look.ref });
  };
  if (look.mute) return;
  if (load.w1 === load.w2) {
    put(load.w1, 0.5);
    return;
  }
  const along = unit({ x: b.x - a.x, y: b.y - a.y });
  if (load.w1 !== 0) put(load.w1, 0, along);
  if (load.w2 !== 0) put(load.w2, 1, scale(along, -1));
}

/** Where the arrows end: on the member, on what stands on it, or level above it for a load given on plan. */
function footOf(
  { view }: Sheet,
  axis: MemberAxis,
  load: Distributed,
  from: number,
  to: number,
  back: Point,
  floor: number,
): [Point, Point] {
  const [a, b] = [view.at(axis.at(from)), view.at(axis.at(to))];
  if (load.per === 'length') return [beyond(a, back, floor), beyond(b, back, floor)];
  const rise = (p: Point) => p.x * back.x + p.y * back.y;
  const level = Math.max(rise(a), rise(b)) + floor + 6;
  return [beyond(a, back, level - rise(a)), beyond(b, back, level - rise(b))];
}

/** Where a load that changes its sense is zero, as a share of its stretch. */
function crossing(w1: number, w2: number): number[] {
  return w1 * w2 < 0 ? [w1 / (w1 - w2)] : [];
}

/** A load along its member: a line beside it with heads along it. */
function addAlong(
  { view, sketch, size }: Sheet,
  frame: Frame,
  axis: MemberAxis,
  load: Distributed,
  look: DistributedLook,
): void {
  const [from, to] = [load.from ?? 0, load.to ?? axis.length];
  const out = view.direction(axis.left);
  const floor = Math.max(7, look.stack.clear(axis.member.id, 1, from, to));
  const [a, b] = [beyond(view.at(axis.at(from)), out, floor), beyond(view.at(axis.at(to)), out, floor)];
  const sense = senseOf(load.direction, axis);
  const walk = Math.sign((sense.x * axis.along.x + sense.y * axis.along.y) * (load.w1 + load.w2)) || 1;
  const [tail, tip] = walk > 0 ? [a, b] : [b, a];
  const style = { ...pen, ref: look.ref };
  sketch.line(a, b, style);
  const long = Math.hypot(b.x - a.x, b.y - a.y);
  const heads = Math.max(1, Math.round(long / (1.6 * spacing)));
  const along = unit({ x: tip.x - tail.x, y: tip.y - tail.y });
  for (let i = 1; i <= heads; i++) sketch.head(mix(tail, tip, i / heads), along, style, 5);
  look.stack.put(axis.member.id, 1, from, to, floor + 4 + size * 1.25);
  const values =
    load.w1 === load.w2
      ? [[load.w1, 0.5]]
      : [
          [load.w1, 0.15],
          [load.w2, 0.85],
        ];
  for (const [w = 0, t = 0] of values) {
    const spots: [LabelSpot, ...LabelSpot[]] = [
      { at: mix(a, b, t), toward: out, gap: 3 },
      { at: mix(a, b, 0.5), toward: out, gap: 3 },
    ];
    sketch.label({
      text: `$${magnitude(Math.abs(w), 'distributed', frame.units)}$`,
      size,
      tone: 'pen',
      spots,
      own: [{ a, b }],
      rank: 1,
      ref: look.ref,
    });
  }
}
