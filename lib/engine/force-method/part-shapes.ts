import type { MomentPart } from './work';

/** A shape on a member, without what draws it. */
export type Shape = Omit<MomentPart, 'member' | 'due'>;

/**
 * Shapes with their areas and centroids (AISC Manual, Table 17-27 as recalled; each confirmed by integration in the
 * tests). Heights are signed ordinates of M.
 */
export function rectangle(from: number, to: number, height: number): Shape {
  const l = to - from;
  return {
    shape: 'rectangle',
    from,
    to,
    tall: 'start',
    height,
    factor: { n: 1, d: 1 },
    area: l * height,
    centroid: from + l / 2,
  };
}

export function triangle(from: number, to: number, height: number, tall: 'start' | 'end'): Shape {
  return sided('triangle', from, to, height, tall, 2, 3);
}

/** Triangle over the whole length with its peak at `at`: centroid (l + a)/3. */
export function peakedTriangle(from: number, to: number, at: number, height: number): Shape {
  const l = to - from;
  return {
    shape: 'triangle',
    from,
    to,
    tall: 'peak',
    height,
    factor: { n: 1, d: 2 },
    area: (l * height) / 2,
    centroid: from + (l + at - from) / 3,
  };
}

export function parabola(from: number, to: number, height: number): Shape {
  const l = to - from;
  return {
    shape: 'parabola',
    from,
    to,
    tall: 'peak',
    height,
    factor: { n: 2, d: 3 },
    area: (2 * l * height) / 3,
    centroid: from + l / 2,
  };
}

/** Simple span under a load rising from 0 to w: M = (w l²/6)(x − x³), x = s/l; height w l²/6, area 1/4, centroid 8/15. */
export function cubic(from: number, to: number, height: number, tall: 'start' | 'end'): Shape {
  const l = to - from;
  const centroid = tall === 'end' ? from + (8 / 15) * l : to - (8 / 15) * l;
  return { shape: 'cubic', from, to, tall, height, factor: { n: 1, d: 4 }, area: (l * height) / 4, centroid };
}

/** Cantilever under uniform load. */
export function spandrel(from: number, to: number, height: number, tall: 'start' | 'end'): Shape {
  return sided('spandrel', from, to, height, tall, 3, 4);
}

/** Cantilever under a load rising from nothing at its free end. */
export function cubicSpandrel(from: number, to: number, height: number, tall: 'start' | 'end'): Shape {
  return sided('cubic-spandrel', from, to, height, tall, 4, 5);
}

/** Height × (x/l)^k from the low end: area 1/(k + 1), centroid 1/(k + 2) from the tall end. */
function sided(
  shape: 'triangle' | 'spandrel' | 'cubic-spandrel',
  from: number,
  to: number,
  height: number,
  tall: 'start' | 'end',
  d: number,
  part: number,
): Shape {
  const l = to - from;
  const centroid = tall === 'start' ? from + l / part : to - l / part;
  return { shape, from, to, tall, height, factor: { n: 1, d }, area: (l * height) / d, centroid };
}
