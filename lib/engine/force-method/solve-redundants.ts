import type { LoadCase } from '@/lib/model/load';
import { quantityKey } from '@/lib/model/quantity';
import { type Equilibrium, type LoadState, loadState } from '../statics/equilibrium';
import { solveBasis } from '../statics/sparse-lu';
import { envelopeMatrix, factorEnvelope, solveEnvelope } from './envelope-cholesky';
import {
  flexibilityRows,
  gapRows,
  loadedParts,
  type Springs,
  springs,
  type UnitState,
  unitState,
} from './flexibility';
import type { PrimaryBasis } from './self-stress';
import type { MomentPart, WorkRow } from './work';

export interface Movement {
  column: number;
  joint: string;
  component: 'x' | 'y' | 'turn';
  value: number;
}

export interface SolvedCase {
  load: LoadState;
  /** Scaled quantities of the primary structure and of the structure itself. */
  primary: Float64Array;
  final: Float64Array;
  parts: (MomentPart[] | undefined)[];
  gaps: { rows: WorkRow[]; total: number; rightSide: number }[];
  /** True redundants. */
  X: number[];
  /** Redundants that bend, stretch and press on nothing: bending cannot determine them, and they are taken as zero. */
  open: ReadonlySet<number>;
  movements: Movement[];
}

export interface SolvedForces {
  units: UnitState[];
  held: Springs[];
  flexibility: { i: number; j: number; rows: WorkRow[]; total: number }[];
  condition: number;
  cases: Map<string, SolvedCase>;
}

/** Solves f X + δ0 = right side for every case. Undefined when the flexibility matrix is not positive definite. */
export function solveRedundants(
  eq: Equilibrium,
  basis: PrimaryBasis,
  cases: readonly LoadCase[],
  EI0: number,
): SolvedForces | undefined {
  const held = springs(eq);
  const units = basis.units.map((u, i) =>
    unitState(eq, u, 1 / (eq.scale[basis.redundants[i] as number] as number)),
  );
  const flexibility = overlapping(units).map(({ i, j }) => {
    const rows = flexibilityRows(eq, units[i] as UnitState, units[j] as UnitState, held, EI0);
    return { i, j, rows, total: rows.reduce((t, r) => t + r.value, 0) };
  });
  const open = openRedundants(units.length, flexibility);
  const entries = units.map((_, i) => new Map(open.has(i) ? [[i, 1]] : []));
  for (const { i, j, total } of flexibility) if (!open.has(i) && !open.has(j)) entries[i]?.set(j, total);
  const matrix = envelopeMatrix(units.length, entries);
  const factor = factorEnvelope(matrix);
  if (!factor) return undefined;
  const solved = new Map<string, SolvedCase>();
  for (const c of cases) {
    const load = loadState(eq, c.loads);
    const { z } = solveBasis(
      basis.lu,
      load.rows.map((v) => -v),
    );
    const primary = new Float64Array(eq.quantities.length);
    basis.lu.basis.forEach((q, i) => {
      primary[q] = z[i] as number;
    });
    const scaled = (q: number) => primary[q] as number;
    const parts = loadedParts(eq, load, scaled);
    const movements = settlements(eq, c);
    const gaps = units.map((unit, i) => {
      const released = basis.redundants[i];
      const rows = gapRows(eq, unit, { load, scaled, parts }, held, EI0, movements, released);
      const own = movements.filter((m) => m.column === released).reduce((t, m) => t + m.value, 0);
      return { rows, total: rows.reduce((t, r) => t + r.value, 0), rightSide: EI0 * own };
    });
    const X = solveEnvelope(
      factor,
      gaps.map((g, i) => (open.has(i) ? 0 : g.rightSide - g.total)),
    );
    const final = Float64Array.from(primary);
    basis.units.forEach((unit, i) => {
      const x = (X[i] as number) / (eq.scale[basis.redundants[i] as number] as number);
      for (const [q, v] of unit) final[q] = (final[q] as number) + v * x;
    });
    solved.set(c.id, { load, primary, final, parts, gaps, X, open, movements });
  }
  return { units, held, flexibility, condition: conditionOf(matrix), cases: solved };
}

/** Redundants without flexibility of their own: a self-stress along members that neither stretch nor bend. */
function openRedundants(n: number, flexibility: SolvedForces['flexibility']): Set<number> {
  const own = new Map(flexibility.filter((f) => f.i === f.j).map((f) => [f.i, f.total]));
  const largest = Math.max(0, ...own.values());
  const open = new Set<number>();
  for (let i = 0; i < n; i++) {
    const f = own.get(i);
    if (f === undefined || f <= largest * 1e-18) open.add(i);
  }
  return open;
}

function settlements(eq: Equilibrium, c: LoadCase): Movement[] {
  return c.loads.flatMap((load): Movement[] => {
    if (load.kind !== 'settlement') return [];
    const { joint, component, value } = load;
    const column = eq.indexOf.get(quantityKey({ kind: 'reaction', joint, component }));
    return column === undefined ? [] : [{ column, joint, component, value }];
  });
}

/** Pairs of unit states that bend, stretch or press on something in common; others have f_ij = 0. */
function overlapping(units: readonly UnitState[]): { i: number; j: number }[] {
  const users = new Map<string, number[]>();
  units.forEach((u, i) => {
    for (const b of u.members.keys()) users.set(`m${b}`, [...(users.get(`m${b}`) ?? []), i]);
    for (const q of u.reactions.keys()) users.set(`r${q}`, [...(users.get(`r${q}`) ?? []), i]);
  });
  const pairs = new Set<number>();
  const n = units.length;
  for (const list of users.values())
    for (const i of list) for (const j of list) if (j <= i) pairs.add(i * n + j);
  return [...pairs].sort((a, b) => a - b).map((p) => ({ i: Math.floor(p / n), j: p % n }));
}

/** 2-norm condition of the matrix scaled to a unit diagonal, by power and inverse iteration on its factor. */
function conditionOf(matrix: { first: number[]; rows: number[][] }): number {
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

function multiply({ first, rows }: { first: number[]; rows: number[][] }, x: number[]): number[] {
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
