import type { Quantity } from '@/lib/model/quantity';
import { addTurnArrow } from './add-arrows';
import { pen } from './add-distributed';
import { hingesOf } from './add-members';
import { addJointForce } from './add-reactions';
import type { Prepared } from './draw-structure';
import type { Sheet } from './fit-drawing';
import { directionsFrom, type MemberAxis } from './member-axis';
import type { LabelSpot } from './place-labels';
import type { Style } from './sketch';
import { beyond, size as lengthOf, type Point, scale, subtract, turn, unit } from './vector';

/** Redundants X1, X2, … in the sense in which they are positive. `labels` replaces "X_i", as "X_1=1". */
export function addRedundants(
  sheet: Sheet,
  ready: Prepared,
  redundants: readonly Quantity[],
  labels?: (index: number) => string | undefined,
): void {
  redundants.forEach((quantity, i) => {
    const text = labels ? labels(i) : `X_{${i + 1}}`;
    if (text === undefined) {
      if (quantity.kind === 'axial') addCut(sheet, ready, quantity.member, i);
      return;
    }
    addRedundant(sheet, ready, quantity, i, `$${text}$`);
  });
}

function addRedundant(sheet: Sheet, ready: Prepared, quantity: Quantity, index: number, text: string): void {
  const ref = { of: 'redundant', id: `${index}` } as const;
  const style: Style = { ...pen, width: 1.3, ref };
  const { sketch, view, size } = sheet;
  switch (quantity.kind) {
    case 'reaction': {
      const joint = ready.frame.joints.find((j) => j.id === quantity.joint);
      if (!joint) return;
      addJointForce(sheet, ready, quantity, 1, text, style);
      return;
    }
    case 'moment': {
      const axis = ready.axes.get(quantity.member);
      if (axis) addMomentPair(sheet, ready, axis, quantity.end, text, style);
      return;
    }
    case 'axial': {
      addCut(sheet, ready, quantity.member, index);
      const axis = ready.axes.get(quantity.member);
      if (!axis) return;
      const middle = beyond(view.at(axis.at(0.5 * axis.length)), view.direction(axis.left), 8);
      const along = view.direction(axis.along);
      sketch.arrow(beyond(middle, along, -21), beyond(middle, along, -4), style);
      sketch.arrow(beyond(middle, along, 21), beyond(middle, along, 4), style);
      const out = view.direction(axis.left);
      const spots: [LabelSpot, ...LabelSpot[]] = [
        { at: middle, toward: out, gap: 5 },
        { at: middle, toward: scale(out, -1), gap: 14 },
      ];
      sketch.label({ text, size, tone: 'pen', spots, rank: 1, ref });
    }
  }
}

/** A cut through a member: two bars with a gap between them. */
function addCut({ sketch, view }: Sheet, { axes }: Prepared, member: string, index: number): void {
  const axis = axes.get(member);
  if (!axis) return;
  const middle = view.at(axis.at(0.5 * axis.length));
  const [along, out] = [view.direction(axis.along), view.direction(axis.left)];
  const ref = { of: 'redundant', id: `${index}` } as const;
  sketch.line(beyond(middle, along, -2), beyond(middle, along, 2), { stroke: 'paper', width: 4 });
  for (const k of [-2.2, 2.2]) {
    const bar = beyond(middle, along, k);
    sketch.line(beyond(bar, out, -6), beyond(bar, out, 6), { stroke: 'ink', width: 1.2, ref });
  }
}

/**
 * The pair of moments at a hinge put in. A positive one has its tension on the right of the walk: at a member's end it
 * turns counter-clockwise on the member, at its start clockwise; on what stands across the hinge, the other way.
 */
function addMomentPair(
  { sketch, view, size }: Sheet,
  ready: Prepared,
  axis: MemberAxis,
  end: 'start' | 'end',
  text: string,
  style: Style,
): void {
  const joint = axis.member[end];
  const inward = view.direction(end === 'start' ? axis.along : scale(axis.along, -1));
  const whole = hingesOf(ready.frame).joints.has(joint);
  const hinge = beyond(view.at(axis[end]), inward, whole ? 0 : 5);
  const others = directionsFrom(joint, ready.axes)
    .map(view.direction)
    .filter((v) => lengthOf(subtract(v, inward)) > 1e-6);
  const across = others.length === 1 && others[0] ? others[0] : scale(inward, -1);
  const sense = end === 'end' ? -1 : 1;
  const half = 0.75;
  const arc = (toward: Point, sign: number) => {
    const middle = Math.atan2(toward.y, toward.x);
    addTurnArrow(sketch, hinge, 11, middle - sign * half, middle + sign * half, style);
  };
  arc(inward, sense);
  const support = ready.frame.joints.find((j) => j.id === joint)?.support;
  if (others.length > 0 || support?.turn === 'held') arc(across, -sense);
  const spots = [0.9, -0.9, 1.6, -1.6, 2.4, -2.4].map((angle) => ({
    at: hinge,
    toward: unit(turn(inward, angle)),
    gap: 12,
  })) as [LabelSpot, ...LabelSpot[]];
  sketch.label({ text, size, tone: 'pen', spots, rank: 1, ref: style.ref });
}
