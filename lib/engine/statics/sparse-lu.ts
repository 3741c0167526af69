import { reach } from './reach';

/** A sparse column: row numbers and values. */
export interface SparseColumn {
  rows: number[];
  values: number[];
}

/**
 * Left-looking LU of the columns of a matrix, taken in the order given; a column that depends on those before it is set
 * aside. Row pivots are the largest entries. Work grows with the entries met, not with the square of the columns
 * (Gilbert and Peierls, SIAM J. Sci. Stat. Comput. 9, 1988).
 */
export interface SparseLu {
  rowCount: number;
  /** Columns in the basis, in pivot order; those set aside. */
  basis: number[];
  aside: number[];
  /** Row that holds pivot k; pivot that a row holds, or −1; rows without one. */
  pivotRows: number[];
  pivotOf: Int32Array;
  freeRows: number[];
  /** Smallest accepted pivot relative to its column. */
  smallestPivot: number;
  /** Columns of L by row, without their unit pivot; columns of U by pivot, the pivot last. */
  lower: SparseColumn[];
  upper: SparseColumn[];
}

/** Factors the columns of a matrix in the order given; `tolerance` is relative to the length of each column. */
export function factorColumns(
  columns: readonly SparseColumn[],
  order: readonly number[],
  rowCount: number,
  tolerance: number,
): SparseLu {
  const lu: SparseLu = {
    rowCount,
    basis: [],
    aside: [],
    pivotRows: [],
    pivotOf: new Int32Array(rowCount).fill(-1),
    freeRows: [],
    smallestPivot: 1,
    lower: [],
    upper: [],
  };
  const x = new Float64Array(rowCount);
  const visit = reach(rowCount, (r) => {
    const pivot = lu.pivotOf[r] as number;
    return pivot === -1 ? [] : (lu.lower[pivot] as SparseColumn).rows;
  });
  for (const k of order) {
    const column = columns[k] as SparseColumn;
    const size = Math.hypot(...column.values);
    const met = size === 0 || lu.basis.length === rowCount ? undefined : visit(column.rows);
    if (!met) {
      lu.aside.push(k);
      continue;
    }
    column.rows.forEach((r, i) => {
      x[r] = column.values[i] as number;
    });
    const upper = eliminate(lu, x, met);
    let pivot = -1;
    let largest = tolerance * size;
    for (const r of met) {
      const v = Math.abs(x[r] as number);
      if (lu.pivotOf[r] === -1 && v > largest) [pivot, largest] = [r, v];
    }
    if (pivot === -1) lu.aside.push(k);
    else {
      lu.smallestPivot = Math.min(lu.smallestPivot, largest / size);
      accept(lu, k, pivot, x, met, upper);
    }
    for (const r of met) x[r] = 0;
  }
  for (let r = 0; r < rowCount; r++) if (lu.pivotOf[r] === -1) lu.freeRows.push(r);
  return lu;
}

/** x ← L⁻¹ x over the rows met; what stands on rows with a pivot is the column of U. */
function eliminate(lu: SparseLu, x: Float64Array, met: readonly number[]): SparseColumn {
  const upper: SparseColumn = { rows: [], values: [] };
  for (const row of met) {
    const pivot = lu.pivotOf[row] as number;
    const value = x[row] as number;
    if (pivot === -1 || value === 0) continue;
    upper.rows.push(pivot);
    upper.values.push(value);
    const { rows, values } = lu.lower[pivot] as SparseColumn;
    for (let i = 0; i < rows.length; i++) {
      const r = rows[i] as number;
      x[r] = (x[r] as number) - value * (values[i] as number);
    }
  }
  return upper;
}

function accept(
  lu: SparseLu,
  k: number,
  pivot: number,
  x: Float64Array,
  met: readonly number[],
  upper: SparseColumn,
): void {
  const value = x[pivot] as number;
  lu.pivotOf[pivot] = lu.basis.length;
  upper.rows.push(lu.basis.length);
  upper.values.push(value);
  const lower: SparseColumn = { rows: [], values: [] };
  for (const r of met) {
    if (lu.pivotOf[r] !== -1 || x[r] === 0) continue;
    lower.rows.push(r);
    lower.values.push((x[r] as number) / value);
  }
  lu.basis.push(k);
  lu.pivotRows.push(pivot);
  lu.lower.push(lower);
  lu.upper.push(upper);
}
