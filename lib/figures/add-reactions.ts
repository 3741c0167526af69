import type { Quantity } from '@/lib/model/quantity';
import { addTurnArrow } from './add-arrows';
import type { Prepared } from './draw-structure';
import type { Sheet } from './fit-drawing';
import { directionsFrom } from './member-axis';
import type { LabelSpot } from './place-labels';
import type { Style } from './sketch';
import { signReach } from './support-symbol';
import { beyond, dot, mix, type Point, scale, turn } from './vector';
import { exactDecimals, writeNumber } from './write-number';

type Reaction = Extract<Quantity, { kind: 'reaction' }>;

const arrow = 22;

/**
 * Reactions as forces of the supports on the structure: the arrow shows the sense, the label the amount, each with the
 * decimals it needs (four at most) unless told.
 */
export function addReactions(
  sheet: Sheet,
  ready: Prepared,
  reactions: readonly { quantity: Quantity; value: number }[],
  decimals?: number,
): void {
  const greatest = Math.max(...reactions.map((r) => Math.abs(r.value)), 0);
  const least = decimals === undefined ? Math.max(1e-9 * greatest, 0.5e-4) : 0.5 * 10 ** -decimals;
  for (const { quantity, value } of reactions) {
    if (quantity.kind !== 'reaction' || Math.abs(value) < least) continue;
    const text = `$${writeNumber(Math.abs(value), decimals ?? exactDecimals([value], 0, 4), ready.frame.units)}$`;
    const ref = { of: 'support', id: quantity.joint } as const;
    addJointForce(sheet, ready, quantity, value, text, { stroke: 'ink', width: 1.2, ref });
  }
}

/** One reaction component drawn at its joint, clear of members and of the sign of the support. */
export function addJointForce(
  sheet: Sheet,
  ready: Prepared,
  { joint: id, component }: Reaction,
  value: number,
  text: string,
  style: Style,
): void {
  const joint = ready.frame.joints.find((j) => j.id === id);
  if (!joint) return;
  const { sketch, view, size } = sheet;
  const at = view.at(joint);
  const tone = style.stroke === 'pen' ? 'pen' : 'ink';
  if (component === 'turn') {
    const [from, to] = value > 0 ? [2.6, 0.5] : [0.5, 2.6];
    addTurnArrow(sketch, at, 14, from, to, style);
    const spots = [
      { x: 1, y: 1 },
      { x: -1, y: 1 },
      { x: 1, y: -1 },
      { x: -1, y: -1 },
    ].map((toward) => ({ at, toward, gap: 10 }));
    sketch.label({ text, size, tone, rank: 1, ref: style.ref, spots: spots as [LabelSpot, ...LabelSpot[]] });
    return;
  }
  const angle = ((joint.support?.angle ?? 0) * Math.PI) / 180;
  const axis = turn(component === 'x' ? { x: 1, y: 0 } : { x: 0, y: 1 }, angle);
  const along = view.direction(scale(axis, Math.sign(value)));
  const [tail, tip] = arrowPlace(ready, id, at, along, view.direction);
  sketch.arrow(tail, tip, style);
  const side = { x: -along.y, y: along.x };
  const middle = mix(tail, tip, 0.4);
  const level = Math.abs(along.x) > 0.7;
  const outer = dot(along, { x: tail.x - at.x, y: tail.y - at.y }) < 0 ? tail : tip;
  const beyondOuter = { at: outer, toward: outer === tail ? scale(along, -1) : along, gap: 2.5 };
  const beside = [side, scale(side, -1)].map((toward) => ({ at: middle, toward, gap: 3.5 }));
  const spots = (level ? [beyondOuter, ...beside] : [...beside, beyondOuter]) as [LabelSpot, ...LabelSpot[]];
  sketch.label({ text, size, tone, rank: 1, ref: style.ref, own: [{ a: tail, b: tip }], spots });
}

/** Tail and tip: on the side of the joint where no member leaves it, beyond the sign of its support. */
function arrowPlace(
  ready: Prepared,
  id: string,
  at: Point,
  along: Point,
  onPage: (v: Point) => Point,
): [Point, Point] {
  const members = directionsFrom(id, ready.axes).map(onPage);
  const sign = ready.signs.get(id);
  const crowd = (v: Point) => Math.max(-1, ...members.map((m) => dot(m, v)));
  const back = scale(along, -1);
  const clearOf = (v: Point): number => {
    if (!sign) return 4;
    const toGround = dot(onPage(sign.ground), v);
    return toGround > 0.7 ? signReach(sign) + 3 : sign.kind === 'fixed' ? 12 : 10;
  };
  if (crowd(back) <= crowd(along) + 1e-9) {
    const near = clearOf(back);
    return [beyond(at, back, near + arrow), beyond(at, back, near)];
  }
  const near = clearOf(along);
  return [beyond(at, along, near), beyond(at, along, near + arrow)];
}
