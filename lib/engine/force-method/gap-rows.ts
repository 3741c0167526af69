import type { Equilibrium } from '../statics/equilibrium';
import type { LoadState } from '../statics/load-state';
import { endForces, memberDiagram } from './member-state';
import { momentParts } from './moment-parts';
import { type Movement, type Springs, settlementRow, springRow } from './support-rows';
import type { UnitState } from './unit-state';
import type { MomentPart, WorkRow } from './work';
import { axialShearRows, partRows, strainRows } from './work-row';

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
