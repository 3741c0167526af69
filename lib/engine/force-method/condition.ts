import { type EnvelopeMatrix, factorEnvelope, solveEnvelope } from './envelope-cholesky';

/** 2-norm condition of the matrix scaled to a unit diagonal, by power and inverse iteration on its factor. */
export function conditionOf(matrix: EnvelopeMatrix): number {
  const n = matrix.rows.length;
  if (n <= 1) return 1;
  const d = matrix.rows.map((row) => Math.sqrt(row[row.length - 1] as number));
  const rows = matrix.rows.map((row, i) =>
    row.map((v, k) => v / ((d[i] as number) * (d[(matrix.first[i] as number) + k] as number))),
  );
  const scaled = { first: matrix.first, rows };
  const factor = factorEnvelope(scaled);
  if (!factor) return Number.POSITIVE_INFINITY;
  const largest = iterate(n, (x) => multiply(scaled, x));
  const smallest = 1 / iterate(n, (x) => solveEnvelope(factor, x));
  return largest / smallest;
}

function multiply({ first, rows }: EnvelopeMatrix, x: number[]): number[] {
  const y = x.map(() => 0);
  rows.forEach((row, i) => {
    row.forEach((v, k) => {
      const j = (first[i] as number) + k;
      y[i] = (y[i] as number) + v * (x[j] as number);
      if (j !== i) y[j] = (y[j] as number) + v * (x[i] as number);
    });
  });
  return y;
}

function iterate(n: number, apply: (x: number[]) => number[]): number {
  let x = Array.from({ length: n }, (_, i) => 1 + 0.37 * Math.sin(7 * i + 1));
  let value = 0;
  for (let step = 0; step < 200; step++) {
    const y = apply(x);
    const size = Math.hypot(...y);
    x = y.map((v) => v / size);
    if (Math.abs(size - value) <= 1e-10 * size) return size;
    value = size;
  }
  return value;
}
