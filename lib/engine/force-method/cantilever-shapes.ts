import type { LocalLoads } from '../diagrams/local-loads';
import { cubicSpandrel, rectangle, type Shape, spandrel, triangle } from './part-shapes';
import type { MomentPart } from './work';

/**
 * What the loads of a member draw on the cantilever that is held at `tall` and free at the other end: spandrels under
 * distributed loads, triangles behind point loads, rectangles behind couples.
 */
export function cantileverShapes(
  loads: LocalLoads,
  L: number,
  tall: 'start' | 'end',
): { shape: Shape; due: MomentPart['due'] }[] {
  const from = (shape: Shape, index: number) => ({ shape, due: { kind: 'load' as const, index } });
  const spread = loads.spread.flatMap((w) => {
    // Measured from the free end: t1 to t2, intensities there.
    const [t1, t2] = tall === 'end' ? [w.from, w.to] : [L - w.to, L - w.from];
    const [q1, q2] = tall === 'end' ? w.across : [w.across[1], w.across[0]];
    return spreadBehind(t1, t2, q1, q2, L, tall).map((s) => from(s, w.index));
  });
  const points = loads.points.flatMap((p) => {
    const t = tall === 'end' ? p.at : L - p.at;
    const shapes: Shape[] = [];
    const turn = tall === 'end' ? -p.couple : p.couple;
    if (p.across !== 0) shapes.push(place(t, L, L, tall, (a, b) => triangle(a, b, p.across * (L - t), tall)));
    if (p.couple !== 0) shapes.push(place(t, L, L, tall, (a, b) => rectangle(a, b, turn)));
    return shapes.map((s) => from(s, p.index));
  });
  return [...spread, ...points];
}

function spreadBehind(
  t1: number,
  t2: number,
  q1: number,
  q2: number,
  L: number,
  tall: 'start' | 'end',
): Shape[] {
  const l = t2 - t1;
  const shapes: Shape[] = [];
  if (q1 !== 0) shapes.push(place(t1, t2, L, tall, (a, b) => spandrel(a, b, (q1 * l * l) / 2, tall)));
  if (q2 !== q1)
    shapes.push(place(t1, t2, L, tall, (a, b) => cubicSpandrel(a, b, ((q2 - q1) * l * l) / 6, tall)));
  if (t2 >= L) return shapes;
  const force = ((q1 + q2) / 2) * l;
  const near = ((2 * q1 + q2) / 6) * l * l;
  const low = tall === 'end' ? 'start' : 'end';
  shapes.push(place(t2, L, L, tall, (a, b) => triangle(a, b, near, low)));
  shapes.push(place(t2, L, L, tall, (a, b) => triangle(a, b, near + force * (L - t2), tall)));
  return shapes;
}

/** From distances to the free end to places along the member. */
function place(
  t1: number,
  t2: number,
  L: number,
  tall: 'start' | 'end',
  shape: (from: number, to: number) => Shape,
): Shape {
  return tall === 'end' ? shape(t1, t2) : shape(L - t2, L - t1);
}
