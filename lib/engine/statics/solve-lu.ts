import type { SparseColumn, SparseLu } from './sparse-lu';

/** Solves (basis columns) z = right, z in pivot order; what is left on rows without a pivot is the residual. */
export function solveBasis(lu: SparseLu, right: Float64Array): { z: Float64Array; residual: number } {
  const x = Float64Array.from(right);
  const n = lu.basis.length;
  const z = new Float64Array(n);
  for (let j = 0; j < n; j++) {
    const value = x[lu.pivotRows[j] as number] as number;
    z[j] = value;
    if (value !== 0) subtract(x, lu.lower[j] as SparseColumn, value);
  }
  const residual = lu.freeRows.reduce((most, r) => Math.max(most, Math.abs(x[r] as number)), 0);
  for (let k = n - 1; k >= 0; k--) {
    if (z[k] === 0) continue;
    const u = lu.upper[k] as SparseColumn;
    const last = u.rows.length - 1;
    const value = (z[k] as number) / (u.values[last] as number);
    for (let i = 0; i < last; i++) {
      const j = u.rows[i] as number;
      z[j] = (z[j] as number) - value * (u.values[i] as number);
    }
    z[k] = value;
  }
  return { z, residual };
}

function subtract(x: Float64Array, { rows, values }: SparseColumn, factor: number): void {
  for (let i = 0; i < rows.length; i++) {
    const r = rows[i] as number;
    x[r] = (x[r] as number) - factor * (values[i] as number);
  }
}

/** The vector over rows that is normal to every basis column, with 1 at the free row given: a motion without force. */
export function leftNullVector(lu: SparseLu, freeRow: number): Float64Array {
  const y = new Float64Array(lu.rowCount);
  y[freeRow] = 1;
  return backThroughLower(lu, y);
}

/** Solves (basis columns)ᵀ y = right, right in pivot order; y over rows, zero on rows without a pivot. */
export function solveBasisTransposed(lu: SparseLu, right: readonly number[]): Float64Array {
  const w = new Float64Array(lu.basis.length);
  const y = new Float64Array(lu.rowCount);
  lu.upper.forEach((u, k) => {
    const last = u.rows.length - 1;
    let sum = right[k] as number;
    for (let i = 0; i < last; i++) sum -= (u.values[i] as number) * (w[u.rows[i] as number] as number);
    w[k] = sum / (u.values[last] as number);
    y[lu.pivotRows[k] as number] = w[k] as number;
  });
  return backThroughLower(lu, y);
}

/** y ← L⁻ᵀ y, last pivot first. */
function backThroughLower(lu: SparseLu, y: Float64Array): Float64Array {
  for (let j = lu.basis.length - 1; j >= 0; j--) {
    const { rows, values } = lu.lower[j] as SparseColumn;
    const row = lu.pivotRows[j] as number;
    let sum = y[row] as number;
    for (let i = 0; i < rows.length; i++) sum -= (values[i] as number) * (y[rows[i] as number] as number);
    y[row] = sum;
  }
  return y;
}
