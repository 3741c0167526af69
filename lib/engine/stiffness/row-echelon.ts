/** A row from its first to its last entry that is not zero; it grows as others are subtracted. */
interface Row {
  /** Column of values[0]. */
  base: number;
  /** First column that still holds something, and one past the last. */
  first: number;
  end: number;
  values: Float64Array;
  /** How far rounding may have carried its entries: a running bound. Higham, Accuracy and Stability, §3.3. */
  noise: number;
}

/** One row taken from another: row `target` −= factor · row `source`. */
interface Step {
  target: number;
  source: number;
  factor: number;
}

/**
 * A square matrix brought to row echelon form by exchanges and subtraction of rows. `pivots[k]` is the row that
 * determines unknown k, absent where nothing does; `left` are the rows that determine nothing.
 */
export interface Echelon {
  rows: Row[];
  pivots: (number | undefined)[];
  left: number[];
  steps: Step[];
}

/** A row may be taken as pivot when its entry is at least this part of the largest: the first such row is, to keep fill near. */
const threshold = 0.1;

/** A pivot of this size is one whatever the bound on its rounding says; the bound may be far too careful. */
const certain = 1e-11;

/**
 * Gaussian elimination on rows of a band or profile, whose entries are about 1 in size; one that may be rounding is none.
 * Golub and Van Loan, Matrix Computations, 4th ed., §4.3.
 */
export function toEchelon(matrix: readonly ReadonlyMap<number, number>[]): Echelon {
  const rows = matrix.map(toRow);
  const waiting: number[][] = rows.map(() => []);
  const left: number[] = [];
  const wait = (r: number) => {
    const row = rows[r] as Row;
    while (row.first < row.end && row.values[row.first - row.base] === 0) row.first++;
    (row.first === row.end ? left : (waiting[row.first] as number[])).push(r);
  };
  for (let r = 0; r < rows.length; r++) wait(r);
  const steps: Step[] = [];
  const pivots = waiting.map((candidates) => {
    const pivot = choosePivot(rows, candidates);
    const source = pivot === undefined ? undefined : (rows[pivot] as Row);
    const spread = source ? source.noise + Number.EPSILON * largestOf(source) : 0;
    for (const r of candidates) {
      if (r === pivot) continue;
      const row = rows[r] as Row;
      if (source && pivot !== undefined) {
        const factor = leading(row) / leading(source);
        subtract(row, source, factor);
        row.noise += Math.abs(factor) * spread;
        steps.push({ target: r, source: pivot, factor });
      }
      row.first++;
      wait(r);
    }
    return pivot;
  });
  return { rows, pivots, left, steps };
}

function toRow(entries: ReadonlyMap<number, number>): Row {
  if (entries.size === 0) return { base: 0, first: 0, end: 0, values: new Float64Array(0), noise: 0 };
  const columns = [...entries.keys()];
  const base = Math.min(...columns);
  const end = Math.max(...columns) + 1;
  const values = new Float64Array(end - base);
  for (const [j, v] of entries) values[j - base] = v;
  const row = { base, first: base, end, values, noise: 0 };
  return { ...row, noise: Number.EPSILON * largestOf(row) };
}

function largestOf({ values, first, end, base }: Row): number {
  let most = 0;
  for (let k = first - base; k < end - base; k++) most = Math.max(most, Math.abs(values[k] as number));
  return most;
}

function leading(row: Row): number {
  return row.values[row.first - row.base] as number;
}

function choosePivot(rows: readonly Row[], candidates: readonly number[]): number | undefined {
  const size = (r: number) => Math.abs(leading(rows[r] as Row));
  const real = candidates.filter((r) => size(r) > Math.min(certain, (rows[r] as Row).noise));
  if (real.length === 0) return undefined;
  const largest = real.reduce((most, r) => Math.max(most, size(r)), 0);
  return Math.min(...real.filter((r) => size(r) >= threshold * largest));
}

/** row −= factor · source beyond the first column, which both have and which cancels. */
function subtract(row: Row, source: Row, factor: number): void {
  if (source.end - row.base > row.values.length) {
    const wider = new Float64Array(Math.ceil(1.5 * (source.end - row.base)));
    wider.set(row.values);
    row.values = wider;
  }
  row.end = Math.max(row.end, source.end);
  const [to, from] = [row.values, source.values];
  const shift = source.base - row.base;
  for (let k = source.first + 1 - source.base; k < source.end - source.base; k++) {
    to[k + shift] = (to[k + shift] as number) - factor * (from[k] as number);
  }
}

/** The right side as the steps leave it. */
export function reduceRight({ steps }: Echelon, right: Float64Array): Float64Array {
  const r = Float64Array.from(right);
  for (const { target, source, factor } of steps) {
    r[target] = (r[target] as number) - factor * (r[source] as number);
  }
  return r;
}

/** Unknowns from a reduced right side; those that nothing determines keep what `x` holds for them. */
export function backSubstitute({ rows, pivots }: Echelon, reduced: Float64Array, x: Float64Array): void {
  for (let k = pivots.length - 1; k >= 0; k--) {
    const r = pivots[k];
    if (r === undefined) continue;
    const row = rows[r] as Row;
    let sum = reduced[r] as number;
    for (let j = k + 1; j < row.end; j++) sum -= (row.values[j - row.base] as number) * (x[j] as number);
    x[k] = sum / leading(row);
  }
}
