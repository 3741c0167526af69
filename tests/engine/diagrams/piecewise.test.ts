import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  between,
  derivative,
  extremes,
  integral,
  integralOfProduct,
  sum,
  valueAt,
  zeros,
} from '@/lib/engine/diagrams/piecewise';

const step = [
  { from: 0, to: 2, c: [1] },
  { from: 2, to: 5, c: [-3, 1] },
];

test('where two pieces meet it tells the value on either side', () => {
  expect(valueAt(step, 2, 'left')).toBe(1);
  expect(valueAt(step, 2, 'right')).toBe(-3);
  expect(valueAt(step, 0, 'left')).toBe(1);
  expect(valueAt(step, 5, 'right')).toBe(0);
});

test('a sum keeps the jumps of both', () => {
  const other = [
    { from: 0, to: 3, c: [0, 1] },
    { from: 3, to: 5, c: [10] },
  ];
  const total = sum([
    { f: step, factor: 2 },
    { f: other, factor: 1 },
  ]);
  expect(total.map((p) => [p.from, p.to])).toEqual([
    [0, 2],
    [2, 3],
    [3, 5],
  ]);
  expect(valueAt(total, 2, 'left')).toBe(4);
  expect(valueAt(total, 2, 'right')).toBe(-4);
  expect(valueAt(total, 3, 'right')).toBe(6);
});

test('the slope of an antiderivative is the function itself', () => {
  const back = derivative(integral(step, 7));
  for (const s of [0, 1, 2, 3.5, 5]) expect(valueAt(back, s)).toBeCloseTo(valueAt(step, s), 14);
  expect(valueAt(integral(step, 7), 2, 'left')).toBe(valueAt(integral(step, 7), 2, 'right'));
});

test('extremes are found at peaks, at ends and on both sides of a jump', () => {
  const parabola = [{ from: 1, to: 5, c: [0, 3, -1] }];
  expect(extremes(parabola)).toEqual({ max: { s: 2.5, value: 2.25 }, min: { s: 5, value: -4 } });
  expect(extremes(step)).toEqual({ max: { s: 0, value: 1 }, min: { s: 2, value: -3 } });
});

test('zeros are found within pieces and where the function jumps through zero', () => {
  expect(zeros(step)).toEqual([2, 5]);
});

/** ∫ over [0, 1] of x^i x^k = 1/(i + k + 1). */
test('the product integral of powers is exact', () => {
  for (let i = 0; i < 6; i++) {
    for (let k = 0; k < 6; k++) {
      const power = (n: number) => [{ from: 0, to: 1, c: [...Array(n).fill(0), 1] }];
      expect(integralOfProduct(power(i), power(k))).toBeCloseTo(1 / (i + k + 1), 15);
    }
  }
});

test('product integrals over two parts add up to the whole', () => {
  const inside = fc.double({ min: 0.1, max: 4.9, noNaN: true });
  fc.assert(
    fc.property(
      inside,
      fc.array(fc.double({ min: -5, max: 5, noNaN: true }), { minLength: 1, maxLength: 4 }),
      (cut, c) => {
        const g = [{ from: 0, to: 5, c }];
        const part = (a: number, b: number) => integralOfProduct(between(step, a, b), between(g, a, b));
        const size = integralOfProduct(
          step.map((p) => ({ ...p, c: p.c.map(Math.abs) })),
          [{ from: 0, to: 5, c: c.map(Math.abs) }],
        );
        const whole = integralOfProduct(step, g);
        expect(Math.abs(part(0, cut) + part(cut, 5) - whole)).toBeLessThanOrEqual(1e-13 * (size + 1));
      },
    ),
    { numRuns: 300 },
  );
});
