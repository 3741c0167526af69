import type { Analysis } from '@/lib/model/analysis';
import { memberAxis } from '../diagrams/local-loads';
import { sum } from '../diagrams/piecewise';
import type { PiecewisePolynomial } from '../diagrams/piecewise-polynomial';
import type { CaseResult, CombinationResult } from '../solution';

/** N, V and M of one member. */
export type Forces = CombinationResult['members'][string];

/** Every combination of the sheet as factored sums of its cases. */
export function combineResults(
  analysis: Analysis,
  cases: Readonly<Record<string, CaseResult>>,
): CombinationResult[] {
  const supports = Object.values(cases)[0]?.reactions ?? [];
  const lengths = memberLengths(analysis);
  return analysis.combinations.map(({ id, factors }) => {
    const terms = Object.entries(factors).map(([name, factor]) => ({
      result: cases[name] as CaseResult,
      factor,
    }));
    const reactions = supports.map(({ quantity }, i) => ({
      quantity,
      value: terms.reduce((total, t) => total + t.factor * (t.result.reactions[i]?.value as number), 0),
    }));
    const members = Object.fromEntries(
      analysis.members.map((m): [string, Forces] => {
        const nothing = [{ from: 0, to: lengths.get(m.id) as number, c: [0] }];
        const add = (pick: (d: Forces) => PiecewisePolynomial) =>
          terms.length === 0
            ? nothing
            : sum(terms.map((t) => ({ f: pick(t.result.members[m.id] as Forces), factor: t.factor })));
        return [m.id, { N: add((d) => d.N), V: add((d) => d.V), M: add((d) => d.M) }];
      }),
    );
    return { id, reactions, members };
  });
}

function memberLengths({ joints, members }: Analysis): Map<string, number> {
  const at = new Map(joints.map((j) => [j.id, j]));
  return new Map(
    members.map((m) => {
      const [a, b] = [at.get(m.start), at.get(m.end)];
      if (!a || !b) throw new Error(`member ${m.id} has no joint`);
      return [m.id, memberAxis(a, b).L];
    }),
  );
}
