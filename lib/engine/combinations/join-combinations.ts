import { type Combination, longestName } from '@/lib/model/analysis';
import { freeName } from '@/lib/model/free-name';

/**
 * The combinations of a published set and an office's own sums as one list, every name once. Own sums keep their names;
 * a published sum whose name an own one has gets a number behind it. Where both ask for the same sum for the same
 * purpose it stands once, under the own name, with the published source where the own one states none. Two own sums
 * of one name are left for `solve` to refuse.
 */
export function joinCombinations(
  published: readonly Combination[],
  own: readonly Combination[],
): Combination[] {
  const twins = new Map(published.map((c) => [sumKey(c), c]));
  const asked = new Set(own.map(sumKey));
  const taken = new Set(own.map((c) => c.id));
  const kept = published.flatMap((c) => {
    if (asked.has(sumKey(c))) return [];
    const id = freeName(c.id, taken, longestName);
    taken.add(id);
    return [{ ...c, id }];
  });
  return [...kept, ...own.map((c) => ({ ...c, source: c.source ?? twins.get(sumKey(c))?.source }))];
}

/** Equal for sums that come out alike; a case with the factor 0 does not act. */
function sumKey({ purpose, factors }: Combination): string {
  const acting = Object.entries(factors)
    .filter(([, f]) => f !== 0)
    .sort(([a], [b]) => (a < b ? -1 : 1));
  return JSON.stringify([purpose, acting]);
}
