/** A point or a direction of the plane. */
export interface Point {
  readonly x: number;
  readonly y: number;
}

export const add = (a: Point, b: Point): Point => ({ x: a.x + b.x, y: a.y + b.y });
export const subtract = (a: Point, b: Point): Point => ({ x: a.x - b.x, y: a.y - b.y });
export const scale = (a: Point, k: number): Point => ({ x: a.x * k, y: a.y * k });
export const dot = (a: Point, b: Point): number => a.x * b.x + a.y * b.y;
export const cross = (a: Point, b: Point): number => a.x * b.y - a.y * b.x;
export const size = (a: Point): number => Math.hypot(a.x, a.y);
export const mix = (a: Point, b: Point, share: number): Point => add(a, scale(subtract(b, a), share));
/** The point `length` from `from` in the direction of the unit vector `direction`. */
export const beyond = (from: Point, direction: Point, length: number): Point =>
  add(from, scale(direction, length));

/** The unit vector along `a`; of a zero vector, the unit vector to the right. */
export function unit(a: Point): Point {
  const length = size(a);
  return length === 0 ? { x: 1, y: 0 } : scale(a, 1 / length);
}

/** Turned by an angle in radians, from the x axis towards the y axis. */
export function turn(a: Point, angle: number): Point {
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  return { x: a.x * c - a.y * s, y: a.x * s + a.y * c };
}
