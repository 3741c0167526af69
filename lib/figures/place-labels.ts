import type { LabelShape, ShapeRef, Tone } from './drawing';
import { InkIndex } from './ink-index';
import type { Measure } from './measure-text';
import type { Ink } from './sketch';
import { size as distance, mix, type Point, subtract } from './vector';

/** A place for a label: beside `at`, in a direction from it. */
export interface LabelSpot {
  at: Point;
  toward: Point;
  /** Clear distance from `at`, points. */
  gap?: number;
}

/** A label that wants a place. The first free spot wins; when none is free, one farther out is sought. */
export interface LabelWish {
  text: string;
  size: number;
  spots: readonly [LabelSpot, ...LabelSpot[]];
  tone?: Tone;
  /** Degrees counter-clockwise; 90 for dimensions along a column. */
  turn?: 0 | 90;
  ref?: ShapeRef;
  /** Ink it names and never covers. */
  own?: readonly Ink[];
  /** Lower is placed first. */
  rank: number;
}

export interface LabelBox {
  left: number;
  top: number;
  right: number;
  bottom: number;
}

export interface PlacedLabel {
  shape: LabelShape;
  box: LabelBox;
  /** A thin line from the label to what it names, where it had to stand far off. */
  leader?: readonly [Point, Point];
}

const clear = 1.2;
const crossing = 8;
const farther = 2.5;
const leaderFrom = 16;
/** How many steps out a better place than a free one is sought. */
const better = 16;

/** How far from what it names, in steps, and over how much ink (as cost) a label may stand. */
interface Limits {
  rings: number;
  cost: number;
}
const everywhere: Limits = { rings: 32, cost: Number.POSITIVE_INFINITY };
const closeBy: Limits = { rings: 2, cost: 20 };

const beyondRoom = 60;

/** The stretch of the page that labels should keep within. */
interface Room {
  from: number;
  to: number;
}

interface Surroundings {
  ink: InkIndex;
  taken: InkIndex<LabelBox>;
  room?: Room;
}

/**
 * Places labels one after another so that no two overlap and none covers its own ink; other ink is avoided, and what
 * lies outside `room` even more. A structure so dense that not all find a place keeps only those that stand clear and
 * close by: the result is then shorter than the wishes.
 */
export function placeLabels(
  wishes: readonly LabelWish[],
  ink: readonly Ink[],
  measure: Measure,
  room?: Room,
): PlacedLabel[] {
  const index = new InkIndex(ink);
  const sorted = wishes.toSorted((a, b) => a.rank - b.rank);
  const placeAll = (limits: Limits): PlacedLabel[] => {
    const taken = new InkIndex<LabelBox>([]);
    return sorted.flatMap((wish) => {
      const label = place(wish, { ink: index, taken, room }, measure, limits);
      if (!label) return [];
      taken.addBox(label.box, label.box);
      return [label];
    });
  };
  const placed = placeAll(everywhere);
  return placed.length === wishes.length ? placed : placeAll(closeBy);
}

function place(
  wish: LabelWish,
  { ink, taken, room }: Surroundings,
  measure: Measure,
  limits: Limits,
): PlacedLabel | undefined {
  const box = measure(wish.text, wish.size);
  const [w, h] = wish.turn === 90 ? [box.height + box.depth, box.width] : [box.width, box.height + box.depth];
  const own = new InkIndex(wish.own ?? []);
  let best: { cost: number; rect: LabelBox; spot: LabelSpot } | undefined;
  const consider = (spot: LabelSpot, cost: number) => {
    if (best && best.cost <= cost) return;
    const rect = boxBeside(spot, w, h);
    if (taken.meets(grown(rect, clear)) || own.meets(rect)) return;
    const outside = room && (rect.left < room.from || rect.right > room.to) ? beyondRoom : 0;
    const total = cost + crossing * ink.count(rect) + outside;
    if (total <= limits.cost && (!best || total < best.cost)) best = { cost: total, rect, spot };
  };
  for (const [i, spot] of wish.spots.entries()) consider(spot, i);
  for (let ring = 1; best === undefined || (best.cost >= ring + 2 && ring <= better); ring++) {
    if (ring > limits.rings) return undefined;
    for (const spot of wish.spots) consider({ ...spot, gap: (spot.gap ?? 2) + ring * farther }, ring + 2);
    for (const toward of around) {
      consider({ ...wish.spots[0], toward, gap: (wish.spots[0].gap ?? 2) + ring * farther }, ring + 3);
    }
  }
  const { rect, spot } = best;
  return { shape: labelShape(wish, rect, spot, box), box: rect, leader: leaderOf(rect, spot.at) };
}

const around: readonly Point[] = Array.from({ length: 16 }, (_, i) => ({
  x: Math.cos((i * Math.PI) / 8),
  y: Math.sin((i * Math.PI) / 8),
}));

/** The box just outside a point in a direction: the side or corner that faces the point stays `gap` from it. */
function boxBeside({ at, toward, gap = 2 }: LabelSpot, w: number, h: number): LabelBox {
  const longest = Math.max(Math.abs(toward.x), Math.abs(toward.y)) || 1;
  const x = at.x + (toward.x / longest) * (w / 2 + gap);
  const y = at.y + (toward.y / longest) * (h / 2 + gap);
  return { left: x - w / 2, right: x + w / 2, top: y - h / 2, bottom: y + h / 2 };
}

const grown = (b: LabelBox, by: number): LabelBox => ({
  left: b.left - by,
  right: b.right + by,
  top: b.top - by,
  bottom: b.bottom + by,
});

function labelShape(
  wish: LabelWish,
  rect: LabelBox,
  spot: LabelSpot,
  box: { height: number; depth: number },
): LabelShape {
  const { text, size, tone, ref } = wish;
  const middle = (rect.left + rect.right) / 2;
  if (wish.turn === 90) {
    const y = (rect.top + rect.bottom) / 2;
    return {
      kind: 'label',
      x: rect.left + box.height,
      y,
      text,
      size,
      anchor: 'middle',
      turn: 90,
      tone,
      ref,
      halo: true,
    };
  }
  const y = rect.top + box.height;
  const beside = spot.at.x < rect.left ? 'start' : spot.at.x > rect.right ? 'end' : 'middle';
  const x = beside === 'start' ? rect.left : beside === 'end' ? rect.right : middle;
  return { kind: 'label', x, y, text, size, anchor: beside, tone, ref, halo: true };
}

function leaderOf(rect: LabelBox, at: Point): readonly [Point, Point] | undefined {
  const near = {
    x: Math.min(Math.max(at.x, rect.left), rect.right),
    y: Math.min(Math.max(at.y, rect.top), rect.bottom),
  };
  const gap = distance(subtract(near, at));
  if (gap < leaderFrom) return undefined;
  return [mix(near, at, 1 / gap), at];
}
