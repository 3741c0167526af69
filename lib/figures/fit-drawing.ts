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
 * Lays out at coarser and coarser usual scales until the drawing, labels and all, has the width it is to have.
 */
export function fitDrawing(
  frame: Frame,
  options: DrawOptions,
  alt: string,
  make: (sheet: Sheet) => void,
): Drawing {
  const { width, maxHeight = Math.max(170, 0.62 * width), measure = estimateText } = options;
  const size = options.size ?? sizeFor(width);
  const [xs, ys] = [frame.joints.map((j) => j.x), frame.joints.map((j) => j.y)];
  const wide = Math.max(...xs) - Math.min(...xs);
  const high = Math.max(...ys) - Math.min(...ys);
  const [length, room] = wide / width >= high / maxHeight ? [wide, width] : [high, maxHeight];
  let drawing: Drawing | undefined;
  let tried = 0;
  for (const ratio of usualRatios(length || 1, length ? room : room / 4, frame.units)) {
    const sketch = new Sketch(measure);
    const view = viewAt(ratio, frame.units);
    const sheet: Sheet = { sketch, view, size };
    make(sheet);
    const title = [options.title, sheet.note].filter((t) => t !== undefined).join(', ');
    drawing = sketch.finish(width, alt, title ? { text: title, size: 0.95 * size } : undefined);
    const [w, h] = [wide * view.perUnit, high * view.perUnit];
    const fits = (drawing.width <= width + 0.01 || w < least) && (drawing.height <= maxHeight || h < least);
    if (fits || ++tried === tries) break;
  }
  if (!drawing) throw new Error('there are no scales');
  return drawing;
}

/** 10.5 pt in a drawing over the full width of a page, down to 7.5 pt where three stand side by side. */
export function sizeFor(width: number): number {
  return Math.min(10.5, Math.max(7.5, 7.5 + (width - 140) * 0.018));
}
