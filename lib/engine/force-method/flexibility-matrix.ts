import type { Equilibrium } from '../statics/equilibrium';
import { conditionOf } from './condition';
import { type EnvelopeMatrix, envelopeMatrix, factorEnvelope } from './envelope-cholesky';
import { flexibilityRows } from './flexibility';
import type { PrimaryBasis } from './self-stress';
import { type Springs, springs } from './support-rows';
import { type UnitState, unitState } from './unit-state';
import type { WorkRow } from './work';

/** EI0 f with its rows, its factor and its condition; the states it was worked from, in true forces. */
export interface FlexibilityMatrix {
  units: UnitState[];
  held: Springs[];
  entries: { i: number; j: number; rows: WorkRow[]; total: number }[];
  /** Absent when the matrix is not positive definite. */
  factor?: EnvelopeMatrix;
  /** 2-norm condition of the matrix scaled to a unit diagonal. */
  condition: number;
}

/** Works out EI0 f for the states of a primary structure. */
export function flexibilityMatrix(eq: Equilibrium, basis: PrimaryBasis, EI0: number): FlexibilityMatrix {
  const held = springs(eq);
  const units = basis.states.map((state, i) => {
    const scale = basis.local ? 1 : (eq.scale[basis.redundants[i] as number] as number);
    return unitState(eq, state, 1 / scale);
  });
  const entries = overlapping(units, held).flatMap(({ i, j }) => {
    const rows = flexibilityRows(eq, units[i] as UnitState, units[j] as UnitState, held, EI0);
    return rows.length === 0 ? [] : [{ i, j, rows, total: rows.reduce((t, r) => t + r.value, 0) }];
  });
  const lines = units.map(() => new Map<number, number>());
  for (const { i, j, total } of entries) lines[i]?.set(j, total);
  const matrix = envelopeMatrix(units.length, lines);
  return { units, held, entries, factor: factorEnvelope(matrix), condition: conditionOf(matrix) };
}

/** Pairs j ≤ i of states that bend or stretch a member or press a spring in common; others have f_ij = 0. */
function overlapping(units: readonly UnitState[], held: readonly Springs[]): { i: number; j: number }[] {
  const members = new Map<number, number[]>();
  const reactions = new Map<number, number[]>();
  const note = (users: Map<number, number[]>, key: number, i: number) => {
    const list = users.get(key);
    if (list) list.push(i);
    else users.set(key, [i]);
  };
  const columns = new Set(held.map((s) => s.column));
  return units.flatMap((u, i) => {
    const pressed = [...u.reactions.keys()].filter((q) => columns.has(q));
    const met = new Set<number>();
    for (const b of u.members.keys()) note(members, b, i);
    for (const q of pressed) note(reactions, q, i);
    for (const b of u.members.keys()) for (const j of members.get(b) ?? []) met.add(j);
    for (const q of pressed) for (const j of reactions.get(q) ?? []) met.add(j);
    return [...met].sort((a, b) => a - b).map((j) => ({ i, j }));
  });
}
