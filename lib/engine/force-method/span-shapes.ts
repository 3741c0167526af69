import { cubic, parabola, peakedTriangle, type Shape, triangle } from './part-shapes';

/**
 * What a distributed load across the member, from `w.from` to `w.to`, draws on a simple span from `a` to `b`: under the
 * load a trapezoid as two triangles and a parabola or cubics on it, beside it a triangle each. Loads to the left of the
 * walk are positive and draw negative moments.
 */
export function spreadShapes(
  w: { from: number; to: number; across: [number, number] },
  a: number,
  b: number,
): Shape[] {
  const [q1, q2] = w.across;
  const l = w.to - w.from;
  const shapes: Shape[] = [];
  if (w.from > a || w.to < b) {
    const force = ((q1 + q2) / 2) * l;
    const moment = ((q1 + 2 * q2) / 6) * l * l + force * (w.from - a);
    const end = -moment / (b - a);
    const start = -force - end;
    const left = start * (w.from - a);
    const right = end * (b - w.to);
    if (w.from > a) shapes.push(triangle(a, w.from, left, 'end'), triangle(w.from, w.to, left, 'start'));
    if (w.to < b) shapes.push(triangle(w.from, w.to, right, 'end'), triangle(w.to, b, right, 'start'));
  }
  const even = q1 * q2 > 0 ? (Math.abs(q1) < Math.abs(q2) ? q1 : q2) : 0;
  if (even !== 0) shapes.push(parabola(w.from, w.to, (-even * l * l) / 8));
  if (q2 !== even) shapes.push(cubic(w.from, w.to, (-(q2 - even) * l * l) / 6, 'end'));
  if (q1 !== even) shapes.push(cubic(w.from, w.to, (-(q1 - even) * l * l) / 6, 'start'));
  return shapes;
}

/** What a point force across or a couple draws on a simple span from `a` to `b`. */
export function pointShapes(
  p: { at: number; across: number; couple: number },
  a: number,
  b: number,
): Shape[] {
  const l = b - a;
  const [left, right] = [p.at - a, b - p.at];
  const shapes: Shape[] = [];
  if (p.across !== 0) shapes.push(peakedTriangle(a, b, p.at, (-p.across * left * right) / l));
  if (p.couple !== 0) {
    shapes.push(triangle(a, p.at, (p.couple * left) / l, 'end'));
    shapes.push(triangle(p.at, b, (-p.couple * right) / l, 'start'));
  }
  return shapes;
}
