import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dimensions } from '@/lib/engine/derivation/dimensions';
import {
  type Expression,
  evaluate,
  negative,
  product,
  quotient,
  sum,
  type Value,
  valuesOf,
} from '@/lib/engine/derivation/expression';
import { fitColumns, fitFigures, fitTerms } from '@/lib/engine/derivation/precision';
import { roundTo } from '@/lib/engine/derivation/round-to';

const value = (v: number, decimals: number): Value => ({
  kind: 'value',
  value: v,
  dimension: dimensions.pure,
  decimals,
});

/** A substitution may miss its printed result by one unit of the last figure. */
const unit = (decimals: number) => 10 ** -decimals;

const missed = (e: Expression, result: number, decimals: number) =>
  Math.abs(evaluate(e, 'printed') - roundTo(result, decimals)) / unit(decimals);

describe('the figures of a line', () => {
  it('stay as they are when they give the printed result', () => {
    const e = product(value(24.6, 2), value(20, 2));
    expect(fitFigures(e, 492, { decimals: 2 })).toEqual(e);
  });

  it('grow where a product of rounded factors would miss it', () => {
    const e = product(value(3.90834, 2), value(21, 2));
    const fitted = fitFigures(e, evaluate(e), { decimals: 2 });
    expect(missed(e, evaluate(e), 2)).toBeGreaterThan(1);
    expect(missed(fitted, evaluate(e), 2)).toBeLessThanOrEqual(1);
  });

  it('grow in the value whose rounding weighs most', () => {
    const e = product(value(0.0123456, 3), value(1234.5, 1));
    const fitted = fitFigures(e, evaluate(e), { decimals: 2 });
    const [first, second] = valuesOf(fitted);
    expect(first?.decimals).toBeGreaterThan(3);
    expect(second?.decimals).toBe(1);
  });

  it('give the printed result for any numbers', () => {
    const number = fc.double({ min: -500, max: 500, noNaN: true });
    const positive = fc.double({ min: 0.5, max: 60, noNaN: true });
    fc.assert(
      fc.property(number, number, positive, number, (a, b, c, d) => {
        const e = sum(quotient(product(value(a, 2), value(b, 2)), value(c, 2)), negative(value(d, 3)));
        const fitted = fitFigures(e, evaluate(e), { decimals: 3 });
        expect(missed(fitted, evaluate(e), 3)).toBeLessThanOrEqual(1);
      }),
      { seed: 7, numRuns: 300 },
    );
  });

  it('are refused to a formula that does not give its result', () => {
    expect(() => fitFigures(product(value(2, 0), value(3, 0)), 7, { decimals: 2 })).toThrow(/formula/);
  });
});

describe('the columns of a table', () => {
  it('share one count of decimals that makes every computed cell work', () => {
    const row = (area: number, ordinate: number) => ({ area, ordinate, value: area * ordinate });
    const rows = [row(759.375, 0.544444444), row(22.2264, -0.666666667), row(163.6992, 1 / 3)];
    const rule = {
      column: 'value' as const,
      from: ['area', 'ordinate'] as const,
      work: (r: { area: number; ordinate: number }) => r.area * r.ordinate,
    };
    const d = fitColumns(rows, { area: 2, ordinate: 2, value: 3 }, [rule]);
    for (const r of rows) {
      const worked = roundTo(r.area, d.area) * roundTo(r.ordinate, d.ordinate);
      expect(Math.abs(worked - roundTo(r.value, 3))).toBeLessThanOrEqual(unit(3));
    }
    expect(d.value).toBe(3);
  });

  it('carry a figure more than their sum where rounding would add up', () => {
    const thirds = Array.from({ length: 7 }, () => 1 / 3);
    expect(fitTerms(thirds, 2)).toBe(3);
    expect(fitTerms([0.25, 0.5], 2)).toBe(2);
  });
});

describe('roundTo', () => {
  it('has no negative zero', () => {
    expect(Object.is(roundTo(-0.0004, 3), 0)).toBe(true);
    expect(roundTo(-0.0006, 3)).toBe(-0.001);
  });

  it('gives the very number that the print reads as, on halves and off them', () => {
    const double = fc.double({ min: -1e9, max: 1e9, noNaN: true });
    const half = fc.integer({ min: -1e6, max: 1e6 }).map((n) => (2 * n + 1) / 2000);
    fc.assert(
      fc.property(fc.oneof(double, half), fc.integer({ min: 0, max: 12 }), (v, decimals) => {
        expect(Math.abs(roundTo(v, decimals))).toBe(Number(Math.abs(v).toFixed(decimals)));
      }),
      { numRuns: 5000 },
    );
  });
});
