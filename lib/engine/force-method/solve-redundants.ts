import type { LoadCase } from '@/lib/model/load';
import { quantityKey } from '@/lib/model/quantity';
import type { Equilibrium } from '../statics/equilibrium';
import { type LoadState, loadState } from '../statics/load-state';
import { solveEnvelope } from './envelope-cholesky';
import { type FlexibilityMatrix, flexibilityMatrix } from './flexibility-matrix';
import { gapRows, type LoadedPrimary, loadedPrimary } from './gap-rows';
import { addState, type PrimaryBasis, primaryForces } from './self-stress';
import type { Movement } from './support-rows';
import type { MomentPart, WorkRow } from './work';

export interface SolvedCase {
  load: LoadState;
  /** Scaled quantities of the primary structure and of the structure itself. */
  primary: Float64Array;
  final: Float64Array;
  diagrams: LoadedPrimary['diagrams'];
  parts: MomentPart[][];
  gaps: { rows: WorkRow[]; total: number; rightSide: number }[];
  /** True redundants, in the order of the basis. */
  X: number[];
  movements: Movement[];
}

export interface SolvedForces extends FlexibilityMatrix {
  cases: Map<string, SolvedCase>;
}

/** Solves f X + δ0 = right side for every case. Undefined when the flexibility matrix is not positive definite. */
export function solveRedundants(
  eq: Equilibrium,
  basis: PrimaryBasis,
  cases: readonly LoadCase[],
  EI0: number,
): SolvedForces | undefined {
  const matrix = flexibilityMatrix(eq, basis, EI0);
  const { factor, units, held } = matrix;
  if (!factor) return undefined;
  const solved = new Map<string, SolvedCase>();
  for (const c of cases) {
    const load = loadState(eq, c.loads);
    const primary = primaryForces(eq, basis, load.rows);
    const loaded = loadedPrimary(eq, load, (q) => primary[q] as number);
    const movements = settlements(eq, c);
    const gaps = units.map((unit, i) => {
      const released = basis.local ? undefined : basis.redundants[i];
      const rows = gapRows(eq, unit, loaded, held, EI0, movements, released);
      const own = movements.filter((m) => m.column === released).reduce((t, m) => t + m.value, 0);
      return { rows, total: rows.reduce((t, r) => t + r.value, 0), rightSide: EI0 * own };
    });
    const factors = solveEnvelope(
      factor,
      gaps.map((g) => g.rightSide - g.total),
    );
    const final = Float64Array.from(primary);
    basis.states.forEach((state, i) => {
      const scale = basis.local ? 1 : (eq.scale[basis.redundants[i] as number] as number);
      addState(final, state, (factors[i] as number) / scale);
    });
    const X = basis.redundants.map((q) => (final[q] as number) * (eq.scale[q] as number));
    const { diagrams, parts } = loaded;
    solved.set(c.id, { load, primary, final, diagrams, parts, gaps, X, movements });
  }
  return { ...matrix, cases: solved };
}

function settlements(eq: Equilibrium, c: LoadCase): Movement[] {
  return c.loads.flatMap((load): Movement[] => {
    if (load.kind !== 'settlement') return [];
    const { joint, component, value } = load;
    const column = eq.indexOf.get(quantityKey({ kind: 'reaction', joint, component }));
    return column === undefined ? [] : [{ column, joint, component, value }];
  });
}
