import type { UnitSet } from '@/lib/model/analysis';
import type { Sheet } from './fit-drawing';
import { roundLength } from './view';
import { exactDecimals, writeNumber } from './write-number';

const unitOf = { US: 'ft', SI: 'm' };

/** A scale bar under all that is drawn so far: true however the drawing is enlarged. */
export function addScaleBar({ sketch, view, size }: Sheet, units: UnitSet): void {
  const { left, bottom } = sketch.bounds;
  const length = roundLength(view, 72);
  const [y, end] = [bottom + 20, left + length * view.perUnit];
  const decimals = exactDecimals([length], 0, 3);
  sketch.line({ x: left, y }, { x: end, y }, { stroke: 'ink2', width: 1 });
  for (const [value, unit] of [
    [0, ''],
    [length, `\\unit{${unitOf[units]}}`],
  ] as const) {
    const x = left + value * view.perUnit;
    sketch.line({ x, y: y - 3 }, { x, y: y + 3 }, { stroke: 'ink2', width: 1 });
    sketch.label({
      text: `$${writeNumber(value, value === 0 ? 0 : decimals, units)}${unit}$`,
      size: size * 0.82,
      tone: 'ink2',
      spots: [{ at: { x, y: y - 3 }, toward: { x: 0, y: -1 }, gap: 1 }],
      rank: 0,
    });
  }
}
