import type { Combination } from '@/lib/model/analysis';
import { extremes } from '../diagrams/piecewise';
import { type CombinedRow, endRows, reactionRows } from './combined-rows';
import { type Context, pureValue } from './context';
import { type Expression, number, product, sum } from './expression';
import { exactDecimals } from './figure-plan';
import { type NotWritten, tooLong } from './not-written';
import { type Relation, relate } from './relation';
import { inCase } from './symbol-name';

/** Step 14: factored sums of the cases and what governs. */
export interface CombinationsStep {
  kind: 'combinations';
  combinations: readonly Combination[];
  factorDecimals: number;
  /** One combination worked in full. */
  example?: { id: string; lines: Relation[] };
  reactions: CombinedRow[];
  ends: CombinedRow[];
  /** Why the end forces are not tabled: step 16 and the spans below give the greatest. */
  notWritten?: NotWritten;
  /** Greatest and least span moments with their combination and place. */
  spans: { member: string; max: Place; min: Place }[];
}

export interface Place {
  by: string;
  s: number;
  M: number;
}

/** Rows of end forces are tabled up to so many members; beyond, the envelope speaks. */
const most = { members: 40, lines: 6 };

export function deriveCombinations(ctx: Context): CombinationsStep {
  const { analysis, solution, figures } = ctx;
  const { combinations } = analysis;
  const factorDecimals = exactDecimals(
    combinations.flatMap((c) => Object.values(c.factors)),
    1,
    4,
  );
  const reactions = combinations.length === 0 ? [] : reactionRows(ctx);
  const many = analysis.members.length > most.members;
  const ends = combinations.length === 0 || many ? [] : endRows(ctx);
  const spans = spansOf(ctx);
  const first = combinations.reduce<Combination | undefined>(
    (a, b) => (a && Object.keys(a.factors).length >= Object.keys(b.factors).length ? a : b),
    undefined,
  );
  const lines =
    first &&
    [
      ...reactions.slice(0, most.lines),
      ...ends.filter((r) => r.dimension.length === 1).slice(0, most.lines),
    ].map((row) => combine(row, first, factorDecimals));
  return {
    kind: 'combinations',
    combinations: solution.combinations.length === 0 ? [] : combinations,
    factorDecimals,
    example: first && lines ? { id: first.id, lines } : undefined,
    reactions,
    ends,
    notWritten: many ? tooLong(ctx) : undefined,
    spans: figures ? spans : [],
  };
}

/** γ_1 E_1 + γ_2 E_2 … of one quantity. */
function combine(row: CombinedRow, { id, factors }: Combination, factorDecimals: number): Relation {
  const terms = Object.entries(factors).map(
    ([name, factor]): Expression =>
      product(pureValue(factor, factorDecimals), {
        kind: 'value',
        symbol: inCase(row.symbol, name),
        value: row.cases[name] ?? Number.NaN,
        dimension: row.dimension,
        decimals: row.caseDecimals,
      }),
  );
  const formula = terms.length === 0 ? number(0) : sum(...terms);
  return relate(inCase(row.symbol, id), formula, row, row.combinations[id]);
}

function spansOf(ctx: Context): CombinationsStep['spans'] {
  const { solution, analysis } = ctx;
  const strength = new Set(analysis.combinations.filter((c) => c.purpose === 'strength').map((c) => c.id));
  const mine = solution.combinations.filter((c) => strength.has(c.id));
  if (mine.length === 0) return [];
  return analysis.members.map((m) => {
    const places = mine.flatMap(({ id, members }) => {
      const M = members[m.id]?.M;
      if (!M) return [];
      const { max, min } = extremes(M);
      return [
        { by: id, s: max.s, M: max.value },
        { by: id, s: min.s, M: min.value },
      ];
    });
    const [first = { by: '', s: 0, M: 0 }] = places;
    return {
      member: m.id,
      max: places.reduce((a, b) => (b.M > a.M ? b : a), first),
      min: places.reduce((a, b) => (b.M < a.M ? b : a), first),
    };
  });
}
