import type { Point } from './vector';

interface Layer {
  member: string;
  /** Which side of the member, +1 left of the walk. */
  side: number;
  from: number;
  to: number;
  height: number;
}

/** Keeps loads of one stretch from being drawn on top of each other: each stands on what is there already. */
export class LoadStack {
  private readonly layers: Layer[] = [];

  /** Height above the member, points, at which nothing stands yet on the stretch. */
  clear(member: string, side: number, from: number, to: number): number {
    const reach = 1e-9 * Math.max(Math.abs(from), Math.abs(to), 1);
    let height = 0;
    for (const l of this.layers) {
      const meets = l.member === member && l.side === side && l.from < to + reach && l.to > from - reach;
      if (meets && Math.min(l.to, to) - Math.max(l.from, from) > (from === to ? -reach : reach)) {
        height = Math.max(height, l.height);
      }
    }
    return height;
  }

  put(member: string, side: number, from: number, to: number, height: number): void {
    this.layers.push({ member, side, from, to, height });
  }
}

/** +1 where a force that acts along `direction` comes from the left of the walk, −1 from the right. */
export function sideOf(direction: Point, left: Point): number {
  return direction.x * left.x + direction.y * left.y <= 0 ? 1 : -1;
}
