import { describe, expect, it } from 'vitest';
import type { MomentPart, PartShape } from '@/lib/engine/force-method/work';
import { drawMomentParts } from '@/lib/figures/draw-moment-parts';
import { partCurve } from '@/lib/figures/part-curve';
import { valueOn } from '@/lib/figures/polynomial-curve';
import { longBeam } from './sample-frames';

/** Factor of the area, and distance of the centroid from the low end, of tables of properties of areas (from memory). */
const table: [PartShape, MomentPart['tall'], number, number][] = [
  ['rectangle', 'end', 1, 1 / 2],
  ['triangle', 'end', 1 / 2, 2 / 3],
  ['triangle', 'start', 1 / 2, 1 / 3],
  ['parabola', 'peak', 2 / 3, 1 / 2],
  ['half-parabola', 'end', 2 / 3, 5 / 8],
  ['half-parabola', 'start', 2 / 3, 3 / 8],
  ['spandrel', 'end', 1 / 3, 3 / 4],
  ['spandrel', 'start', 1 / 3, 1 / 4],
  ['cubic-spandrel', 'end', 1 / 4, 4 / 5],
  ['cubic-spandrel', 'start', 1 / 4, 1 / 5],
  ['cubic', 'peak', 2 / 3, 8 / 15],
  ['cubic', 'peak', 2 / 3, 7 / 15],
];

const part = (shape: PartShape, tall: MomentPart['tall'], factor: number, centroid: number): MomentPart => ({
  member: 'A-B',
  shape,
  tall,
  from: 1,
  to: 5,
  height: 30,
  factor: { n: 1, d: 1 },
  area: factor * 4 * 30,
  centroid: 1 + 4 * centroid,
  due: { kind: 'load', index: 0 },
});

/** ∫ M ds and ∫ M s ds by Simpson's rule on many strips: exact to rounding for these powers. */
function integrals(p: MomentPart): [number, number] {
  let [area, moment] = [0, 0];
  for (const piece of partCurve(p)) {
    const h = (piece.to - piece.from) / 400;
    for (let i = 0; i < 400; i++) {
      for (const [k, w] of [
        [0, 1],
        [0.5, 4],
        [1, 1],
      ] as const) {
        const s = piece.from + (i + k) * h;
        area += (w * h * valueOn(piece, s)) / 6;
        moment += (w * h * s * valueOn(piece, s)) / 6;
      }
    }
  }
  return [area, moment / area];
}

describe('shapes of moment diagrams by parts', () => {
  it.each(table)('%s, tall at %s, encloses its area about its centroid', (shape, tall, factor, centroid) => {
    const p = part(shape, tall, factor, centroid);
    const [area, at] = integrals(p);
    expect(area).toBeCloseTo(p.area, 6);
    expect(at).toBeCloseTo(p.centroid, 6);
  });

  it('a triangle with its peak at a has its centroid at (l + a)/3', () => {
    const p = { ...part('triangle', 'peak', 1 / 2, 0), centroid: 1 + (4 + 1.5) / 3 };
    const [area, at] = integrals(p);
    expect(area).toBeCloseTo(60, 6);
    expect(at).toBeCloseTo(p.centroid, 6);
    expect(valueOn(partCurve(p)[1] ?? { from: 0, to: 1, c: [] }, 2.5)).toBeCloseTo(30, 9);
  });
});

describe('drawMomentParts', () => {
  const parts = [
    part('parabola', 'peak', 2 / 3, 0.5),
    { ...part('triangle', 'end', 1 / 2, 2 / 3), height: -12 },
  ];

  it('draws parts that would cover one another in drawings of their own', () => {
    expect(drawMomentParts(longBeam, parts, { width: 426 })).toHaveLength(2);
    const apart = parts.map((p, i) => ({ ...p, member: i === 0 ? 'A-B' : 'C-D' }));
    expect(drawMomentParts(longBeam, apart, { width: 426 })).toHaveLength(1);
  });

  it('writes the height of each with its sign', () => {
    const written = drawMomentParts(longBeam, parts, { width: 426 }).flatMap((d) =>
      d.shapes.flatMap((s) => (s.kind === 'label' && /\d/.test(s.text) ? [s.text] : [])),
    );
    expect(written).toEqual(['$+30.00$', '$-12.00$']);
  });
});
