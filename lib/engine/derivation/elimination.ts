import { type CompatibilityStep, deriveCompatibility } from './compatibility-step';
import { type Context, pureValue } from './context';
import { per } from './dimensions';
import { fitRows, rowsWork } from './elimination-figures';
import { negative, product, quotient, sum, type Value } from './expression';
import { decimalsFor } from './figure-plan';
import { type Relation, relate } from './relation';
import type { SolutionStep } from './solution-step';
import type { SymbolName } from './symbol-name';

/** Gauss's elimination as it is written by hand: multipliers and changed entries as lines, right sides as a table. */
export interface Elimination {
  multipliers: Relation[];
  entries: Relation[];
  /** Rows of the table: right sides as they stand, then less a multiple of an earlier row, then the redundants. */
  rows: EliminationRow[];
  /** Every row follows from the printed rows above it. */
  works: boolean;
}

export interface EliminationRow {
  label: SymbolName;
  /** b_i − μ b_j */
  less?: { from: SymbolName; multiplier: Value; other: SymbolName };
  /** (b_i − Σ f X) / f */
  back?: { from: SymbolName; terms: { f: Value; X: SymbolName }[]; pivot: Value };
  cells: number[];
  decimals: number;
  dimension: Value['dimension'];
}

interface Entry {
  value: Value;
  changes: number;
}

/** Significant figures of multipliers and reduced entries: the fewest and the most. */
const factorFigures = { least: 8, most: 13 };

/** The elimination with as many figures in its factors as its right sides need. */
export function eliminate(ctx: Context, values: SolutionStep['values']): Elimination {
  const equations = deriveCompatibility(ctx);
  let found = eliminateWith(ctx, equations, values, factorFigures.least);
  for (let figures = factorFigures.least + 1; !found.works && figures <= factorFigures.most; figures++) {
    found = eliminateWith(ctx, equations, values, figures);
  }
  return found;
}

function eliminateWith(
  ctx: Context,
  { matrix, cases }: CompatibilityStep,
  values: SolutionStep['values'],
  figures: number,
): Elimination {
  const n = matrix.length;
  const entries = matrix.map((row) =>
    row.map((v): Entry | undefined =>
      v ? { value: { ...v, decimals: v.decimals }, changes: 0 } : undefined,
    ),
  );
  const right = matrix.map((_, i) => ({
    symbol: { letter: 'b', sub: [`${i + 1}`] } as SymbolName,
    changes: 0,
    cells: cases.map((c) => (c.rightSides[i]?.value ?? 0) - (c.gaps[i]?.value ?? 0)),
    dimension: cases[0]?.gaps[i]?.dimension ?? { force: 0, length: 0, temperature: 0 },
  }));
  const multipliers: Relation[] = [];
  const changed: Relation[] = [];
  const decimals = ctx.figures.rightSide;
  const rows: EliminationRow[] = right.map((r) => ({
    label: r.symbol,
    cells: [...r.cells],
    decimals: ctx.figures.gap,
    dimension: r.dimension,
  }));
  for (let j = 0; j < n; j++) {
    const pivot = entries[j]?.[j];
    if (!pivot) continue;
    for (let i = j + 1; i < n; i++) {
      // The matrix stays symmetric: the entry below the pivot is the one to its right.
      const beside = entries[j]?.[i];
      if (!beside || beside.value.value === 0) continue;
      const multiplier = multiplierOf(beside.value, pivot.value, i, j, figures);
      multipliers.push(multiplier);
      changed.push(...reduceRow(ctx, entries, i, j, multiplier.result, figures));
      const [mine, theirs] = [right[i], right[j]];
      if (!mine || !theirs) continue;
      const from = mine.symbol;
      mine.changes += 1;
      mine.symbol = { letter: 'b', sub: [`${i + 1}`], super: `(${mine.changes})` };
      mine.cells = mine.cells.map((b, k) => b - multiplier.result.value * (theirs.cells[k] ?? 0));
      const less = { from, multiplier: multiplier.result, other: theirs.symbol };
      rows.push({ label: mine.symbol, less, cells: mine.cells, decimals, dimension: mine.dimension });
    }
  }
  for (let i = n - 1; i >= 0; i--) {
    const pivot = entries[i]?.[i];
    const own = right[i];
    const X = values[0]?.X[i];
    if (!pivot || !own || !X?.symbol) continue;
    const terms = matrix.flatMap((_, k) => {
      const f = entries[i]?.[k];
      return k > i && f && f.value.value !== 0 ? [{ f: f.value, X: plain(k) }] : [];
    });
    const cells = values.map((v) => v.X[i]?.value ?? Number.NaN);
    rows.push({
      label: plain(i),
      back: { from: own.symbol, terms, pivot: pivot.value },
      cells,
      decimals: X.decimals,
      dimension: X.dimension,
    });
  }
  const fitted = fitRows(rows);
  return { multipliers, entries: changed, rows: fitted, works: rowsWork(fitted) };
}

const plain = (i: number): SymbolName => ({ letter: 'X', sub: [`${i + 1}`] });

function multiplierOf(beside: Value, pivot: Value, i: number, j: number, figures: number): Relation {
  const symbol = { letter: 'μ', sub: i > 8 || j > 8 ? [`${i + 1}`, ',', `${j + 1}`] : [`${i + 1}${j + 1}`] };
  const value = beside.value / pivot.value;
  const dimension = per(beside.dimension, pivot.dimension);
  return relate(symbol, quotient(beside, pivot), {
    dimension,
    decimals: decimalsFor([value], figures, 0, 12),
  });
}

function reduceRow(
  ctx: Context,
  entries: (Entry | undefined)[][],
  i: number,
  j: number,
  multiplier: Value,
  figures: number,
): Relation[] {
  const changed: Relation[] = [];
  const [mine, theirs] = [entries[i], entries[j]];
  if (!mine || !theirs) return changed;
  for (let k = i; k < mine.length; k++) {
    const above = theirs[k];
    if (!above || above.value.value === 0) continue;
    const before = mine[k]?.value ?? {
      ...pureValue(0, ctx.figures.flexibility),
      dimension: above.value.dimension,
    };
    const changes = (mine[k]?.changes ?? 0) + 1;
    const sub = i > 8 || k > 8 ? [`${i + 1}`, ',', `${k + 1}`] : [`${i + 1}${k + 1}`];
    const symbol: SymbolName = { letter: 'f', sub, super: `(${changes})`, timesEI0: true };
    const value = before.value - multiplier.value * above.value.value;
    const formula =
      before.value === 0
        ? negative(product(multiplier, above.value))
        : sum(before, negative(product(multiplier, above.value)));
    const line = relate(symbol, formula, {
      dimension: before.dimension,
      decimals: decimalsFor([value], figures, 0, 12),
    });
    changed.push(line);
    mine[k] = { value: line.result, changes };
  }
  return changed;
}
