import type { Drawing } from './drawing';
import { estimateText, type Measure } from './measure-text';
import type { Frame } from './member-axis';
import { Sketch } from './sketch';
import { usualRatios, type View, viewAt } from './view';

/** What every drawing is told. */
export interface DrawOptions {
  /** Width to lay out for, points. A narrow drawing is laid out anew, not shrunk. */
  width: number;
  /** Greatest height, points; by default 0.62 of the width, at least 170. */
  maxHeight?: number;
  /** Size of values, points; by default 10.5, less in narrow drawings. */
  size?: number;
  /** Measures labels; by default an estimate. */
  measure?: Measure;
  /** Rich text set centred under the drawing: "$M$, case D, $\mathrm{kN\per m}$". */
  title?: string;
}

/** What the maker of a drawing works on. */
export interface Sheet {
  sketch: Sketch;
  view: View;
  /** Size of values, points. */
  size: number;
  /** Written after the title: what only the chosen scale tells. */
  note?: string;
}

const tries = 60;
/** A structure is never made smaller than this, points; its labels then stand wider than it. */
const least = 48;

/**
 * Lays out at coarser and coarser usual scales until the drawing, labels and all, has the width it is to have. Where
 * none will do, labels are held within the width; what is too wide even then keeps its own width.
 */
export function fitDrawing(
  frame: Frame,
  options: DrawOptions,
  alt: string,
  make: (sheet: Sheet) => void,
): Drawing {
  const { width, maxHeight = Math.max(170, 0.62 * width), measure = estimateText } = options;
  const size = options.size ?? sizeFor(width);
  const [wide, high] = [extent(frame.joints.map((j) => j.x)), extent(frame.joints.map((j) => j.y))];
  const [length, room] = wide / width >= high / maxHeight ? [wide, width] : [high, maxHeight];
  let narrowest: Drawing | undefined;
  for (const holdLabels of [false, true]) {
    let tried = 0;
    for (const ratio of usualRatios(length || 1, length ? room : room / 4, frame.units)) {
      const view = viewAt(ratio, frame.units);
      const sheet: Sheet = { sketch: new Sketch(measure), view, size };
      make(sheet);
      const title = [options.title, sheet.note].filter((t) => t !== undefined).join(', ');
      const drawing = sheet.sketch.finish(width, {
        alt,
        holdLabels,
        title: title === '' ? undefined : { text: title, size: 0.95 * size },
      });
      const small = high * view.perUnit < least;
      if (drawing.width <= width + 0.01 && (drawing.height <= maxHeight || small)) return drawing;
      if (!narrowest || drawing.width < narrowest.width) narrowest = drawing;
      if (Math.max(wide, high) * view.perUnit < least || ++tried === tries) break;
    }
  }
  if (!narrowest) throw new Error('there are no scales');
  return narrowest;
}

const extent = (values: readonly number[]): number => Math.max(...values) - Math.min(...values);

/** 10.5 pt in a drawing over the full width of a page, down to 7.5 pt where three stand side by side. */
export function sizeFor(width: number): number {
  return Math.min(10.5, Math.max(7.5, 7.5 + (width - 140) * 0.018));
}
