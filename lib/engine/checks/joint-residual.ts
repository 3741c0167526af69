import type { Equilibrium } from '../statics/equilibrium';

/** What is left of the equilibrium of every joint, beside the largest force that enters it. */
export function jointResidual(eq: Equilibrium, final: Float64Array, rows: Float64Array): number {
  const left = Float64Array.from(rows);
  const size = Float64Array.from(rows.map(Math.abs));
  eq.columns.forEach((column, q) => {
    column.rows.forEach((r, i) => {
      const v = (column.values[i] as number) * (final[q] as number);
      left[r] = (left[r] as number) + v;
      size[r] = Math.max(size[r] as number, Math.abs(v));
    });
  });
  const largest = Math.max(...size);
  return largest === 0 ? 0 : Math.max(...left.map(Math.abs)) / largest;
}
