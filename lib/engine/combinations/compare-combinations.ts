import type { Analysis, Combination } from '@/lib/model/analysis';
import { extremes } from '../diagrams/piecewise';
import type { CombinationResult } from '../solution';
import { type ForceName, forceNames, ofPurpose } from './envelopes';

/**
 * The proof that one combination governs: the exact extreme of every combination on a member, the governing one first.
 * `share` is the value over the governing one's, 1 for itself; absent where the governing value is zero.
 */
export interface Governing {
  member: string;
  force: ForceName;
  bound: 'max' | 'min';
  by: string;
  rows: { id: string; value: number; s: number; share?: number }[];
}

export function compareCombinations(
  analysis: Analysis,
  combinations: readonly CombinationResult[],
  purpose: Combination['purpose'],
): Governing[] {
  return analysis.members.flatMap((m) => {
    const named = ofPurpose(analysis, combinations, purpose, m.id);
    if (named.length === 0) return [];
    return forceNames.flatMap((force) => {
      const all = named.map(({ id, forces }) => ({ id, ...extremes(forces[force]) }));
      return (['max', 'min'] as const).map((bound): Governing => {
        const sign = bound === 'max' ? -1 : 1;
        const sorted = all
          .map((a) => ({ id: a.id, value: a[bound].value, s: a[bound].s }))
          .sort((a, b) => sign * (a.value - b.value));
        const [first] = sorted;
        if (!first) throw new Error('nothing to compare');
        const rows = sorted.map((r) => ({
          ...r,
          share: first.value === 0 ? undefined : r.value / first.value,
        }));
        return { member: m.id, force, bound, by: first.id, rows };
      });
    });
  });
}
