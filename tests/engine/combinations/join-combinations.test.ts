import { expect, test } from 'vitest';
import { joinCombinations } from '@/lib/engine/combinations/join-combinations';
import type { Combination } from '@/lib/model/analysis';

const sum = (id: string, factors: Record<string, number>, more: Partial<Combination> = {}): Combination => ({
  id,
  purpose: 'strength',
  factors,
  ...more,
});

test('keeps the names of own sums and numbers a published one of the same name', () => {
  const joined = joinCombinations(
    [sum('1.4D', { D: 1.4 }), sum('1.2D+1.6L', { D: 1.2, L: 1.6 })],
    [sum('1.4D', { D: 1.35 }), sum('1.4D (2)', { D: 1.5 })],
  );
  expect(joined.map((c) => c.id)).toEqual(['1.4D (3)', '1.2D+1.6L', '1.4D', '1.4D (2)']);
});

test('lets a sum that both ask for stand once, with its source', () => {
  const published = sum('1.2D+1.6L', { D: 1.2, L: 1.6 }, { source: 'ASCE 7-22, 2.3.1' });
  const joined = joinCombinations([published], [sum('ULS 1', { L: 1.6, D: 1.2, W: 0 })]);
  expect(joined).toEqual([sum('ULS 1', { L: 1.6, D: 1.2, W: 0 }, { source: 'ASCE 7-22, 2.3.1' })]);
});

test('keeps the same sum for strength and for service apart', () => {
  const joined = joinCombinations(
    [sum('D+L', { D: 1, L: 1 }, { purpose: 'service' })],
    [sum('D+L', { D: 1, L: 1 })],
  );
  expect(joined.map((c) => [c.id, c.purpose])).toEqual([
    ['D+L (2)', 'service'],
    ['D+L', 'strength'],
  ]);
});

test('keeps numbered names within what a name may be', () => {
  const long = '1.2D+1.6L+0.5S+0.5W+0.3R';
  expect(long).toHaveLength(24);
  const [first] = joinCombinations([sum(long, { D: 1.2 })], [sum(long, { D: 1.3 })]);
  expect(first?.id).toBe('1.2D+1.6L+0.5S+0.5W+ (2)');
  expect(first?.id.length).toBeLessThanOrEqual(24);
});
