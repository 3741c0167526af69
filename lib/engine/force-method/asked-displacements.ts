import type { DisplacementAsk } from '@/lib/model/analysis';
import type { Load } from '@/lib/model/load';
import type { Quantity } from '@/lib/model/quantity';
import { between, integralOfProduct, valueAt } from '../diagrams/piecewise';
import { stretches } from '../diagrams/stretches';
import { stateOf } from '../primary-structure';
import type { DisplacementResult } from '../solution';
import { type Equilibrium, loadState } from '../statics/equilibrium';
import { planStatics } from '../statics/plan-statics';
import { writeStatics } from '../statics/write-statics';
import { endForces, memberDiagram } from './member-state';
import type { Reference } from './reference';
import { type PrimaryBasis, primaryForces, writtenRedundants } from './self-stress';
import type { SolvedForces } from './solve-redundants';
import type { WorkRow } from './work';
import { straightParts } from './work-row';

/**
 * Each displacement asked for by a unit load on the primary structure (reduction theorem): the work of its diagram with
 * the final one. Rows are areas of the unit diagram on the stretches where it is straight, times nothing that is not
 * exact: the ordinate is the weighted one of the final diagram, area × ordinate being the integral itself.
 */
export function askedDisplacements(
  eq: Equilibrium,
  basis: PrimaryBasis,
  solved: SolvedForces,
  reference: Reference,
): DisplacementResult[] {
  const names = basis.redundants.map((q) => eq.quantities[q] as Quantity);
  const written = eq.analysis.displacements.length > 0 && names.length <= writtenRedundants;
  const plan = written ? planStatics(eq, names) : undefined;
  return eq.analysis.displacements.map((ask, index): DisplacementResult => {
    const loads = [unitLoad(ask)];
    const load = loadState(eq, loads);
    const scaled = primaryForces(eq, basis, load.rows);
    const value = (q: number) => scaled[q] as number;
    const unit = {
      ...stateOf(eq, value, load),
      lines: plan ? writeStatics(plan, { kind: 'loads', loads }) : [],
    };
    const cases = Object.fromEntries(
      [...solved.cases].map(([id, c]) => {
        const rows = eq.bars.flatMap((bar, b) => {
          const final = memberDiagram(
            eq,
            b,
            endForces(eq, b, (q) => c.final[q] as number, c.load),
            c.load,
          );
          const mine = memberDiagram(eq, b, endForces(eq, b, value, load), load);
          const local = c.load.local[b];
          return local
            ? workRows(
                bar.member.id,
                stretches(bar.member, bar.axis.L),
                mine,
                final,
                local,
                reference.EI0,
                bar.axis.L,
              )
            : [];
        });
        for (const s of solved.held) {
          const [R, F] = [
            value(s.column) * (eq.scale[s.column] as number),
            (c.final[s.column] as number) * (eq.scale[s.column] as number),
          ];
          if (R !== 0)
            rows.push({
              kind: 'spring',
              joint: s.joint,
              component: s.component,
              unit: R,
              force: F,
              stiffness: s.stiffness,
              value: (reference.EI0 * R * F) / s.stiffness,
            });
        }
        for (const m of c.movements) {
          const R = value(m.column) * (eq.scale[m.column] as number);
          if (R !== 0)
            rows.push({
              kind: 'settlement',
              joint: m.joint,
              component: m.component,
              unit: R,
              movement: m.value,
              value: -reference.EI0 * R * m.value,
            });
        }
        const total = rows.reduce((t, r) => t + r.value, 0);
        return [
          id,
          { rows, total, value: reference.value === undefined ? undefined : total / reference.value },
        ];
      }),
    );
    const combinations = eq.analysis.combinations.map((combination) => {
      const parts = Object.entries(combination.factors).map(([id, f]) => ({ f, v: cases[id]?.value }));
      const known = parts.every((p) => p.v !== undefined);
      const total = known ? parts.reduce((t, p) => t + p.f * (p.v as number), 0) : undefined;
      return {
        id: combination.id,
        value: total,
        ratio: total !== undefined && ask.limit ? Math.abs(total) / ask.limit.value : undefined,
      };
    });
    return { ask: index, unit, cases, combinations };
  });
}

