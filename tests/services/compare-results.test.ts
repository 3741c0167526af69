import { describe, expect, it } from 'vitest';
import { threeSpanBeam } from '@/lib/services/demo/demo-sheets';
import { solveDraft } from '@/lib/services/solve-draft';
import { storedResults } from '@/lib/services/stored-results';
import { compareResults } from '@/lib/services/verification/compare-results';

const solved = solveDraft(threeSpanBeam());
if (!solved.ok) throw new Error('the beam does not solve');
const text = JSON.stringify(storedResults(solved.solution));
const fresh = () => JSON.parse(text);

/** Sets the number at a place and answers the whole. */
function withNumber(place: string, change: (n: number) => number): unknown {
  const results = fresh();
  const keys = place.split('.');
  const last = keys.pop() as string;
  let at = results;
  for (const key of keys) at = at[key];
  at[last] = change(at[last]);
  return results;
}

describe('stored results held against a new solution', () => {
  it('agree with themselves, every one of them', () => {
    const found = compareResults(fresh(), fresh());
    expect(found.differing).toEqual([]);
    expect(found.compared).toBeGreaterThan(1000);
  });

  it.each([
    'reactions.D.reactions.1.value',
    'reactions.L.members.2-3.M.0.c.1',
    'envelopes.0.stations.3.M.max',
    'X.D.0',
  ])('show a change of one part in ten thousand at %s', (place) => {
    const found = compareResults(
      withNumber(place, (n) => n * 1.0001),
      fresh(),
    );
    expect(found.differing).toEqual([place]);
    expect(found.greatest).toBeGreaterThan(1e-6);
  });

  it('take a difference in the twelfth figure for rounding', () => {
    const rounded = withNumber('reactions.D.reactions.1.value', (n) => n * (1 + 1e-12));
    expect(compareResults(rounded, fresh()).differing).toEqual([]);
  });

  it('miss nothing that was left out or put in', () => {
    const less = fresh();
    delete less.reactions.L;
    expect(compareResults(less, fresh()).differing.length).toBeGreaterThan(100);
    expect(compareResults(fresh(), less).differing.length).toBeGreaterThan(100);
    const failed = fresh();
    failed.checks[0].holds = false;
    expect(compareResults(failed, fresh()).differing).toEqual(['checks.0.holds']);
  });

  it('call what is no number a difference', () => {
    expect(
      compareResults(
        withNumber('X.D.0', () => Number.NaN),
        fresh(),
      ).differing,
    ).toEqual(['X.D.0']);
  });
});
