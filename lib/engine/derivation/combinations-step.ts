import type { Combination } from '@/lib/model/analysis';
import { extremes } from '../diagrams/piecewise';
import { type Context, pureValue } from './context';
import { dimensions } from './dimensions';
import { endForcesOf } from './end-forces';
import { type Expression, number, product, sum, type Value } from './expression';
import { exactDecimals } from './figure-plan';
import { type NotWritten, tooLong } from './not-written';
import { reworkTolerance } from './precision';
import { reactionValue } from './primary-step';
import { type Relation, relate } from './relation';
import { roundTo } from './round-to';
import { inCase, type SymbolName, symbolKey } from './symbol-name';

/** A quantity in every case and combination. Terms that are factored before they are summed carry a figure more. */
export interface CombinedRow {
  symbol: SymbolName;
  /** By case, by combination; a value missing where the greatest of the cases do not superpose. */
  cases: Record<string, number>;
  combinations: Record<string, number>;
  dimension: Value['dimension'];
  decimals: number;
  caseDecimals: number;
  greatest: string;
  least: string;
}

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

function reactionRows(ctx: Context): CombinedRow[] {
  const { solution, analysis } = ctx;
  const sample = solution.combinations[0]?.reactions ?? [];
  return sample.map((r, k) => {
    const shown = reactionValue(ctx, r, (s) => s);
    const cases = Object.fromEntries(
      analysis.cases.map((c) => [c.id, solution.cases[c.id]?.reactions[k]?.value ?? Number.NaN]),
    );
    const combined = Object.fromEntries(
      solution.combinations.map((c) => [c.id, c.reactions[k]?.value ?? Number.NaN]),
    );
    return rowOf(ctx, ctx.names.quantity(r.quantity), cases, combined, shown);
  });
}

function endRows(ctx: Context): CombinedRow[] {
  const { solution, analysis, names } = ctx;
  const byCase = analysis.cases.map((c) => ({
    id: c.id,
    ends: endForcesOf(ctx, solution.cases[c.id]?.members ?? {}),
  }));
  const byCombination = solution.combinations.map((c) => ({ id: c.id, ends: endForcesOf(ctx, c.members) }));
  const seen = new Set<string>();
  const pick = (list: typeof byCase, k: number, which: 'N' | 'V' | 'M') =>
    Object.fromEntries(list.map(({ id, ends }) => [id, ends[k]?.[which] ?? Number.NaN]));
  return (['M', 'V', 'N'] as const).flatMap((which) =>
    (byCase[0]?.ends ?? []).flatMap((e, k): CombinedRow[] => {
      const symbol =
        which === 'M'
          ? names.moment(e.member, e.end)
          : which === 'V'
            ? names.shear(e.member, e.end)
            : names.axial(e.member, e.end);
      const key = symbolKey(symbol);
      if (seen.has(key)) return [];
      seen.add(key);
      const cases = pick(byCase, k, which);
      // The same at both ends of a member: the first end stands for both.
      if (e.end === 'end' && sameAs(cases, pick(byCase, k - 1, which))) return [];
      if (Object.values(cases).every((v) => v === 0)) return [];
      const moment = which === 'M';
      const figures = {
        dimension: moment ? dimensions.moment : dimensions.force,
        decimals: moment ? ctx.figures.moment : ctx.figures.force,
      };
      return [rowOf(ctx, symbol, cases, pick(byCombination, k, which), figures)];
    }),
  );
}

const sameAs = (a: Record<string, number>, b: Record<string, number>): boolean =>
  Object.keys(a).every((id) => Math.abs((a[id] ?? 0) - (b[id] ?? 0)) <= 1e-12 * Math.abs(a[id] ?? 0));

function rowOf(
  ctx: Context,
  symbol: SymbolName,
  cases: Record<string, number>,
  combinations: Record<string, number>,
  { dimension, decimals }: Pick<Value, 'dimension' | 'decimals'>,
): CombinedRow {
  const entries = Object.entries(combinations);
  const [start = ['', 0] as [string, number]] = entries;
  const greatest = entries.reduce((a, b) => (b[1] > a[1] ? b : a), start)[0];
  const least = entries.reduce((a, b) => (b[1] < a[1] ? b : a), start)[0];
  const caseDecimals = neededDecimals(ctx, cases, decimals);
  return { symbol, cases, combinations, dimension, decimals, caseDecimals, greatest, least };
}

/** One figure more where the printed cases, factored and summed, would miss a printed sum by a unit. */
function neededDecimals(ctx: Context, cases: Record<string, number>, decimals: number): number {
  const sumOf = ({ factors }: Combination, figures?: number) => {
    let total = 0;
    for (const id of Object.keys(factors)) {
      const value = cases[id] ?? Number.NaN;
      total += (factors[id] as number) * (figures === undefined ? value : roundTo(value, figures));
    }
    return total;
  };
  const sums = ctx.analysis.combinations.map((c) => roundTo(sumOf(c), decimals));
  for (let d = decimals; d < decimals + 3; d++) {
    const misses = ctx.analysis.combinations.some(
      (c, i) => Math.abs(sumOf(c, d) - (sums[i] as number)) > reworkTolerance * 10 ** -decimals,
    );
    if (!misses) return d;
  }
  return decimals + 3;
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
