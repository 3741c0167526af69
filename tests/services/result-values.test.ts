import { describe, expect, it } from 'vitest';
import { pairValues } from '@/lib/services/result-values';

const value = (name: string, n: number) => ({ name, unit: 'kN', value: n });

describe('results of two revisions', () => {
  it('are paired by name, whatever their order', () => {
    expect(pairValues([value('a', 2), value('b', -4)], [value('b', -5), value('a', 2)])).toEqual([
      { name: 'b', unit: 'kN', before: -4, after: -5, change: -0.25 },
      { name: 'a', unit: 'kN', before: 2, after: 2, change: 0 },
    ]);
  });

  it('keep what only one side has', () => {
    expect(pairValues([value('gone', 1)], [value('new', 3)])).toEqual([
      { name: 'new', unit: 'kN', after: 3 },
      { name: 'gone', unit: 'kN', before: 1 },
    ]);
  });

  it('reckon no change against a value that is only rounding', () => {
    const [pair] = pairValues([value('a', 1e-13), value('b', 10)], [value('a', 2), value('b', 10)]);
    expect(pair?.change).toBeUndefined();
  });
});
