/**
 * Symmetric positive definite matrix kept row by row from its first non-zero entry to the diagonal (envelope storage),
 * and its Cholesky factor, which fills only the envelope. George and Liu, Computer Solution of Large Sparse Positive
 * Definite Systems (1981), chapter 4.
 */
export interface EnvelopeMatrix {
  first: number[];
  rows: number[][];
}

export function envelopeMatrix(n: number, entries: readonly ReadonlyMap<number, number>[]): EnvelopeMatrix {
  const first = Array.from({ length: n }, (_, i) => Math.min(i, ...(entries[i]?.keys() ?? [])));
  const rows = first.map((from, i) =>
    Array.from({ length: i - from + 1 }, (_, k) => {
      const value = entries[i]?.get(from + k);
      return value === undefined ? 0 : value;
    }),
  );
  return { first, rows };
}

/** Lower factor in the same envelope; undefined when the matrix is not positive definite. */
export function factorEnvelope({ first, rows }: EnvelopeMatrix): EnvelopeMatrix | undefined {
  const lower: number[][] = [];
  for (let i = 0; i < rows.length; i++) {
    const fi = first[i] as number;
    const row = [...(rows[i] as number[])];
    for (let j = fi; j <= i; j++) {
      const fj = first[j] as number;
      const other = j === i ? row : (lower[j] as number[]);
      let sum = row[j - fi] as number;
      for (let k = Math.max(fi, fj); k < j; k++) sum -= (row[k - fi] as number) * (other[k - fj] as number);
      if (j < i) row[j - fi] = sum / (other[j - fj] as number);
      else if (sum <= 0) return undefined;
      else row[j - fi] = Math.sqrt(sum);
    }
    lower.push(row);
  }
  return { first, rows: lower };
}

export function solveEnvelope({ first, rows }: EnvelopeMatrix, right: readonly number[]): number[] {
  const x = [...right];
  rows.forEach((row, i) => {
    const fi = first[i] as number;
    let sum = x[i] as number;
    for (let k = fi; k < i; k++) sum -= (row[k - fi] as number) * (x[k] as number);
    x[i] = sum / (row[i - fi] as number);
  });
  for (let i = rows.length - 1; i >= 0; i--) {
    const row = rows[i] as number[];
    const fi = first[i] as number;
    x[i] = (x[i] as number) / (row[i - fi] as number);
    for (let k = fi; k < i; k++) x[k] = (x[k] as number) - (row[k - fi] as number) * (x[i] as number);
  }
  return x;
}
