import type { Equilibrium } from '../statics/equilibrium';
import { solveBasis } from '../statics/solve-lu';
import { factorColumns } from '../statics/sparse-lu';
import { tolerance } from '../tolerance';
import { type SelfStress, sparseState } from './self-stress';

/**
 * For every quantity set aside, a self-stress state that closes as near to it as can be: the smallest neighbourhood of
 * joints in which the columns before it can balance it. Each state has a quantity that comes after all others of the
 * state, and no two the same, so the states are independent.
 */
export function localStates(
  eq: Equilibrium,
  order: readonly number[],
  aside: readonly number[],
): SelfStress[] {
  const rank = new Int32Array(eq.columns.length);
  order.forEach((q, i) => {
    rank[q] = i;
  });
  const neighbourhood = neighbourhoods(eq);
  return aside.map((k) => {
    for (const columns of neighbourhood(k)) {
      const before = columns.filter((q) => (rank[q] as number) < (rank[k] as number));
      const state = balance(eq, before, k);
      if (state) return state;
    }
    throw new Error('a quantity set aside that nothing before it balances');
  });
}

/** Columns that act wholly within 0, 1, 2, … joints of the given one, nearest first. */
function neighbourhoods(eq: Equilibrium): (k: number) => Generator<number[]> {
  const users: number[][] = Array.from({ length: eq.rowCount }, () => []);
  eq.columns.forEach((c, q) => {
    for (const r of c.rows) users[r]?.push(q);
  });
  return function* (k) {
    const rows = new Set(eq.columns[k]?.rows);
    const inside = new Set<number>();
    for (;;) {
      const touching = new Set([...rows].flatMap((r) => users[r] ?? []));
      for (const q of touching) if (eq.columns[q]?.rows.every((r) => rows.has(r))) inside.add(q);
      yield [...inside];
      const before = rows.size;
      for (const q of touching) for (const r of eq.columns[q]?.rows ?? []) rows.add(r);
      if (rows.size === before) return;
    }
  };
}

/** The state of the given columns that balances column k, on the rows they touch; undefined when there is none. */
function balance(eq: Equilibrium, columns: readonly number[], k: number): SelfStress | undefined {
  const rowOf = new Map<number, number>();
  const number = (r: number) => {
    const known = rowOf.get(r);
    if (known !== undefined) return known;
    rowOf.set(r, rowOf.size);
    return rowOf.size - 1;
  };
  const small = [k, ...columns].map((q) => ({
    rows: (eq.columns[q]?.rows ?? []).map(number),
    values: eq.columns[q]?.values ?? [],
  }));
  const lu = factorColumns(small, small.map((_, i) => i).slice(1), rowOf.size, tolerance.pivot);
  const right = new Float64Array(rowOf.size);
  small[0]?.rows.forEach((r, i) => {
    right[r] = -(small[0]?.values[i] as number);
  });
  const { z, residual } = solveBasis(lu, right);
  if (residual > tolerance.pivot * Math.hypot(...right)) return undefined;
  return sparseState(
    lu.basis.map((i) => columns[i - 1] as number),
    z,
    k,
  );
}
