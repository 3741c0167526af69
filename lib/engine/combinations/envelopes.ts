import type { Analysis, Combination } from '@/lib/model/analysis';
import { extremes, valueAt } from '../diagrams/piecewise';
import type { CombinationResult, Envelope, Extreme } from '../solution';
import type { Forces } from './combine-results';

type Named = { id: string; forces: Forces };
export const forceNames = ['N', 'V', 'M'] as const;
export type ForceName = (typeof forceNames)[number];

/** Results of the combinations of one purpose on one member. */
export function ofPurpose(
  analysis: Analysis,
  combinations: readonly CombinationResult[],
  purpose: Combination['purpose'],
  member: string,
): Named[] {
  const ids = new Set(analysis.combinations.filter((c) => c.purpose === purpose).map((c) => c.id));
  return combinations
    .filter((c) => ids.has(c.id))
    .map((c) => ({ id: c.id, forces: c.members[member] as Forces }));
}

/**
 * Greatest and least N, V and M of every member at its ends and tenth points and wherever a combination has an extreme of
 * its own, each with the combination that gives it. Where a diagram jumps both sides count.
 */
export function envelopes(analysis: Analysis, combinations: readonly CombinationResult[]): Envelope[] {
  const purposes = (['strength', 'service'] as const).filter((purpose) =>
    analysis.combinations.some((c) => c.purpose === purpose),
  );
  return purposes.flatMap((purpose) =>
    analysis.members.map((m): Envelope => {
      const named = ofPurpose(analysis, combinations, purpose, m.id);
      const stations = stationsOf(named).map((s) => ({
        s,
        N: extremeAt(named, 'N', s),
        V: extremeAt(named, 'V', s),
        M: extremeAt(named, 'M', s),
      }));
      return { member: m.id, purpose, stations };
    }),
  );
}

function stationsOf(named: readonly Named[]): number[] {
  const L = named[0]?.forces.M.at(-1)?.to;
  if (L === undefined) throw new Error('an envelope without combinations');
  const places = new Set<number>();
  for (const { forces } of named) {
    for (const name of forceNames) {
      const { max, min } = extremes(forces[name]);
      places.add(max.s).add(min.s);
    }
  }
  const peaks = [...places];
  const tenths = Array.from({ length: 11 }, (_, i) => (i === 10 ? L : (i * L) / 10));
  const fresh = tenths.filter((s) => peaks.every((p) => Math.abs(p - s) > L * 1e-9));
  return [...peaks, ...fresh].sort((a, b) => a - b);
}

function extremeAt(named: readonly Named[], name: ForceName, s: number): Extreme {
  let found: Extreme | undefined;
  for (const { id, forces } of named) {
    for (const side of ['left', 'right'] as const) {
      const value = valueAt(forces[name], s, side);
      found ??= { max: value, maxBy: id, min: value, minBy: id };
      if (value > found.max) found = { ...found, max: value, maxBy: id };
      if (value < found.min) found = { ...found, min: value, minBy: id };
    }
  }
  if (!found) throw new Error('an envelope without combinations');
  return found;
}
