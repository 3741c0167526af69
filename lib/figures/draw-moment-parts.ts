import { valueAt } from '@/lib/engine/diagrams/piecewise';
import type { MomentPart } from '@/lib/engine/force-method/work';
import { addDiagram, spotsAt } from './add-diagram';
import { list, say } from './describe-structure';
import { addStructure, prepare, type Show } from './draw-structure';
import type { Drawing } from './drawing';
import { type DrawOptions, fitDrawing, type Sheet } from './fit-drawing';
import type { Frame } from './member-axis';
import { partCurve } from './part-curve';
import { greatestOf } from './polynomial-curve';
import { beyond, type Point } from './vector';
import { decimalsFor, writeNumber } from './write-number';

export interface PartsOptions extends DrawOptions {
  /** Rich text of a part's label, by its place in `parts`; by default its greatest ordinate, signed. */
  label?: (part: MomentPart, index: number) => string;
  decimals?: number;
  show?: Show;
}

/**
 * The named shapes of a primary moment diagram on the tension side, their centroids as crossed circles. Parts that
 * would cover one another stand in drawings of their own.
 */
export function drawMomentParts(
  frame: Frame,
  parts: readonly MomentPart[],
  options: PartsOptions,
): Drawing[] {
  const ready = prepare(frame);
  const greatest = Math.max(...parts.map((p) => greatestOf(partCurve(p))), 0);
  const decimals = options.decimals ?? decimalsFor([greatest]);
  const seen = parts
    .map((part, index) => ({ part, index }))
    .filter(({ part }) => Math.abs(part.height) > 1e-9 * greatest);
  return layersOf(seen).map((layer) => {
    const told = layer.map(({ part }) => `${part.shape} on ${part.member}, height ${say(part.height)}`);
    return fitDrawing(frame, options, `Moments by parts: ${list(told)}.`, (sheet) => {
      for (const { part, index } of layer) {
        const text =
          options.label?.(part, index) ?? `$${writeNumber(part.height, decimals, frame.units, true)}$`;
        const axis = ready.axes.get(part.member);
        if (axis) addPart(sheet, axis, part, text, (3.2 * sheet.size) / greatest);
      }
      addStructure(sheet, ready, { thin: true, names: options.width >= 200, ...options.show });
    });
  });
}

function addPart(
  sheet: Sheet,
  axis: Parameters<typeof addDiagram>[1],
  part: MomentPart,
  text: string,
  perValue: number,
): void {
  const curve = partCurve(part);
  const ref = { of: 'member', id: axis.member.id } as const;
  const { tip, out, ink } = addDiagram(sheet, axis, curve, { perValue, side: -1 }, ref);
  addCentroid(sheet, tip(part.centroid, valueAt(curve, part.centroid, 'left') / 2));
  const tall = tallPlace(part);
  const value = valueAt(curve, tall, 'left');
  sheet.sketch.label({
    text,
    size: sheet.size * 0.92,
    spots: spotsAt(tip(tall, value), out, value),
    own: ink,
    rank: 1,
    ref,
  });
}

/** Where a shape has its greatest ordinate. A cubic ξ − ξ³ has it at ξ = 1/√3. */
function tallPlace({ tall, from, to, shape, centroid }: MomentPart): number {
  const length = to - from;
  if (shape === 'cubic') {
    const grows = centroid - from > length / 2;
    return grows ? from + length / Math.sqrt(3) : to - length / Math.sqrt(3);
  }
  if (tall === 'start') return from;
  if (tall === 'end') return to;
  return shape === 'triangle' ? from + 3 * (centroid - from) - length : (from + to) / 2;
}

/** The sign of a centroid: a circle with a cross. */
function addCentroid({ sketch }: Sheet, at: Point): void {
  sketch.circle(at, 2.6, { stroke: 'ink', width: 0.8, fill: 'paper' });
  for (const v of [
    { x: 1, y: 0 },
    { x: 0, y: 1 },
  ]) {
    sketch.line(beyond(at, v, -4), beyond(at, v, 4), { stroke: 'ink', width: 0.7 });
  }
}

interface Layered {
  part: MomentPart;
  index: number;
}

function layersOf(parts: readonly Layered[]): Layered[][] {
  const layers: Layered[][] = [];
  parts.forEach(({ part, index }) => {
    const covers = ({ part: other }: Layered) =>
      other.member === part.member && other.from < part.to - 1e-9 && other.to > part.from + 1e-9;
    const free = layers.find((layer) => !layer.some(covers));
    if (free) free.push({ part, index });
    else layers.push([{ part, index }]);
  });
  return layers;
}
