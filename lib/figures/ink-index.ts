import type { Ink } from './sketch';
import { cross, type Point, subtract } from './vector';

interface Box {
  left: number;
  top: number;
  right: number;
  bottom: number;
}

const cell = 24;

/** Pieces of ink, and boxes, found by where they lie: a grid of cells, so that large frames are drawn in good time. */
export class InkIndex<Mark = never> {
  private readonly cells = new Map<string, { box: Box; ink?: Ink; mark?: Mark }[]>();

  constructor(ink: readonly Ink[]) {
    for (const piece of ink) {
      const { a, b } = piece;
      const steps = Math.max(1, Math.ceil(Math.hypot(b.x - a.x, b.y - a.y) / cell));
      for (let i = 0; i < steps; i++) {
        const part = { a: between(a, b, i / steps), b: between(a, b, (i + 1) / steps) };
        this.put(boxOf(part), { ink: part });
      }
    }
  }

  addBox(box: Box, mark: Mark): void {
    this.put(box, { mark });
  }

  meets(box: Box): boolean {
    return this.count(box, 1) > 0;
  }

  /** How many pieces meet a box; counting stops at `most`. */
  count(box: Box, most = 6): number {
    const seen = new Set<unknown>();
    for (const key of keysOf(box)) {
      for (const entry of this.cells.get(key) ?? []) {
        if (!apart(entry.box, box) && (!entry.ink || crosses(entry.ink, box))) seen.add(entry);
        if (seen.size >= most) return seen.size;
      }
    }
    return seen.size;
  }

  private put(box: Box, what: { ink?: Ink; mark?: Mark }): void {
    const entry = { box, ...what };
    for (const key of keysOf(box)) {
      const list = this.cells.get(key);
      if (list) list.push(entry);
      else this.cells.set(key, [entry]);
    }
  }
}

function* keysOf(box: Box): Generator<string> {
  for (let i = Math.floor(box.left / cell); i <= Math.floor(box.right / cell); i++)
    for (let j = Math.floor(box.top / cell); j <= Math.floor(box.bottom / cell); j++) yield `${i} ${j}`;
}

const between = (a: Point, b: Point, t: number): Point => ({
  x: a.x + (b.x - a.x) * t,
  y: a.y + (b.y - a.y) * t,
});

const boxOf = ({ a, b }: Ink): Box => ({
  left: Math.min(a.x, b.x),
  right: Math.max(a.x, b.x),
  top: Math.min(a.y, b.y),
  bottom: Math.max(a.y, b.y),
});

const apart = (a: Box, b: Box): boolean =>
  a.right < b.left || a.left > b.right || a.bottom < b.top || a.top > b.bottom;

/** Whether a straight piece meets a box whose bounds it already meets: its line separates no corner from the others. */
function crosses({ a, b }: Ink, box: Box): boolean {
  const along = subtract(b, a);
  const corners = [
    { x: box.left, y: box.top },
    { x: box.right, y: box.top },
    { x: box.left, y: box.bottom },
    { x: box.right, y: box.bottom },
  ];
  const sides = corners.map((p) => Math.sign(cross(along, subtract(p, a))));
  return !(sides.every((s) => s > 0) || sides.every((s) => s < 0));
}
