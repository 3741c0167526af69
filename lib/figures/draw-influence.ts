import type { PiecewisePolynomial } from '@/lib/engine/diagrams/piecewise-polynomial';
import { addCurves, curvesOf } from './draw-diagram';
import { addMeasures, addStructure, prepare, type Show } from './draw-structure';
import type { Drawing } from './drawing';
import { type DrawOptions, fitDrawing } from './fit-drawing';
import type { Frame } from './member-axis';
import { greatestOf } from './polynomial-curve';
import { decimalsFor } from './write-number';

export interface InfluenceOptions extends DrawOptions {
  /** What the line is of, in words: "moment at B". */
  of: string;
  decimals?: number;
  show?: Show;
}

/** An influence line: the ordinate at a place is the quantity under a unit load there; positive on the left of the walk. */
export function drawInfluence(
  frame: Frame,
  lines: Readonly<Record<string, PiecewisePolynomial>>,
  options: InfluenceOptions,
): Drawing {
  const ready = prepare(frame);
  const curves = curvesOf(ready, (id) => lines[id]);
  const greatest = Math.max(...curves.map((c) => greatestOf(c.curve)), 0);
  const decimals = options.decimals ?? decimalsFor([greatest]);
  const alt = `Influence line of the ${options.of}; greatest ordinate ${Number(greatest.toPrecision(4))}.`;
  return fitDrawing(frame, options, alt, (sheet) => {
    addCurves(sheet, ready, curves, { which: 'V', greatest, decimals, zeros: true });
    addStructure(sheet, ready, { thin: true, ...options.show });
    addMeasures(sheet, ready, options.show ?? {});
  });
}
