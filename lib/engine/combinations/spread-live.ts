import type { Analysis } from '@/lib/model/analysis';
import { patternCases, spanLines } from './pattern-cases';

export type SpreadLive =
  | { ok: true; analysis: Analysis; arrangements: string[][] }
  | { ok: false; message: string };

/**
 * The analysis with its live case split span by span, own combinations carried over to the parts, and the arrangements in
 * which the parts act. One live case can be split; with none, or with one span, everything stays as it is.
 */
export function spreadLive(analysis: Analysis): SpreadLive {
  const live = analysis.cases.filter((c) => c.nature === 'live');
  const [first, second] = live;
  if (!first) return { ok: true, analysis, arrangements: [] };
  if (second)
    return {
      ok: false,
      message: `Cases ${first.id} and ${second.id} are both live. Spans can be loaded in turn when there is one live case.`,
    };
  const { cases: parts, arrangements } = patternCases(first, spanLines(analysis));
  const taken = analysis.cases.find((c) => c !== first && parts.some((part) => part.id === c.id));
  if (taken)
    return {
      ok: false,
      message: `A part of case ${first.id} would be called ${taken.id}, as another case is. Rename that.`,
    };
  return {
    ok: true,
    arrangements,
    analysis: {
      ...analysis,
      cases: analysis.cases.flatMap((c) => (c === first ? parts : [c])),
      combinations: analysis.combinations.map((sum) => {
        const { [first.id]: factor, ...rest } = sum.factors;
        if (factor === undefined || arrangements.length === 0) return sum;
        return { ...sum, factors: { ...rest, ...Object.fromEntries(parts.map((p) => [p.id, factor])) } };
      }),
    },
  };
}
