import type { Restraint } from '@/lib/model/structure';
import { between, integralOfProduct, valueAt } from '../diagrams/piecewise';
import type { PiecewisePolynomial } from '../diagrams/piecewise-polynomial';
import { stretches } from '../diagrams/stretches';
import type { Equilibrium, LoadState } from '../statics/equilibrium';
import { endForces, memberDiagram } from './member-state';
import { momentParts } from './moment-parts';
import type { MomentPart, WorkRow } from './work';
import { axialShearRows, bendingRows, partRows } from './work-row';

/** What one unit state does: forces of the members it reaches, reactions it calls up. Order of members and columns. */
export interface UnitState {
  members: Map<number, { N: number; V: number; m0: number; m1: number }>;
  reactions: Map<number, number>;
}

/** True (not scaled) forces of a state of scaled quantities, for the members it reaches. */
export function unitState(eq: Equilibrium, scaled: ReadonlyMap<number, number>, factor: number): UnitState {
  const state: UnitState = { members: new Map(), reactions: new Map() };
  const reached = new Set<string>();
  for (const [q, v] of scaled) {
    const quantity = eq.quantities[q];
    if (!quantity) continue;
    if (quantity.kind === 'reaction') state.reactions.set(q, v * (eq.scale[q] as number) * factor);
    else reached.add(quantity.member);
  }
  eq.bars.forEach((bar, b) => {
    if (!reached.has(bar.member.id)) return;
    const e = endForces(eq, b, (q) => {
      const value = scaled.get(q);
      return value === undefined ? 0 : value * factor;
    });
    state.members.set(b, { N: e.N, V: (e.M1 - e.M0) / bar.axis.L, m0: e.M0, m1: e.M1 });
  });
  return state;
}

export interface Springs {
  column: number;
  joint: string;
  component: 'x' | 'y' | 'turn';
  stiffness: number;
}

export function springs(eq: Equilibrium): Springs[] {
  return eq.quantities.flatMap((q, column): Springs[] => {
    if (q.kind !== 'reaction') return [];
    const restraint = eq.analysis.joints.find((j) => j.id === q.joint)?.support?.[q.component] as Restraint;
    return typeof restraint === 'object'
      ? [{ column, joint: q.joint, component: q.component, stiffness: restraint.spring }]
      : [];
  });
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
    const { joint, component, stiffness } = s;
    rows.push({
      kind: 'spring',
      joint,
      component,
      unit,
      force,
      stiffness,
      value: (EI0 * unit * force) / stiffness,
    });
  }
  return rows;
}

/** The primary structure under one case, with its shapes. */
export interface LoadedPrimary {
  load: LoadState;
  scaled: (q: number) => number;
  parts: (MomentPart[] | undefined)[];
}

export function loadedParts(
  eq: Equilibrium,
  load: LoadState,
  scaled: (q: number) => number,
): (MomentPart[] | undefined)[] {
  return eq.bars.map((bar, b) =>
    bar.member.steps === undefined
      ? momentParts(bar, endForces(eq, b, scaled, load), load.local[b] as never)
      : undefined,
  );
}

/** Rows of EI0 δ_i0: shapes of the primary structure against unit state i, and every term beside bending. */
export function gapRows(
  eq: Equilibrium,
  i: UnitState,
  p: LoadedPrimary,
  held: readonly Springs[],
  EI0: number,
  movements: readonly { column: number; joint: string; component: 'x' | 'y' | 'turn'; value: number }[],
  released: number | undefined,
): WorkRow[] {
  const rows: WorkRow[] = [];
  for (const [b, unit] of i.members) {
    const bar = eq.bars[b];
    const local = p.load.local[b];
    if (!bar || !local) continue;
    const { L } = bar.axis;
    const member = bar.member.id;
    const forces = memberDiagram(eq, b, endForces(eq, b, p.scaled, p.load), p.load);
    const parts = p.parts[b];
    if (parts) rows.push(...partRows(bar, unit, parts, EI0));
    else rows.push(...steppedRows(eq, b, unit, forces.M, EI0));
    rows.push(...axialShearRows(bar, unit, forces, EI0));
    if (local.strain !== 0 && unit.N !== 0) {
      rows.push({
        kind: 'temperature',
        member,
        unit: unit.N,
        alpha: bar.member.alpha as number,
        rise: local.strain / (bar.member.alpha as number),
        length: L,
        value: EI0 * unit.N * local.strain * L,
      });
    }
    if (local.curvature !== 0) {
      const area = ((unit.m0 + unit.m1) * L) / 2;
      rows.push({
        kind: 'gradient',
        member,
        area,
        curvature: local.curvature,
        value: EI0 * area * local.curvature,
      });
    }
    if (local.misfit !== 0 && unit.N !== 0) {
      rows.push({
        kind: 'misfit',
        member,
        unit: unit.N,
        misfit: local.misfit,
        value: EI0 * unit.N * local.misfit,
      });
    }
  }
  for (const s of held) {
    const unit = i.reactions.get(s.column);
    const force = p.scaled(s.column) * (eq.scale[s.column] as number);
    if (unit === undefined || force === 0) continue;
    const { joint, component, stiffness } = s;
    rows.push({
      kind: 'spring',
      joint,
      component,
      unit,
      force,
      stiffness,
      value: (EI0 * unit * force) / stiffness,
    });
  }
  for (const m of movements) {
    const unit = i.reactions.get(m.column);
    if (unit === undefined || m.column === released) continue;
    rows.push({
      kind: 'settlement',
      joint: m.joint,
      component: m.component,
      unit,
      movement: m.value,
      value: -EI0 * unit * m.value,
    });
  }
  return rows;
}

/** On a stepped member each stretch of one stiffness is a row of its own: its exact area and the ordinate that gives it. */
function steppedRows(
  eq: Equilibrium,
  b: number,
  unit: { m0: number; m1: number },
  M: PiecewisePolynomial,
  EI0: number,
): WorkRow[] {
  const bar = eq.bars[b];
  if (!bar) return [];
  const { L } = bar.axis;
  const slope = (unit.m1 - unit.m0) / L;
  return stretches(bar.member, L).flatMap(({ from, to, EI }): WorkRow[] => {
    const window: PiecewisePolynomial = [{ from, to, c: [1] }];
    const cut = between(M, from, to);
    const area = integralOfProduct(cut, window);
    if (area === 0 && integralOfProduct(cut, [{ from, to, c: [0, 1] }]) === 0) return [];
    const first = integralOfProduct(cut, [{ from, to, c: [0, 1] }]);
    const centroid = from + first / area;
    const ordinate = unit.m0 + slope * centroid;
    const k = EI / EI0;
    const work = (unit.m0 + slope * from) * area + slope * first;
    return [
      {
        kind: 'bending',
        member: bar.member.id,
        from,
        to,
        shape: 'cubic',
        height: valueAt(M, to, 'left'),
        area,
        centroid,
        ordinate,
        k,
        value: work / k,
      },
    ];
  });
}
