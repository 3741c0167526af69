/** A sparse column: row numbers and values. */
export interface SparseColumn {
  rows: number[];
  values: number[];
}

/**
 * Left-looking LU of the columns of a matrix, taken in the order given; a column that depends on those before it is set
 * aside. Row pivots are the largest entries (Gilbert and Peierls, SIAM J. Sci. Stat. Comput. 9, 1988, without their
 * symbolic step).
 */
export interface SparseLu {
  rowCount: number;
  /** Columns in the basis, in pivot order; those set aside. */
  basis: number[];
  aside: number[];
  /** Row that holds pivot k; rows without one. */
  pivotRows: number[];
  freeRows: number[];
  /** Smallest accepted pivot relative to its column. */
  smallestPivot: number;
  lower: SparseColumn[];
  upper: SparseColumn[];
}

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
    freeRows: [],
    smallestPivot: 1,
    lower: [],
    upper: [],
  };
  const pivotOf = new Int32Array(rowCount).fill(-1);
  const x = new Float64Array(rowCount);
  for (const k of order) {
    const column = columns[k] as SparseColumn;
    x.fill(0);
    column.rows.forEach((r, i) => {
      x[r] = column.values[i] as number;
    });
    const size = Math.hypot(...column.values);
    if (size === 0 || lu.basis.length === rowCount) {
      lu.aside.push(k);
      continue;
    }
    const upper = eliminate(lu, x);
    let pivot = -1;
    for (let r = 0; r < rowCount; r++) {
      if (pivotOf[r] === -1 && (pivot === -1 || Math.abs(x[r] as number) > Math.abs(x[pivot] as number)))
        pivot = r;
    }
    const relative = Math.abs(x[pivot] as number) / size;
    if (relative <= tolerance) {
      lu.aside.push(k);
      continue;
    }
    lu.smallestPivot = Math.min(lu.smallestPivot, relative);
    accept(lu, k, pivot, x, pivotOf, upper);
  }
  for (let r = 0; r < rowCount; r++) if (pivotOf[r] === -1) lu.freeRows.push(r);
  return lu;
}

/** x ← L⁻¹ x over the pivots so far; what it meets on their rows is the column of U. */
function eliminate(lu: SparseLu, x: Float64Array): SparseColumn {
  const upper: SparseColumn = { rows: [], values: [] };
  lu.pivotRows.forEach((row, j) => {
    const value = x[row] as number;
    if (value === 0) return;
    upper.rows.push(j);
    upper.values.push(value);
    const l = lu.lower[j] as SparseColumn;
    l.rows.forEach((r, i) => {
      x[r] = (x[r] as number) - value * (l.values[i] as number);
    });
  });
  return upper;
}

function accept(
  lu: SparseLu,
  k: number,
  pivot: number,
  x: Float64Array,
  pivotOf: Int32Array,
  upper: SparseColumn,
): void {
  const value = x[pivot] as number;
  pivotOf[pivot] = lu.basis.length;
  upper.rows.push(lu.basis.length);
  upper.values.push(value);
  const lower: SparseColumn = { rows: [], values: [] };
  for (let r = 0; r < lu.rowCount; r++) {
    if (pivotOf[r] !== -1 || x[r] === 0) continue;
    lower.rows.push(r);
    lower.values.push((x[r] as number) / value);
  }
  lu.basis.push(k);
  lu.pivotRows.push(pivot);
  lu.lower.push(lower);
  lu.upper.push(upper);
}

/** Solves (basis columns) z = right, z in pivot order. Rows without a pivot are left over and returned as a residual. */
export function solveBasis(lu: SparseLu, right: Float64Array): { z: Float64Array; residual: number } {
  const x = Float64Array.from(right);
  const n = lu.basis.length;
  const y = new Float64Array(n);
  const met = eliminate(lu, x);
  met.rows.forEach((j, i) => {
    y[j] = met.values[i] as number;
  });
  const residual = Math.max(0, ...lu.freeRows.map((r) => Math.abs(x[r] as number)));
  const z = new Float64Array(n);
  for (let k = n - 1; k >= 0; k--) {
    const u = lu.upper[k] as SparseColumn;
    const value = (y[k] as number) / (u.values[u.values.length - 1] as number);
    z[k] = value;
    if (value === 0) continue;
    for (let i = 0; i < u.rows.length - 1; i++) {
      const j = u.rows[i] as number;
      y[j] = (y[j] as number) - value * (u.values[i] as number);
    }
  }
  return { z, residual };
}

/** The vector over rows that is normal to every basis column, with 1 at the free row given: a motion without force. */
export function leftNullVector(lu: SparseLu, freeRow: number): Float64Array {
  const y = new Float64Array(lu.rowCount);
  y[freeRow] = 1;
  for (let j = lu.basis.length - 1; j >= 0; j--) {
    const l = lu.lower[j] as SparseColumn;
    let sum = 0;
    l.rows.forEach((r, i) => {
      sum += (l.values[i] as number) * (y[r] as number);
    });
    y[lu.pivotRows[j] as number] = -sum;
  }
  return y;
}

/** Solves (basis columns)ᵀ y = right, right in pivot order; y over rows, zero on rows without a pivot. */
export function solveBasisTransposed(lu: SparseLu, right: readonly number[]): Float64Array {
  const w = new Float64Array(lu.basis.length);
  lu.upper.forEach((u, k) => {
    let sum = right[k] as number;
    for (let i = 0; i < u.rows.length - 1; i++)
      sum -= (u.values[i] as number) * (w[u.rows[i] as number] as number);
    w[k] = sum / (u.values[u.values.length - 1] as number);
  });
  const y = new Float64Array(lu.rowCount);
  for (let j = lu.basis.length - 1; j >= 0; j--) {
    const l = lu.lower[j] as SparseColumn;
    let sum = w[j] as number;
    l.rows.forEach((r, i) => {
      sum -= (l.values[i] as number) * (y[r] as number);
    });
    y[lu.pivotRows[j] as number] = sum;
  }
  return y;
}
