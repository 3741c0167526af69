import type { Analysis } from '@/lib/model/analysis';
import { extremes, sum, valueAt } from '../diagrams/piecewise';
import type { PiecewisePolynomial } from '../diagrams/piecewise-polynomial';
import type { CaseResult, CombinationResult, Envelope, Extreme } from '../solution';

type Three = Pick<CaseResult['members'][string], 'N' | 'V' | 'M'>;

/** Every combination of the sheet as factored sums of its cases. */
export function combineResults(
  analysis: Analysis,
  cases: Readonly<Record<string, CaseResult>>,
): CombinationResult[] {
  return analysis.combinations.map(({ id, factors }) => {
    const terms = Object.entries(factors).map(([name, factor]) => ({
      result: cases[name] as CaseResult,
      factor,
    }));
    const add = (pick: (m: Three) => PiecewisePolynomial, member: string) =>
      sum(terms.map((t) => ({ f: pick(t.result.members[member] as Three), factor: t.factor })));
    const [first] = terms;
    const reactions = (first?.result.reactions ?? []).map((r, i) => ({
      quantity: r.quantity,
      value: terms.reduce((total, t) => total + t.factor * (t.result.reactions[i]?.value as number), 0),
    }));
    const members = Object.fromEntries(
      analysis.members.map((m) => [
        m.id,
        { N: add((d) => d.N, m.id), V: add((d) => d.V, m.id), M: add((d) => d.M, m.id) },
      ]),
    );
    return { id, reactions, members };
  });
}

/** Greatest and least of N, V, M at the ends, tenth points and extremes of every member, each with the combination that gives it. */
export function envelopes(analysis: Analysis, combinations: readonly CombinationResult[]): Envelope[] {
  const purposes = (['strength', 'service'] as const).filter((p) =>
    analysis.combinations.some((c) => c.purpose === p),
  );
  return purposes.flatMap((purpose) => {
    const ids = new Set(analysis.combinations.filter((c) => c.purpose === purpose).map((c) => c.id));
    const mine = combinations.filter((c) => ids.has(c.id));
    return analysis.members.map((m): Envelope => {
      const three = mine.map((c) => ({ id: c.id, d: c.members[m.id] as Three }));
      const L = three[0]?.d.M.at(-1)?.to as number;
      const tenths = Array.from({ length: 11 }, (_, i) => (i * L) / 10);
      const peaks = three.flatMap(({ d }) => [extremes(d.M).max.s, extremes(d.M).min.s]);
      const places = [...new Set([...tenths, ...peaks])].sort((a, b) => a - b);
      const at = (pick: (d: Three) => PiecewisePolynomial, s: number): Extreme =>
        extremeOf(
          three.flatMap(({ id, d }) =>
            (['left', 'right'] as const).map((side) => ({ id, value: valueAt(pick(d), s, side) })),
          ),
        );
      return {
        member: m.id,
        purpose,
        stations: places.map((s) => ({
          s,
          N: at((d) => d.N, s),
          V: at((d) => d.V, s),
          M: at((d) => d.M, s),
        })),
      };
    });
  });
}

function extremeOf(values: readonly { id: string; value: number }[]): Extreme {
  const [first] = values;
  if (!first) throw new Error('an envelope without combinations');
  const max = values.reduce((a, b) => (b.value > a.value ? b : a), first);
  const min = values.reduce((a, b) => (b.value < a.value ? b : a), first);
  return { max: max.value, maxBy: max.id, min: min.value, minBy: min.id };
}
