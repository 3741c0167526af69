import type { StaticState } from '@/lib/engine/solution';
import type { Quantity } from '@/lib/model/quantity';
import { addReactions } from './add-reactions';
import { addRedundants } from './add-redundants';
import { quantityInWords } from './describe-redundants';
import { addCurves, curvesOf } from './draw-diagram';
import { withSupportAxes } from './draw-primary';
import { addMeasures, addStructure, prepare, type Show } from './draw-structure';
import type { Drawing } from './drawing';
import { type DrawOptions, fitDrawing } from './fit-drawing';
import type { Frame } from './member-axis';
import { greatestOf } from './polynomial-curve';
import { releaseQuantities } from './release-quantities';
import { exactDecimals } from './write-number';

export interface UnitOptions extends DrawOptions {
  /** Decimals of moments and of reactions; by default as many as tell them exactly, two to four. */
  decimals?: number;
  show?: Show;
}

/** A unit-load structure: X_i = 1 on the primary structure, its moments on the tension side, its reactions. */
export function drawUnit(
  frame: Frame,
  redundants: readonly Quantity[],
  index: number,
  state: Pick<StaticState, 'reactions' | 'members'>,
  options: UnitOptions,
): Drawing {
  const released = releaseQuantities(frame, redundants);
  const ready = prepare(released);
  const curves = curvesOf(ready, (id) => state.members[id]?.M);
  const greatest = Math.max(...curves.map((c) => greatestOf(c.curve)), 0);
  const decimals = options.decimals ?? exactDecimals([greatest], 0, 3);
  const quantity = redundants[index];
  const alt = `Unit-load structure ${index + 1}: ${quantity ? quantityInWords(quantity) : ''} is 1; greatest moment ${Number(greatest.toPrecision(4))}.`;
  return fitDrawing(frame, options, alt, (sheet) => {
    addCurves(sheet, ready, curves, { which: 'M', greatest, decimals, zeros: false });
    addStructure(sheet, ready, { thin: true, ...options.show });
    addRedundants(sheet, { ...ready, frame: withSupportAxes(released, frame) }, redundants, (i) =>
      i === index ? `X_{${i + 1}}=1` : undefined,
    );
    addReactions(sheet, ready, state.reactions, options.decimals);
    addMeasures(sheet, ready, options.show ?? {});
  });
}
