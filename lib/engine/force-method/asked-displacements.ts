import type { DisplacementAsk } from '@/lib/model/analysis';
import type { Load } from '@/lib/model/load';
import type { Quantity } from '@/lib/model/quantity';
import { stateOf } from '../primary-structure';
import type { DisplacementResult } from '../solution';
import type { Equilibrium } from '../statics/equilibrium';
import { type LoadState, loadState } from '../statics/load-state';
import { planStatics } from '../statics/plan-statics';
import { writeStatics } from '../statics/write-statics';
import { displacementRows } from './displacement-rows';
import { endForces, memberDiagram } from './member-state';
import type { Reference } from './reference';
import { type PrimaryBasis, primaryForces, writtenRedundants } from './self-stress';
import type { SolvedCase, SolvedForces } from './solve-redundants';
import { settlementRow, springRow } from './support-rows';
import type { WorkRow } from './work';

/**
 * Each displacement asked for, by a unit load on the primary structure: its work with the deformations of the structure
 * itself (reduction theorem).
 */
export function askedDisplacements(
  eq: Equilibrium,
  basis: PrimaryBasis,
  solved: SolvedForces,
  reference: Reference,
): DisplacementResult[] {
  const { displacements } = eq.analysis;
  const names = basis.redundants.map((q) => eq.quantities[q] as Quantity);
  const written = displacements.length > 0 && names.length <= writtenRedundants;
  const plan = written ? planStatics(eq, names) : undefined;
  return displacements.map((ask, index): DisplacementResult => {
    const loads = [unitLoad(ask)];
    const load = loadState(eq, loads);
    const unit = primaryForces(eq, basis, load.rows);
    const state = stateOf(eq, (q) => unit[q] as number, load);
    const lines = plan ? writeStatics(plan, { kind: 'loads', loads }) : [];
    const cases: DisplacementResult['cases'] = {};
    for (const [id, c] of solved.cases) {
      const rows = workRows(eq, { unit, load }, c, solved.held, reference.EI0);
      const total = rows.reduce((t, r) => t + r.value, 0);
      cases[id] = { rows, total, value: reference.value === undefined ? undefined : total / reference.value };
    }
    return { ask: index, unit: { ...state, lines }, cases, combinations: combined(eq, ask, cases) };
  });
}

function unitLoad(ask: DisplacementAsk): Load {
  if (ask.direction === 'rotation') return { kind: 'couple', member: ask.member, at: ask.at, value: 1 };
  return { kind: 'point', member: ask.member, at: ask.at, direction: ask.direction, value: 1 };
}

function workRows(
  eq: Equilibrium,
  one: { unit: Float64Array; load: LoadState },
  c: SolvedCase,
  held: SolvedForces['held'],
  EI0: number,
): WorkRow[] {
  const diagram = (forces: Float64Array, load: LoadState, b: number) =>
    memberDiagram(
      eq,
      b,
      endForces(eq, b, (q) => forces[q] as number, load),
      load,
    );
  const rows = eq.bars.flatMap((bar, b) => {
    const local = c.load.local[b];
    if (!local) throw new Error(`no loads of ${bar.member.id}`);
    return displacementRows(bar, diagram(one.unit, one.load, b), diagram(c.final, c.load, b), local, EI0);
  });
  const pressed = (forces: Float64Array, q: number) => (forces[q] as number) * (eq.scale[q] as number);
  for (const s of held) {
    const R = pressed(one.unit, s.column);
    if (R !== 0) rows.push(springRow(s, R, pressed(c.final, s.column), EI0));
  }
  for (const m of c.movements) {
    const R = pressed(one.unit, m.column);
    if (R !== 0) rows.push(settlementRow(m, R, EI0));
  }
  return rows;
}

function combined(
  eq: Equilibrium,
  ask: DisplacementAsk,
  cases: DisplacementResult['cases'],
): DisplacementResult['combinations'] {
  return eq.analysis.combinations.map(({ id, factors }) => {
    let value: number | undefined = 0;
    for (const [name, factor] of Object.entries(factors)) {
      const one: number | undefined = cases[name]?.value;
      value = value === undefined || one === undefined ? undefined : value + factor * one;
    }
    const ratio = value !== undefined && ask.limit ? Math.abs(value) / ask.limit.value : undefined;
    return { id, value, ratio };
  });
}
