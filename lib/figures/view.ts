import type { UnitSet } from '@/lib/model/analysis';
import type { Point } from './vector';

/** From the model (length units, y up) to the page (points, y down, origin where the model has its own). */
export interface View {
  /** The scale is 1 : ratio. */
  ratio: number;
  /** Points on the page for one unit of length. */
  perUnit: number;
  at(p: Point): Point;
  /** A direction of the model on the page; keeps its length. */
  direction(v: Point): Point;
}

/** Points in one foot and in one metre (1 in = 72 pt = 25.4 mm). */
const points = { US: 72 * 12, SI: 72 / 0.0254 };

/** Usual drawing scales: decades of 1:10 in SI; of 1 in. = 1 ft (1:12) and its architect's parts in US sheets. */
const steps = {
  SI: [1, 1.2, 1.25, 1.5, 1.75, 2, 2.25, 2.5, 3, 3.5, 4, 4.5, 5, 6, 7, 8, 9],
  US: [1, 1.25, 4 / 3, 1.5, 5 / 3, 2, 2.5, 8 / 3, 3, 4, 5, 16 / 3, 6, 8].map((k) => k * 12),
};

export function viewAt(ratio: number, units: UnitSet): View {
  const perUnit = points[units] / ratio;
  return {
    ratio,
    perUnit,
    at: (p) => ({ x: p.x * perUnit, y: -p.y * perUnit }),
    direction: (v) => ({ x: v.x, y: -v.y }),
  };
}

/** Usual scales, coarser and coarser, from the first at which `length` takes no more than `room` points. */
export function* usualRatios(length: number, room: number, units: UnitSet): Generator<number> {
  const least = (length * points[units]) / Math.max(room, 1);
  const first = units === 'US' ? 12 : 1;
  let decade = 10 ** Math.floor(Math.log10(Math.max(least, Number.MIN_VALUE) / first));
  for (;;) {
    for (const step of steps[units]) if (step * decade >= least * (1 - 1e-12)) yield step * decade;
    decade *= 10;
  }
}

/** A round length (1, 2 or 5 times a power of ten) that takes at most `room` points. */
export function roundLength(view: View, room: number): number {
  const most = room / view.perUnit;
  const decade = 10 ** Math.floor(Math.log10(most));
  const step = [5, 2, 1].find((k) => k * decade <= most * (1 + 1e-12)) ?? 1;
  return step * decade;
}
