import type { EliminationRow } from './elimination';
import { printedValue } from './expression';
import { reworkTolerance } from './precision';
import { roundTo } from './round-to';
import { symbolKey } from './symbol-name';

const most = 12;

/**
 * Decimals of the rows of an elimination, so that every row worked from the printed rows above it is within the
 * tolerance. Looked over from the last row to the first: a row that gets a figure more asks more of the rows it comes
 * from. The right sides as they stand share one count of decimals, that of the gaps they are.
 */
export function fitRows(rows: readonly EliminationRow[]): EliminationRow[] {
  const fitted = rows.map((r) => ({ ...r }));
  const traced = traceRows(fitted);
  const given = fitted.filter((r) => !r.less && !r.back);
  const printed = () => fitted.reduce((t, r) => t + r.decimals, 0);
  let before: number;
  do {
    before = printed();
    for (const row of [...traced].reverse()) fitRow(row);
    const shared = Math.max(...given.map((r) => r.decimals), 0);
    for (const r of given) r.decimals = shared;
  } while (printed() !== before);
  return fitted;
}

/** A row with the rows that it is worked from, in the order of its formula. */
interface Traced {
  row: EliminationRow;
  sources: EliminationRow[];
}

function traceRows(rows: readonly EliminationRow[]): Traced[] {
  const byLabel = new Map(rows.map((r) => [symbolKey(r.label), r]));
  return rows.map((row) => ({
    row,
    sources: sourcesOf(row).flatMap((s) => byLabel.get(symbolKey(s)) ?? []),
  }));
}

function sourcesOf(row: EliminationRow) {
  if (row.less) return [row.less.from, row.less.other];
  return row.back ? [row.back.from, ...row.back.terms.map((t) => t.X)] : [];
}

function fitRow(traced: Traced): void {
  traced.row.cells.forEach((_, k) => {
    // Where the factors' own rounding is what misses, more figures in the rows would not help.
    if (misses(traced, k, 'full')) return;
    while (misses(traced, k)) {
      const open = traced.sources.filter((s) => s.decimals < most);
      const [first] = open;
      if (!first) break;
      const coarsest = open.reduce((a, b) => (b.decimals < a.decimals ? b : a), first);
      coarsest.decimals += 1;
    }
  });
}

/** Whether every row worked from the printed rows above it gives what is printed. */
export function rowsWork(rows: readonly EliminationRow[]): boolean {
  return traceRows(rows).every((traced) => traced.row.cells.every((_, k) => !misses(traced, k)));
}

function misses({ row, sources }: Traced, k: number, figures: 'printed' | 'full' = 'printed'): boolean {
  const { less, back, decimals } = row;
  if (!less && !back) return false;
  const [from = Number.NaN, ...others] = sources.map(({ cells, decimals: own }) => {
    const cell = cells[k] ?? Number.NaN;
    return figures === 'printed' ? roundTo(cell, own) : cell;
  });
  const shown = roundTo(row.cells[k] ?? Number.NaN, decimals);
  const other = (i: number) => others[i] ?? Number.NaN;
  let worked = shown;
  if (less) worked = from - printedValue(less.multiplier) * other(0);
  if (back) {
    const over = back.terms.reduce((t, { f }, i) => t - printedValue(f) * other(i), from);
    worked = over / printedValue(back.pivot);
  }
  return Math.abs(worked - shown) > reworkTolerance * 10 ** -decimals;
}
