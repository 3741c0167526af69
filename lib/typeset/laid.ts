import type { Face, Glyph } from '@/lib/typeset/face';

/**
 * A line of set matter as a flat list of marks. All lengths are in em of the size it will be drawn at; x runs right
 * from the start, y runs up from the baseline.
 */
export type Laid = {
  readonly width: number;
  /** Reach above the baseline. */
  readonly height: number;
  /** Reach below the baseline, positive. */
  readonly depth: number;
  readonly marks: readonly Mark[];
};

/** Neighbouring glyphs of one face, size and baseline. `advances` in em of the run's own size. */
export type GlyphMark = {
  readonly kind: 'glyphs';
  readonly face: Face;
  readonly size: number;
  readonly x: number;
  readonly y: number;
  readonly glyphs: readonly Glyph[];
  readonly advances: readonly number[];
  readonly colour?: string;
};

/** A filled rectangle with its lower left corner at (x, y): a fraction bar, the bar over a letter, a table rule. */
export type RuleMark = {
  readonly kind: 'rule';
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly colour?: string;
};

/** The outline of a rectangle, drawn inside its edges: \boxed. */
export type FrameMark = Omit<RuleMark, 'kind'> & { readonly kind: 'frame'; readonly thickness: number };

/** A straight stroke: \cancel. */
export type StrokeMark = {
  readonly kind: 'stroke';
  readonly x1: number;
  readonly y1: number;
  readonly x2: number;
  readonly y2: number;
  readonly thickness: number;
  readonly colour?: string;
};

/**
 * A filled outline: a surd, a brace, an arrow. `d` is SVG path data whose unit is 1/scale em and whose y runs down
 * from (x, y); only what lies inside `clip` shows.
 */
export type PathMark = {
  readonly kind: 'path';
  readonly d: string;
  readonly x: number;
  readonly y: number;
  readonly scaleX: number;
  readonly scaleY: number;
  readonly clip?: { readonly x: number; readonly y: number; readonly width: number; readonly height: number };
  readonly colour?: string;
};

export type Mark = GlyphMark | RuleMark | FrameMark | StrokeMark | PathMark;
