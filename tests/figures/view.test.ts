import { describe, expect, it } from 'vitest';
import { roundLength, usualRatios, viewAt } from '@/lib/figures/view';

const first = (ratios: Generator<number>) => ratios.next().value;

describe('the scale of a drawing', () => {
  it('prints one metre at 1:100 as 10 mm', () => {
    // 10 mm = 10/25.4 in = 28.346 pt.
    expect(viewAt(100, 'SI').perUnit).toBeCloseTo((10 / 25.4) * 72, 9);
  });

  it('prints eight feet at 1:96 as one inch', () => {
    expect(8 * viewAt(96, 'US').perUnit).toBeCloseTo(72, 9);
  });

  it('turns y down on the page', () => {
    expect(viewAt(100, 'SI').at({ x: 0, y: 1 }).y).toBeLessThan(0);
    expect(viewAt(100, 'SI').direction({ x: 0, y: 1 })).toEqual({ x: 0, y: -1 });
  });

  it('begins with the largest usual scale that has room', () => {
    // 9 m in 400 pt need 1:63.8; the next usual scale is 1:70.
    expect(first(usualRatios(9, 400, 'SI'))).toBe(70);
    // 40 ft in 400 pt need 1:86.4; the next is 1:96, an eighth of an inch to the foot.
    expect(first(usualRatios(40, 400, 'US'))).toBe(96);
  });

  it('grows without end', () => {
    const ratios = usualRatios(1, 72, 'SI');
    const list = Array.from({ length: 60 }, () => first(ratios) ?? 0);
    expect(list.toSorted((a, b) => a - b)).toEqual(list);
    expect(new Set(list).size).toBe(60);
  });

  it('measures its bar in 1, 2 or 5', () => {
    expect(roundLength(viewAt(100, 'SI'), 72)).toBe(2);
    expect(roundLength(viewAt(96, 'US'), 72)).toBe(5);
  });
});
