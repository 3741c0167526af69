import type { Equation } from './plan-statics';

/** Pivots below this part of their row, once it is scaled to its largest entry, are none. */
const small = 1e-9;

/**
 * The first rows, as many as unknowns, that determine them; undefined when there are too few. Each new row is reduced by
 * those kept before it.
 */
export function independentRows(
  equations: readonly Equation[],
  unknowns: readonly string[],
): Equation[] | undefined {
  const kept: { row: number[]; pivot: number }[] = [];
  const chosen: Equation[] = [];
  for (const e of equations) {
    const row = rowOf(e, unknowns);
    const size = Math.max(...row.map(Math.abs));
    if (size === 0) continue;
    const scaled = row.map((v) => v / size);
    for (const k of kept) reduce(scaled, k);
    const pivot = scaled.reduce(
      (best, v, i) => (Math.abs(v) > Math.abs(scaled[best] as number) ? i : best),
      0,
    );
    if (Math.abs(scaled[pivot] as number) <= small) continue;
    kept.push({ row: scaled, pivot });
    chosen.push(e);
    if (chosen.length === unknowns.length) return chosen;
  }
  return undefined;
}

/** Solves the chosen equations for the unknowns; `rights[i]` is what the known terms of equation i add up to. */
export function solveTogether(
  equations: readonly Equation[],
  unknowns: readonly string[],
  rights: readonly number[],
): number[] {
  const n = unknowns.length;
  const kept: { row: number[]; pivot: number }[] = [];
  equations.forEach((e, i) => {
    const row = [...rowOf(e, unknowns), -(rights[i] as number)];
    for (const k of kept) reduce(row, k);
    let pivot = 0;
    for (let c = 1; c < n; c++) if (Math.abs(row[c] as number) > Math.abs(row[pivot] as number)) pivot = c;
    kept.push({ row, pivot });
  });
  const values = new Array<number>(n).fill(0);
  for (const { row, pivot } of kept.reverse()) {
    let right = row[n] as number;
    for (let c = 0; c < n; c++) if (c !== pivot) right -= (row[c] as number) * (values[c] as number);
    values[pivot] = right / (row[pivot] as number);
  }
  return values;
}

function rowOf(e: Equation, unknowns: readonly string[]): number[] {
  return unknowns.map((k) => {
    const c = e.coefficients.get(k);
    return c === undefined ? 0 : c;
  });
}

function reduce(row: number[], by: { row: number[]; pivot: number }): void {
  const factor = (row[by.pivot] as number) / (by.row[by.pivot] as number);
  if (factor === 0) return;
  for (let c = 0; c < row.length; c++) row[c] = (row[c] as number) - factor * (by.row[c] as number);
  row[by.pivot] = 0;
}
