import type { Drawing, Shape, ShapeRef, Tone } from './drawing';
import type { Measure } from './measure-text';
import { flatten, type PathCommand, pathData, round } from './path';
import { type LabelBox, type LabelWish, type PlacedLabel, placeLabels } from './place-labels';
import { beyond, type Point, scale, subtract, unit } from './vector';

export interface Style {
  stroke?: Tone;
  width?: number;
  dash?: readonly number[];
  fill?: Tone;
  ref?: ShapeRef;
  /** A shape that labels may cover: washes, ordinates, the grid. */
  quiet?: boolean;
}

/** A straight piece of ink that labels keep clear of. */
export interface Ink {
  a: Point;
  b: Point;
}

interface Finish {
  alt: string;
  title?: { text: string; size: number };
  /** Labels keep within the width rather than in their best places. */
  holdLabels?: boolean;
}

/** Shapes of a drawing while it is made, in points with y down and the origin anywhere. */
export class Sketch {
  readonly ink: Ink[] = [];
  private readonly laid: ((shift: Point) => Shape)[] = [];
  private readonly wishes: LabelWish[] = [];
  private readonly box: LabelBox = { left: Infinity, top: Infinity, right: -Infinity, bottom: -Infinity };

  constructor(readonly measure: Measure) {}

  line(a: Point, b: Point, style: Style): void {
    this.reach(a, b);
    this.leave([a, b], style);
    this.laid.push((o) => ({
      kind: 'line',
      x1: round(a.x + o.x),
      y1: round(a.y + o.y),
      x2: round(b.x + o.x),
      y2: round(b.y + o.y),
      ...strokes(style),
    }));
  }

  poly(points: readonly Point[], closed: boolean, style: Style): void {
    this.reach(...points);
    this.leave(closed && points[0] ? [...points, points[0]] : points, style);
    this.laid.push((o) => ({
      kind: 'poly',
      points: points.map((p) => [round(p.x + o.x), round(p.y + o.y)]),
      closed,
      ...strokes(style),
    }));
  }

  path(commands: readonly PathCommand[], style: Style): void {
    const run = flatten(commands);
    this.reach(...run);
    this.leave(run, style);
    this.laid.push((o) => ({ kind: 'path', d: pathData(commands, o), ...strokes(style) }));
  }

  circle(centre: Point, r: number, style: Style): void {
    const corner = { x: r, y: r };
    this.reach(subtract(centre, corner), beyond(centre, corner, 1));
    for (const v of [corner, { x: r, y: -r }])
      this.leave([beyond(centre, v, -0.7), beyond(centre, v, 0.7)], style);
    this.laid.push((o) => ({
      kind: 'circle',
      cx: round(centre.x + o.x),
      cy: round(centre.y + o.y),
      r,
      ...strokes(style),
    }));
  }

  /** A straight arrow; the head is filled in the colour of the stroke. */
  arrow(tail: Point, tip: Point, style: Style, head = 6): void {
    const along = unit(subtract(tip, tail));
    this.line(tail, beyond(tip, along, -head * 0.7), style);
    this.head(tip, along, style, head);
  }

  head(tip: Point, along: Point, style: Style, head = 6): void {
    const side = scale({ x: -along.y, y: along.x }, head * 0.3);
    const back = beyond(tip, along, -head);
    this.poly([tip, beyond(back, side, 1), beyond(back, side, -1)], true, {
      fill: style.stroke,
      ref: style.ref,
    });
  }

  /** Keeps room for a label that will stand there, so that dimensions run beyond it. */
  reserve(...points: readonly Point[]): void {
    this.reach(...points);
  }

  /** Ink that is not seen: keeps labels out of a place that reads as one thing. */
  shade(a: Point, b: Point): void {
    this.leave([a, b], {});
  }

  label(wish: LabelWish): void {
    this.wishes.push(wish);
  }

  /** What was drawn so far, labels left out. */
  get bounds(): Readonly<LabelBox> {
    return { ...this.box };
  }

  /** Places the labels and crops to what was drawn, centred in `width`; a wider drawing keeps its own width. */
  finish(width: number, { alt, title, holdLabels }: Finish): Drawing {
    const middle = (this.box.left + this.box.right) / 2;
    const [from, to] = [middle - width / 2 + edge, middle + width / 2 - edge];
    const labels = placeLabels(this.wishes, this.ink, this.measure, holdLabels ? { from, to } : undefined);
    for (const { box } of labels) this.reach({ x: box.left, y: box.top }, { x: box.right, y: box.bottom });
    const lost = this.wishes.length - labels.length;
    const missing = lost === 0 ? '' : `${lost} ${lost === 1 ? 'label has' : 'labels have'} no room here`;
    const below = [title?.text, missing].filter((t) => t !== undefined && t !== '').join('; ');
    if (below !== '') labels.push(this.titleBelow({ text: below, size: title?.size ?? 9 }));
    const { left, top, right, bottom } = this.box;
    const drawn = right - left + 2 * edge;
    const full = Math.max(width, drawn);
    const shift = { x: edge - left + (full - drawn) / 2, y: edge - top };
    const shapes = this.laid.map((make) => make(shift));
    for (const { leader, shape } of labels) {
      if (leader) {
        const [a, b] = leader;
        shapes.push({
          kind: 'line',
          x1: round(a.x + shift.x),
          y1: round(a.y + shift.y),
          x2: round(b.x + shift.x),
          y2: round(b.y + shift.y),
          stroke: 'ink3',
          width: 0.5,
        });
      }
      shapes.push({ ...shape, x: round(shape.x + shift.x), y: round(shape.y + shift.y) });
    }
    return {
      width: round(full),
      height: round(bottom - top + 2 * edge),
      shapes,
      alt: missing === '' ? alt : `${alt} ${missing}.`,
    };
  }

  private titleBelow({ text, size }: { text: string; size: number }): PlacedLabel {
    const { width, height, depth } = this.measure(text, size);
    const { left, right, bottom } = this.box;
    const [x, y] = [(left + right) / 2, bottom + 0.8 * size + height];
    const box = { left: x - width / 2, right: x + width / 2, top: y - height, bottom: y + depth };
    this.reach({ x: box.left, y: box.top }, { x: box.right, y: box.bottom });
    return { box, shape: { kind: 'label', x, y, text, size, anchor: 'middle', tone: 'ink2' } };
  }

  private reach(...points: readonly Point[]): void {
    for (const { x, y } of points) {
      this.box.left = Math.min(this.box.left, x);
      this.box.right = Math.max(this.box.right, x);
      this.box.top = Math.min(this.box.top, y);
      this.box.bottom = Math.max(this.box.bottom, y);
    }
  }

  private leave(run: readonly Point[], style: Style): void {
    if (style.quiet) return;
    for (let i = 1; i < run.length; i++) this.ink.push({ a: run[i - 1] as Point, b: run[i] as Point });
  }
}

/** White around a finished drawing, points. */
const edge = 2;

function strokes({ stroke, width, dash, fill, ref }: Style) {
  return { stroke, width, dash: dash && [...dash], fill, ref };
}
