/**
 * Gaussian elimination with row exchanges on a matrix whose entries lie near the diagonal; work grows with n·band².
 * Golub and Van Loan, Matrix Computations, 4th ed., §4.3.
 */
export class BandedSystem {
  private readonly rows: Map<number, number>[];

  constructor(readonly n: number) {
    this.rows = Array.from({ length: n }, () => new Map());
  }

  add(i: number, j: number, value: number): void {
    const row = this.rows[i];
    if (!row) throw new Error(`no row ${i}`);
    const before = row.get(j);
    row.set(j, before === undefined ? value : before + value);
  }

  /** Solutions for every right-hand side; undefined when a pivot is negligible beside its scaled row. */
  solve(rights: readonly Float64Array[], tolerance: number): Float64Array[] | undefined {
    const { n } = this;
    const rows = this.rows.map((r) => new Map(r));
    const x = rights.map((r) => Float64Array.from(r));
    const scale = rows.map((r) => Math.max(...[...r.values()].map(Math.abs), 0));
    const reach = rows.map((r) => Math.max(0, ...r.keys()));
    const lower = rows.map((r) => Math.min(n, ...r.keys()));
    const last = new Array<number>(n).fill(0);
    for (let i = 0; i < n; i++) last[lower[i] as number] = i;
    let end = 0;
    for (let k = 0; k < n; k++) {
      end = Math.max(end, k, last[k] as number);
      let p = -1;
      let best = 0;
      for (let i = k; i <= end; i++) {
        const size = Math.abs(entry(rows[i] as Map<number, number>, k)) / (scale[i] as number);
        if (size > best) [p, best] = [i, size];
      }
      if (p === -1 || !(best > tolerance)) return undefined;
      for (const list of [rows, scale, reach]) swap(list as unknown[], k, p);
      for (const r of x) [r[k], r[p]] = [r[p] as number, r[k] as number];
      const pivot = rows[k] as Map<number, number>;
      const d = pivot.get(k) as number;
      for (let i = k + 1; i <= end; i++) {
        const row = rows[i] as Map<number, number>;
        const value = row.get(k);
        if (value === undefined) continue;
        row.delete(k);
        if (value === 0) continue;
        const f = value / d;
        for (const [j, v] of pivot) if (j > k) row.set(j, entry(row, j) - f * v);
        for (const r of x) r[i] = (r[i] as number) - f * (r[k] as number);
      }
    }
    for (const r of x) {
      for (let k = n - 1; k >= 0; k--) {
        const row = rows[k] as Map<number, number>;
        let sum = r[k] as number;
        for (const [j, v] of row) if (j > k) sum -= v * (r[j] as number);
        r[k] = sum / (row.get(k) as number);
      }
    }
    return x;
  }
}

function swap(list: unknown[], a: number, b: number): void {
  [list[a], list[b]] = [list[b], list[a]];
}

/** An entry that is not stored is zero: that is what sparse means. */
function entry(row: ReadonlyMap<number, number>, j: number): number {
  const value = row.get(j);
  return value === undefined ? 0 : value;
}
