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
  const byLabel = new Map(fitted.map((r) => [symbolKey(r.label), r]));
  const given = fitted.filter((r) => !r.less && !r.back);
  const printed = () => fitted.map((r) => r.decimals).join();
  let before: string;
  do {
    before = printed();
    for (const row of [...fitted].reverse()) fitRow(row, byLabel);
    const shared = Math.max(...given.map((r) => r.decimals), 0);
    for (const r of given) r.decimals = shared;
  } while (printed() !== before);
  return fitted;
}

function fitRow(row: EliminationRow, byLabel: ReadonlyMap<string, EliminationRow>): void {
  const sources = sourcesOf(row).flatMap((s) => byLabel.get(symbolKey(s)) ?? []);
  row.cells.forEach((_, k) => {
    // Where the factors' own rounding is what misses, more figures in the rows would not help.
    if (misses(row, byLabel, k, 'full')) return;
    while (misses(row, byLabel, k)) {
      const open = sources.filter((s) => s.decimals < most);
      const [first] = open;
      if (!first) break;
      const coarsest = open.reduce((a, b) => (b.decimals < a.decimals ? b : a), first);
      coarsest.decimals += 1;
    }
  });
}

/** Whether every row worked from the printed rows above it gives what is printed. */
export function rowsWork(rows: readonly EliminationRow[]): boolean {
  const byLabel = new Map(rows.map((r) => [symbolKey(r.label), r]));
  return rows.every((row) => row.cells.every((_, k) => !misses(row, byLabel, k)));
}

function sourcesOf(row: EliminationRow) {
  if (row.less) return [row.less.from, row.less.other];
  return row.back ? [row.back.from, ...row.back.terms.map((t) => t.X)] : [];
}

function misses(
  row: EliminationRow,
  byLabel: ReadonlyMap<string, EliminationRow>,
  k: number,
  figures: 'printed' | 'full' = 'printed',
): boolean {
  const at = (label: EliminationRow['label']) => {
    const source = byLabel.get(symbolKey(label));
    const cell = source?.cells[k] ?? Number.NaN;
    return source && figures === 'printed' ? roundTo(cell, source.decimals) : cell;
  };
  const shown = roundTo(row.cells[k] ?? Number.NaN, row.decimals);
  const { less, back } = row;
  let worked = shown;
  if (less) worked = at(less.from) - printedValue(less.multiplier) * at(less.other);
  if (back) {
    const over = back.terms.reduce((t, { f, X }) => t - printedValue(f) * at(X), at(back.from));
    worked = over / printedValue(back.pivot);
  }
  return Math.abs(worked - shown) > reworkTolerance * 10 ** -row.decimals;
}
