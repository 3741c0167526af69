import { reach } from './reach';
import type { SparseColumn, SparseLu } from './sparse-lu';

/**
 * Solver of (basis columns) z = −column for columns with few entries: pivots and values that are not zero. It touches
 * only what the entries can reach through L and U (Gilbert and Peierls 1988), so that a local state costs local work.
 */
export function sparseSolver(lu: SparseLu): (column: SparseColumn) => { pivots: number[]; values: number[] } {
  const x = new Float64Array(lu.rowCount);
  const z = new Float64Array(lu.basis.length);
  const alongL = reach(lu.rowCount, (r) => {
    const pivot = lu.pivotOf[r] as number;
    return pivot === -1 ? [] : (lu.lower[pivot] as SparseColumn).rows;
  });
  const alongU = reach(lu.basis.length, (k) => (lu.upper[k] as SparseColumn).rows);
  return (column) => {
    const rows = alongL(column.rows);
    column.rows.forEach((r, i) => {
      x[r] = -(column.values[i] as number);
    });
    const start: number[] = [];
    for (const r of rows) {
      const pivot = lu.pivotOf[r] as number;
      const value = x[r] as number;
      if (pivot === -1 || value === 0) continue;
      start.push(pivot);
      z[pivot] = value;
      const l = lu.lower[pivot] as SparseColumn;
      for (let i = 0; i < l.rows.length; i++) {
        const fed = l.rows[i] as number;
        x[fed] = (x[fed] as number) - value * (l.values[i] as number);
      }
    }
    const pivots = alongU(start);
    for (const k of pivots) {
      const u = lu.upper[k] as SparseColumn;
      const last = u.rows.length - 1;
      const value = (z[k] as number) / (u.values[last] as number);
      z[k] = value;
      for (let i = 0; i < last; i++) {
        const j = u.rows[i] as number;
        z[j] = (z[j] as number) - value * (u.values[i] as number);
      }
    }
    const values = pivots.map((k) => z[k] as number);
    for (const r of rows) x[r] = 0;
    for (const k of pivots) z[k] = 0;
    return { pivots, values };
  };
}
