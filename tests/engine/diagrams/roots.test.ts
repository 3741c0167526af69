import fc from 'fast-check';
import { expect, test } from 'vitest';
import { evaluate, multiply } from '@/lib/engine/diagrams/polynomial';
import { rootsBetween } from '@/lib/engine/diagrams/roots';

const product = (roots: readonly number[]) => roots.reduce((p, r) => multiply(p, [-r, 1]), [1]);

test('finds every root of a product of distinct factors, whatever its degree', () => {
  const places = fc.uniqueArray(fc.integer({ min: 0, max: 40 }), { minLength: 1, maxLength: 5 });
  fc.assert(
    fc.property(places, fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (tenths, size) => {
      const roots = tenths.map((t) => t / 10).sort((a, b) => a - b);
      const found = rootsBetween(
        product(roots).map((c) => c * size),
        0,
        4,
      );
      expect(found.length).toBe(roots.length);
      found.forEach((x, i) => {
        expect(Math.abs(x - (roots[i] as number))).toBeLessThan(1e-9);
      });
    }),
    { numRuns: 500 },
  );
});

test('finds a root where the function only touches zero', () => {
  expect(rootsBetween([4, -4, 1], 0, 3)).toEqual([2]);
  const [touching] = rootsBetween(product([1, 1, 5]), 0, 3);
  expect(touching).toBeCloseTo(1, 12);
});

test('a constant has no roots, and zero throughout has none that could be named', () => {
  expect(rootsBetween([3], 0, 1)).toEqual([]);
  expect(rootsBetween([0, 0, 0], 0, 1)).toEqual([]);
});

test('a cubic term that is rounding only does not invent roots', () => {
  expect(rootsBetween([-6, 0, 24, 1e-16], 0, 1)).toEqual([0.5]);
});

test('two close roots are both found', () => {
  const found = rootsBetween(product([0.3, 0.3001, 0.9]), 0, 1);
  expect(found.length).toBe(3);
  for (const x of found) expect(Math.abs(evaluate(product([0.3, 0.3001, 0.9]), x))).toBeLessThan(1e-14);
});
