import type { Combination } from '@/lib/model/analysis';
import type { Context } from './context';
import { dimensions } from './dimensions';
import { endForcesOf } from './end-forces';
import type { Value } from './expression';
import { reworkTolerance } from './precision';
import { reactionValue } from './primary-step';
import { roundTo } from './round-to';
import { type SymbolName, symbolKey } from './symbol-name';

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

/** Every reaction in the cases and combinations. */
export function reactionRows(ctx: Context): CombinedRow[] {
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

/** M, V and N at the ends of members; what is the same at both ends of one, or has one symbol, stands once. */
export function endRows(ctx: Context): CombinedRow[] {
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
