import type { Equilibrium } from '../statics/equilibrium';
import { solveBasis } from '../statics/solve-lu';
import { sparseSolver } from '../statics/solve-sparse';
import { factorColumns, type SparseColumn, type SparseLu } from '../statics/sparse-lu';
import { tolerance } from '../tolerance';
import { localStates } from './local-states';
import { isRigidAlong } from './proposal-order';

/** Forces in equilibrium without load, in scaled quantities by column; sparse. */
export type SelfStress = Map<number, number>;

/** A primary structure: the quantities kept, the redundants, and the self-stress states that close its gaps. */
export interface PrimaryBasis {
  lu: SparseLu;
  /** X1, X2, …; axial forces that bending cannot determine are not among them. */
  redundants: number[];
  /** As many independent states as redundants: states[i] is Xi = 1 (scaled), or a local one when `local`. */
  states: SelfStress[];
  /** Many redundants, and unit states that reach far: states around single cells stand for them. */
  local: boolean;
  /** Something can move: there are no states. */
  unstable: boolean;
  /** Purely axial states of members that do not stretch; the force of `column` is taken as zero. */
  open: { column: number; state: SelfStress }[];
}

/** Up to here the statics of every state is written out; beyond it the tables of its forces stand alone. */
export const writtenRedundants = 30;
export const writtenMembers = 150;

/** With more redundants than this, unit states that reach more than so many quantities on average give way to local ones. */
export const unitStatesUpTo = 150;
const widestStates = 16;

/**
 * Factors the matrix keeping columns in the order given; what is left over are the redundants. Undefined when their unit
 * states reach too far to be used; `local` asks for states around single cells instead.
 */
export function primaryBasis(
  eq: Equilibrium,
  order: readonly number[],
  local = false,
): PrimaryBasis | undefined {
  const lu = factorColumns(eq.columns, order, eq.rowCount, tolerance.pivot);
  const unstable = lu.freeRows.some((r) => !eq.trivialRows.has(r));
  const unitState = unitStates(eq, lu);
  const open: PrimaryBasis['open'] = [];
  const redundants: number[] = [];
  const rigid = isRigidAlong(eq);
  const keptSoft = new Set(lu.basis.filter((q) => !rigid(q)));
  for (const k of lu.aside) {
    const state = rigid(k) ? unitState(k) : undefined;
    const closed = state && [...state.keys()].every((q) => !keptSoft.has(q));
    if (state && closed && eq.quantities[k]?.kind === 'axial') open.push({ column: k, state });
    else redundants.push(k);
  }
  if (unstable) return { lu, redundants, states: [], local, unstable, open };
  if (local) return { lu, redundants, states: localStates(eq, order, redundants), local, unstable, open };
  const states: SelfStress[] = [];
  let entries = 0;
  for (const k of redundants) {
    const state = unitState(k);
    states.push(state);
    entries += state.size;
    if (redundants.length > unitStatesUpTo && entries > widestStates * redundants.length) return undefined;
  }
  return { lu, redundants, states, local, unstable, open };
}

/** The kept quantities under a unit of one set aside. */
function unitStates(eq: Equilibrium, lu: SparseLu): (k: number) => SelfStress {
  const solve = sparseSolver(lu);
  return (k) => {
    const { pivots, values } = solve(eq.columns[k] as SparseColumn);
    return sparseState(
      pivots.map((p) => lu.basis[p] as number),
      values,
      k,
    );
  };
}

/** The state without entries that are rounding only. */
export function sparseState(columns: readonly number[], z: ArrayLike<number>, unit: number): SelfStress {
  let largest = 1;
  for (let i = 0; i < z.length; i++) largest = Math.max(largest, Math.abs(z[i] as number));
  const state: SelfStress = new Map([[unit, 1]]);
  for (let i = 0; i < z.length; i++)
    if (Math.abs(z[i] as number) > tolerance.entry * largest) state.set(columns[i] as number, z[i] as number);
  return state;
}

/** Scaled quantities of the primary structure under what loads bring to the rows, the redundants zero. */
export function primaryForces(eq: Equilibrium, basis: PrimaryBasis, rows: Float64Array): Float64Array {
  const { z } = solveBasis(
    basis.lu,
    rows.map((v) => -v),
  );
  const forces = new Float64Array(eq.quantities.length);
  basis.lu.basis.forEach((q, i) => {
    forces[q] = z[i] as number;
  });
  if (basis.local) return forces;
  const excess = basis.redundants.map((q) => forces[q] as number);
  excess.forEach((value, i) => {
    if (value !== 0) addState(forces, basis.states[i] as SelfStress, -value);
    forces[basis.redundants[i] as number] = 0;
  });
  return forces;
}

/** forces += factor × state */
export function addState(forces: Float64Array, state: SelfStress, factor: number): void {
  for (const [q, v] of state) forces[q] = (forces[q] as number) + factor * v;
}

/** Column numbers of quantities that no redundant changes, those of open axial states left aside. */
export function fixedQuantities(eq: Equilibrium, basis: PrimaryBasis): number[] {
  const largest = new Float64Array(eq.quantities.length);
  for (const state of basis.states) {
    let top = 0;
    for (const v of state.values()) top = Math.max(top, Math.abs(v));
    for (const [q, v] of state) largest[q] = Math.max(largest[q] as number, Math.abs(v) / top);
  }
  const open = new Set(basis.open.flatMap((o) => [...o.state.keys()]));
  return eq.quantities
    .map((_, q) => q)
    .filter((q) => (largest[q] as number) <= tolerance.fixed && !open.has(q));
}
