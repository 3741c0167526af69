import type { PiecewisePolynomial } from '@/lib/engine/diagrams/piecewise-polynomial';
import type { ShapeRef } from './drawing';
import type { Sheet } from './fit-drawing';
import type { MemberAxis } from './member-axis';
import type { PathCommand } from './path';
import type { LabelSpot } from './place-labels';
import { arcsOf, valueOn } from './polynomial-curve';
import type { Ink } from './sketch';
import { beyond, type Point, scale } from './vector';

/** How ordinates are drawn: points per unit of value, and the side a positive one lies on. */
export interface Ordinates {
  perValue: number;
  /** +1: left of the walk, as N and V. −1: right of the walk, the tension side of a positive moment. */
  side: 1 | -1;
}

const between = 8;

/** One diagram on its member: wash, ordinates, outline. Returns the place of an ordinate and the outline's ink. */
export function addDiagram(
  { sketch, view }: Sheet,
  axis: MemberAxis,
  curve: PiecewisePolynomial,
  ordinates: Ordinates,
  ref: ShapeRef,
): { tip: (s: number, value: number) => Point; out: Point; ink: Ink[] } {
  const out = scale(view.direction(axis.left), ordinates.side);
  const tip = (s: number, value: number): Point =>
    beyond(view.at(axis.at(s)), out, value * ordinates.perValue);
  const commands: PathCommand[] = [['M', tip(0, 0)]];
  for (const piece of curve) {
    commands.push(['L', tip(piece.from, valueOn(piece, piece.from))]);
    for (const { from, to, ordinates: o } of arcsOf(piece)) {
      const at = (k: 0 | 1 | 2 | 3) => tip(from + ((to - from) * k) / 3, o[k]);
      commands.push(['C', at(1), at(2), at(3)]);
    }
  }
  commands.push(['L', tip(axis.length, 0)]);
  sketch.path([...commands, ['Z']], { fill: 'wash', ref, quiet: true });
  const long = axis.length * view.perUnit;
  const count = Math.max(2, Math.round(long / between));
  for (let i = 1; i < count; i++) {
    const s = (i * axis.length) / count;
    const piece = curve.find((p) => s <= p.to) ?? curve.at(-1);
    const value = piece ? valueOn(piece, s) : 0;
    if (Math.abs(value * ordinates.perValue) < 1) continue;
    sketch.line(tip(s, 0), tip(s, value), { stroke: 'ink3', width: 0.35, quiet: true });
  }
  const start = sketch.ink.length;
  sketch.path(commands, { stroke: 'ink', width: 1, ref });
  return { tip, out, ink: sketch.ink.slice(start) };
}

/** Places for the label of an ordinate: beyond its tip, then to either side of it. */
export function spotsAt(tip: Point, out: Point, value: number): [LabelSpot, ...LabelSpot[]] {
  const away = scale(out, value < 0 ? -1 : 1);
  const along = { x: -away.y, y: away.x };
  const slanted = [1, -1].map((k) => ({ x: away.x + k * along.x, y: away.y + k * along.y }));
  const beside = [along, scale(along, -1)];
  return [
    { at: tip, toward: away, gap: 2.2 },
    ...slanted.map((toward) => ({ at: tip, toward, gap: 1.8 })),
    ...beside.map((toward) => ({ at: tip, toward, gap: 3 })),
  ];
}
