import type { Restraint } from '@/lib/model/structure';
import type { PiecewisePolynomial } from '../diagrams/piecewise-polynomial';
import type { Bar, Equilibrium } from '../statics/equilibrium';
import type { LoadState } from '../statics/load-state';
import { endForces, memberDiagram } from './member-state';
import { momentParts } from './moment-parts';
import type { MomentPart, WorkRow } from './work';
import { axialShearRows, bendingRows, partRows, strainRows } from './work-row';

/** What one unit state does: forces of the members it reaches, reactions it calls up. Order of members and columns. */
export interface UnitState {
  members: Map<number, { N: number; V: number; m0: number; m1: number }>;
  reactions: Map<number, number>;
}

/** True (not scaled) forces of a state of scaled quantities, for the members it reaches. */
export function unitState(eq: Equilibrium, scaled: ReadonlyMap<number, number>, factor: number): UnitState {
  const state: UnitState = { members: new Map(), reactions: new Map() };
  const value = (q: number) => {
    const v = scaled.get(q);
    return v === undefined ? 0 : v * factor;
  };
  const reached = new Set<number>();
  for (const [q, v] of scaled) {
    const b = eq.barOf[q] as number;
    if (b === -1) state.reactions.set(q, v * (eq.scale[q] as number) * factor);
    else reached.add(b);
  }
  for (const b of [...reached].sort((x, y) => x - y)) {
    const e = endForces(eq, b, value);
    const { L } = (eq.bars[b] as Bar).axis;
    state.members.set(b, { N: e.N, V: (e.M1 - e.M0) / L, m0: e.M0, m1: e.M1 });
  }
  return state;
}

export interface Springs {
  column: number;
  joint: string;
  component: 'x' | 'y' | 'turn';
  stiffness: number;
}

export function springs(eq: Equilibrium): Springs[] {
  const supports = new Map(eq.analysis.joints.map((j) => [j.id, j.support]));
  return eq.quantities.flatMap((q, column): Springs[] => {
    if (q.kind !== 'reaction') return [];
    const restraint = supports.get(q.joint)?.[q.component] as Restraint;
    return typeof restraint === 'object'
      ? [{ column, joint: q.joint, component: q.component, stiffness: restraint.spring }]
      : [];
  });
}

/** −EI0 R̄ Δ */
export function settlementRow({ joint, component, value }: Movement, unit: number, EI0: number): WorkRow {
  return { kind: 'settlement', joint, component, unit, movement: value, value: -EI0 * unit * value };
}

/** EI0 R̄ R/k */
export function springRow(s: Springs, unit: number, force: number, EI0: number): WorkRow {
  const { joint, component, stiffness } = s;
  return {
    kind: 'spring',
    joint,
    component,
    unit,
    force,
    stiffness,
    value: (EI0 * unit * force) / stiffness,
  };
}

/** A prescribed movement of a support, in its own axes. */
export interface Movement {
  column: number;
  joint: string;
  component: 'x' | 'y' | 'turn';
  value: number;
}

const constant = (value: number, L: number): PiecewisePolynomial => [{ from: 0, to: L, c: [value] }];

/** Rows of EI0 f_ij, row by row as it stands in the table. */
export function flexibilityRows(
  eq: Equilibrium,
  i: UnitState,
  j: UnitState,
  held: readonly Springs[],
  EI0: number,
): WorkRow[] {
  const rows: WorkRow[] = [];
  for (const [b, mine] of i.members) {
    const other = j.members.get(b);
    const bar = eq.bars[b];
    if (!other || !bar) continue;
    rows.push(...bendingRows(bar, mine, other, EI0));
    const force = { N: constant(other.N, bar.axis.L), V: constant(other.V, bar.axis.L) };
    rows.push(...axialShearRows(bar, mine, force, EI0));
  }
  for (const s of held) {
    const unit = i.reactions.get(s.column);
    const force = j.reactions.get(s.column);
    if (unit === undefined || force === undefined) continue;
    rows.push(springRow(s, unit, force, EI0));
  }
  return rows;
}

/** The primary structure under one case: its loads, scaled quantities, diagrams and shapes by member. */
export interface LoadedPrimary {
  load: LoadState;
  scaled: (q: number) => number;
  diagrams: Forces[];
  parts: MomentPart[][];
}

type Forces = ReturnType<typeof memberDiagram>;

export function loadedPrimary(
  eq: Equilibrium,
  load: LoadState,
  scaled: (q: number) => number,
): LoadedPrimary {
  const diagrams = eq.bars.map((_, b) => memberDiagram(eq, b, endForces(eq, b, scaled, load), load));
  const parts = eq.bars.map((bar, b) =>
    momentParts(bar, diagrams[b] as Forces, load.local[b] as LoadState['local'][number]),
  );
  return { load, scaled, diagrams, parts };
}

/** Rows of EI0 δ_i0: shapes of the primary structure against unit state i, and every term beside bending. */
export function gapRows(
  eq: Equilibrium,
  i: UnitState,
  p: LoadedPrimary,
  held: readonly Springs[],
  EI0: number,
  movements: readonly Movement[],
  released: number | undefined,
): WorkRow[] {
  const rows: WorkRow[] = [];
  for (const [b, unit] of i.members) {
    const bar = eq.bars[b];
    const [forces, parts, local] = [p.diagrams[b], p.parts[b], p.load.local[b]];
    if (!bar || !forces || !parts || !local) throw new Error(`no member ${b}`);
    rows.push(...partRows(bar, unit, parts, EI0));
    rows.push(...axialShearRows(bar, unit, forces, EI0));
    rows.push(...strainRows(bar, unit, local, EI0));
  }
  for (const s of held) {
    const unit = i.reactions.get(s.column);
    const force = p.scaled(s.column) * (eq.scale[s.column] as number);
    if (unit === undefined || force === 0) continue;
    rows.push(springRow(s, unit, force, EI0));
  }
  for (const m of movements) {
    const unit = i.reactions.get(m.column);
    if (unit === undefined || m.column === released) continue;
    rows.push(settlementRow(m, unit, EI0));
  }
  return rows;
}
