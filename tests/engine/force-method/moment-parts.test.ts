import fc from 'fast-check';
import { expect, test } from 'vitest';
import { integralOfProduct, valueAt } from '@/lib/engine/diagrams/piecewise';
import {
  cubic,
  cubicSpandrel,
  parabola,
  peakedTriangle,
  rectangle,
  type Shape,
  spandrel,
  triangle,
} from '@/lib/engine/force-method/part-shapes';
import type { MomentPart } from '@/lib/engine/force-method/work';
import { solve } from '@/lib/engine/solve';
import type { AnalysisInput } from '@/lib/model/analysis';
import { joints, members, structure } from '../statics/build-structure';

/** Ordinate of a shape at s, from its definition. */
function ordinate(p: Shape, s: number, peak = (p.from + p.to) / 2): number {
  if (s < p.from || s > p.to) return 0;
  const l = p.to - p.from;
  const x = p.tall === 'start' ? (p.to - s) / l : (s - p.from) / l;
  switch (p.shape) {
    case 'rectangle':
      return p.height;
    case 'triangle':
      if (p.tall !== 'peak') return p.height * x;
      return p.height * (s <= peak ? (s - p.from) / (peak - p.from) : (p.to - s) / (p.to - peak));
    case 'parabola':
      return p.height * 4 * x * (1 - x);
    case 'spandrel':
      return p.height * x ** 2;
    case 'cubic-spandrel':
      return p.height * x ** 3;
    case 'cubic':
      return p.height * (x - x ** 3);
    default:
      throw new Error(p.shape);
  }
}

const shapes: [string, Shape, number?][] = [
  ['rectangle', rectangle(1, 4, 2)],
  ['triangle, tall at its start', triangle(1, 4, 2, 'start')],
  ['triangle, tall at its end', triangle(1, 4, 2, 'end')],
  ['triangle with a peak', peakedTriangle(1, 4, 2, 5), 2],
  ['parabola', parabola(1, 4, 2)],
  ['spandrel', spandrel(1, 4, 2, 'end')],
  ['cubic spandrel', cubicSpandrel(1, 4, 2, 'start')],
  ['cubic', cubic(1, 4, 2, 'end')],
  ['cubic from the other end', cubic(1, 4, 2, 'start')],
];

test.each(shapes)('area and centroid of a %s are those of its integral', (_, shape, peak) => {
  // Simpson's rule is exact for cubics on each half beside the peak; the moment of a cubic needs a finer one.
  const n = 3000;
  const h = (shape.to - shape.from) / n;
  let [area, moment] = [0, 0];
  for (let i = 0; i < n; i++) {
    const a = shape.from + i * h;
    for (const [s, weight] of [
      [a, 1],
      [a + h / 2, 4],
      [a + h, 1],
    ] as const) {
      const v = (weight * h * ordinate(shape, s, peak)) / 6;
      area += v;
      moment += v * s;
    }
  }
  expect(shape.area).toBeCloseTo(area, 9);
  expect(shape.centroid).toBeCloseTo(moment / area, 9);
  expect(shape.area).toBeCloseTo(
    (shape.factor.n / shape.factor.d) * (shape.to - shape.from) * shape.height,
    12,
  );
});

const value = fc.integer({ min: -20, max: 20 });
const place = fc.integer({ min: 0, max: 12 }).map((k) => k / 2);

const loads: fc.Arbitrary<AnalysisInput['cases'][number]['loads']> = fc.array(
  fc.oneof(
    fc.record({ a: place, v: value }).map(({ a, v }) => ({
      kind: 'point' as const,
      member: 'AB',
      at: a,
      direction: 'across' as const,
      value: v,
    })),
    fc
      .record({ a: place, v: value })
      .map(({ a, v }) => ({ kind: 'couple' as const, member: 'AB', at: a, value: v })),
    fc
      .record({ a: place, b: place, w1: value, w2: value })
      .filter(({ a, b }) => a < b)
      .map(({ a, b, w1, w2 }) => ({
        kind: 'distributed' as const,
        member: 'AB',
        from: a,
        to: b,
        direction: 'across' as const,
        w1,
        w2,
      })),
  ),
  { minLength: 1, maxLength: 4 },
);

const spans = {
  'a beam fixed at both ends': ['fixed', 'fixed', undefined],
  'a cantilever': ['fixed', undefined, undefined],
  'a cantilever from the right': [undefined, 'fixed', undefined],
  'a stepped beam': ['fixed', 'pin', [{ from: 2.5, EI: 500 }]],
} as const;

test.each(Object.entries(spans))('the parts of %s add up to its primary moments', (_, [a, b, steps]) => {
  fc.assert(
    fc.property(loads, (list) => {
      const result = solve(
        structure(
          joints(`A 0 0 ${a ?? ''}`.trim(), `B 6 0 ${b ?? ''}`.trim()),
          members('AB').map((m) => ({ ...m, steps: steps?.map((s) => ({ ...s })) })),
          [{ id: 'P', title: 'loads', nature: 'other', loads: list }],
        ),
      );
      if (!result.ok) throw new Error(result.refusal.message);
      const M = result.value.primary.loaded.P?.members.AB?.M ?? [];
      const parts = result.value.work.parts.P ?? [];
      const size = list.reduce(
        (t, l) =>
          t + ('value' in l ? Math.abs(l.value) * 6 : 'w1' in l ? (Math.abs(l.w1) + Math.abs(l.w2)) * 36 : 0),
        1,
      );
      for (let k = 0; k < 24; k++) {
        const s = 0.125 + k / 4.1;
        const total = parts.reduce((t, p) => t + ordinate(p, s, peakOf(p, list)), 0);
        expect(Math.abs(total - valueAt(M, s))).toBeLessThan(1e-9 * size);
      }
      const area = parts.reduce((t, p) => t + p.area, 0);
      expect(Math.abs(area - integralOfProduct(M, [{ from: 0, to: 6, c: [1] }]))).toBeLessThan(1e-9 * size);
    }),
    { numRuns: 150 },
  );
});

function peakOf(p: MomentPart, list: AnalysisInput['cases'][number]['loads']): number | undefined {
  const load = p.due.kind === 'load' ? list[p.due.index] : undefined;
  return load?.kind === 'point' ? load.at : undefined;
}

test('a cantilever under uniform load is one spandrel from its support', () => {
  const result = solve(
    structure(joints('A 0 0 fixed', 'B 4 0'), members('AB'), [
      {
        id: 'P',
        title: 'uniform',
        nature: 'other',
        loads: [{ kind: 'distributed', member: 'AB', direction: 'y', w1: -3, w2: -3 }],
      },
    ]),
  );
  if (!result.ok) throw new Error(result.refusal.message);
  expect(result.value.work.parts.P).toMatchObject([
    { shape: 'spandrel', tall: 'start', height: -24, area: -32, centroid: 1 },
  ]);
});
