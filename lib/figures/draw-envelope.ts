import type { Envelope, Extreme } from '@/lib/engine/solution';
import { addCurves, curvesOf, type Which } from './draw-diagram';
import { addStructure, prepare, type Show } from './draw-structure';
import type { Drawing } from './drawing';
import { type DrawOptions, fitDrawing } from './fit-drawing';
import type { Frame } from './member-axis';
import { greatestOf } from './polynomial-curve';
import { decimalsFor } from './write-number';

export interface EnvelopeOptions extends DrawOptions {
  which: Which;
  decimals?: number;
  show?: Show;
}

/** Greatest and least N, V or M of every member over its combinations, straight between the stations. */
export function drawEnvelope(
  frame: Frame,
  envelopes: readonly Envelope[],
  options: EnvelopeOptions,
): Drawing {
  const { which } = options;
  const ready = prepare(frame);
  const bound = (pick: (e: Extreme) => number) =>
    curvesOf(ready, (id) => {
      const stations = envelopes.find((e) => e.member === id)?.stations ?? [];
      return stations.slice(1).map((b, i) => {
        const a = stations[i] ?? b;
        const [from, to] = [pick(a[which]), pick(b[which])];
        return { from: a.s, to: b.s, c: [from, b.s > a.s ? (to - from) / (b.s - a.s) : 0] };
      });
    });
  const [upper, lower] = [bound((e) => e.max), bound((e) => e.min)];
  const greatest = Math.max(...[...upper, ...lower].map((c) => greatestOf(c.curve)), 0);
  const decimals = options.decimals ?? decimalsFor([greatest]);
  const alt = `Envelope of ${which}: greatest value ${Number(greatest.toPrecision(4))}.`;
  return fitDrawing(frame, options, alt, (sheet) => {
    for (const curves of [upper, lower])
      addCurves(sheet, ready, curves, { which, greatest, decimals, zeros: false });
    addStructure(sheet, ready, { thin: true, names: options.width >= 200, ...options.show });
  });
}