function unitLoad(ask: DisplacementAsk): Load {
  if (ask.direction === 'rotation') return { kind: 'couple', member: ask.member, at: ask.at, value: 1 };
  return { kind: 'point', member: ask.member, at: ask.at, direction: ask.direction, value: 1 };
}

type Diagrams = ReturnType<typeof memberDiagram>;

function workRows(
  member: string,
  own: ReturnType<typeof stretches>,
  unit: Diagrams,
  final: Diagrams,
  local: { strain: number; curvature: number; misfit: number },
  EI0: number,
  L: number,
): WorkRow[] {
  const rows: WorkRow[] = [];
  for (const s of own) {
    for (const piece of between(unit.M, s.from, s.to)) {
      const { from, to } = piece;
      const window = between(final.M, from, to);
      for (const part of straightParts(from, to, valueAt([piece], from), valueAt([piece], to, 'left'))) {
        const shape =
          part.shape === 'rectangle'
            ? [{ from, to, c: [part.height] }]
            : [
                {
                  from,
                  to,
                  c:
                    part.centroid < (from + to) / 2
                      ? [part.height, -part.height / (to - from)]
                      : [0, part.height / (to - from)],
                },
              ];
        const work = integralOfProduct(shape, window);
        const k = s.EI / EI0;
        rows.push({
          kind: 'bending',
          member,
          from,
          to,
          shape: part.shape,
          height: part.height,
          area: part.area,
          centroid: part.centroid,
          ordinate: work / part.area,
          k,
          value: work / k,
        });
      }
    }
    const constant = (f: Diagrams['N']) =>
      integralOfProduct(between(f, s.from, s.to), [{ from: s.from, to: s.to, c: [1] }]) / (s.to - s.from);
    if (s.EA !== undefined && constant(unit.N) !== 0) {
      const work = integralOfProduct(between(unit.N, s.from, s.to), between(final.N, s.from, s.to));
      rows.push({
        kind: 'axial',
        member,
        unit: constant(unit.N),
        force: work / ((s.to - s.from) * constant(unit.N)),
        length: s.to - s.from,
        EA: s.EA,
        value: (EI0 * work) / s.EA,
      });
    }
    if (s.GAs !== undefined) {
      for (const piece of between(unit.V, s.from, s.to)) {
        const V = valueAt([piece], piece.from);
        const length = piece.to - piece.from;
        const force =
          integralOfProduct(between(final.V, piece.from, piece.to), [
            { from: piece.from, to: piece.to, c: [1] },
          ]) / length;
        if (V !== 0)
          rows.push({
            kind: 'shear',
            member,
            unit: V,
            force,
            length,
            GAs: s.GAs,
            value: (EI0 * V * force * length) / s.GAs,
          });
      }
    }
  }
  const one: Diagrams['N'] = [{ from: 0, to: L, c: [1] }];
  const N = integralOfProduct(unit.N, one) / L;
  if (local.strain !== 0 && N !== 0)
    rows.push({
      kind: 'temperature',
      member,
      unit: N,
      alpha: 1,
      rise: local.strain,
      length: L,
      value: EI0 * N * local.strain * L,
    });
  if (local.misfit !== 0 && N !== 0)
    rows.push({ kind: 'misfit', member, unit: N, misfit: local.misfit, value: EI0 * N * local.misfit });
  if (local.curvature !== 0) {
    const area = integralOfProduct(unit.M, one);
    if (area !== 0)
      rows.push({
        kind: 'gradient',
        member,
        area,
        curvature: local.curvature,
        value: EI0 * area * local.curvature,
      });
  }
  return rows;
}
