import type { Load } from '@/lib/model/load';
import { addTurnArrow } from './add-arrows';
import { pen } from './add-distributed';
import type { ShapeRef } from './drawing';
import type { Sheet } from './fit-drawing';
import { magnitude } from './magnitude';
import type { Frame, MemberAxis } from './member-axis';
import { type SupportSign, signReach } from './support-symbol';
import { beyond, type Point, scale, turn } from './vector';

/** A prescribed movement of a support: an arrow from a mark beside it, with the amount. */
export function addSettlement(
  { view, sketch, size }: Sheet,
  frame: Frame,
  signs: ReadonlyMap<string, SupportSign>,
  load: Extract<Load, { kind: 'settlement' }>,
  ref: ShapeRef,
): void {
  const joint = frame.joints.find((j) => j.id === load.joint);
  if (!joint) return;
  const sign = signs.get(load.joint);
  const ground = view.direction(sign?.ground ?? { x: 0, y: -1 });
  const base = beyond(view.at(joint), ground, (sign ? signReach(sign) : 0) + 5);
  const style = { ...pen, width: 1.2, ref };
  const label = (text: string, at: Point, toward: Point) =>
    sketch.label({
      text,
      size,
      tone: 'pen',
      rank: 1,
      ref,
      spots: [
        { at, toward, gap: 5 },
        { at, toward: scale(toward, -1), gap: 5 },
      ],
    });
  if (load.component === 'turn') {
    const [from, to] = load.value > 0 ? [2.4, 0.7] : [0.7, 2.4];
    addTurnArrow(sketch, view.at(joint), 13, from, to, style);
    label(`$${magnitude(Math.abs(load.value), 'rotation', frame.units)}$`, base, ground);
    return;
  }
  const angle = ((joint.support?.angle ?? 0) * Math.PI) / 180;
  const own = turn(load.component === 'x' ? { x: 1, y: 0 } : { x: 0, y: 1 }, angle);
  const along = view.direction(scale(own, Math.sign(load.value) || 1));
  const side = { x: -along.y, y: along.x };
  const tail = beyond(base, ground, Math.abs(along.y * ground.y + along.x * ground.x) > 0.5 ? 0 : 4);
  const tip = beyond(tail, along, 17);
  sketch.line(beyond(tail, side, -6), beyond(tail, side, 6), { ...style, width: 0.8 });
  sketch.arrow(tail, tip, style);
  const middle = beyond(tail, along, 9);
  label(`$\\Delta=${magnitude(Math.abs(load.value), 'movement', frame.units)}$`, middle, side);
}

/** Temperature and lack of fit are written on the member; a difference of faces shows which is the warmer. */
export function addMemberNote(
  { view, sketch, size }: Sheet,
  frame: Frame,
  axis: MemberAxis,
  load: Extract<Load, { kind: 'temperature' | 'misfit' }>,
  ref: ShapeRef,
): void {
  const out = view.direction(axis.left);
  const write = (text: string, share: number, toward: Point) =>
    sketch.label({
      text: `$${text}$`,
      size,
      tone: 'pen',
      rank: 1,
      ref,
      spots: [share, share - 0.08, share + 0.08].map((t) => ({
        at: view.at(axis.at(t * axis.length)),
        toward,
        gap: 7,
      })) as [{ at: Point; toward: Point; gap: number }],
    });
  if (load.kind === 'misfit') {
    const way = load.value > 0 ? 'long' : 'short';
    write(`${magnitude(Math.abs(load.value), 'movement', frame.units)}\\text{ too ${way}}`, 0.5, out);
    return;
  }
  if (load.rise !== 0) write(`T=${magnitude(load.rise, 'temperature', frame.units, true)}`, 0.68, out);
  if (load.difference === 0) return;
  const warm = load.difference > 0 ? out : scale(out, -1);
  for (const [face, dash] of [
    [warm, undefined],
    [scale(warm, -1), [1.5, 2]],
  ] as const) {
    const at = (s: number) => beyond(view.at(axis.at(s * axis.length)), face, 3.6);
    sketch.line(at(0.08), at(0.92), { ...pen, width: 0.8, dash: dash && [...dash], ref });
  }
  write(`${magnitude(Math.abs(load.difference), 'temperature', frame.units)}\\text{ warmer}`, 0.3, warm);
}
