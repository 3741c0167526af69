import type { Analysis } from '@/lib/model/analysis';
import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { Equilibrium } from '../statics/equilibrium';
import { factorColumns, type SparseLu, solveBasis } from '../statics/sparse-lu';
import { tolerance } from '../tolerance';

/** A primary structure: the quantities kept, the redundants, and every unit state Xi = 1 in scaled quantities. */
export interface PrimaryBasis {
  lu: SparseLu;
  redundants: number[];
  /** units[i][q]: scaled quantity q under Xi = 1 (scaled); sparse. */
  units: Map<number, number>[];
}

/** Factors the matrix keeping columns in the order given; what is left over are the redundants. */
export function primaryBasis(eq: Equilibrium, order: readonly number[]): PrimaryBasis {
  const lu = factorColumns(eq.columns, order, eq.rowCount, tolerance.pivot);
  const units = lu.aside.map((k) => {
    const right = new Float64Array(eq.rowCount);
    const column = eq.columns[k];
    column?.rows.forEach((r, i) => {
      right[r] = -(column.values[i] as number);
    });
    const { z } = solveBasis(lu, right);
    const largest = z.reduce((m, v) => Math.max(m, Math.abs(v)), 1);
    const state = new Map([[k, 1]]);
    lu.basis.forEach((q, i) => {
      const value = z[i] as number;
      if (Math.abs(value) > tolerance.fixed * 1e-3 * largest) state.set(q, value);
    });
    return state;
  });
  return { lu, redundants: lu.aside, units };
}

/** Column numbers of quantities that no redundant changes. */
export function fixedQuantities(eq: Equilibrium, basis: PrimaryBasis): number[] {
  const largest = new Map<number, number>();
  for (const unit of basis.units) {
    const top = Math.max(...[...unit.values()].map(Math.abs));
    for (const [q, v] of unit) largest.set(q, Math.max(largest.get(q) ?? 0, Math.abs(v) / top));
  }
  return eq.quantities.map((_, q) => q).filter((q) => (largest.get(q) ?? 0) <= tolerance.fixed);
}

/**
 * The order in which quantities are kept when the engine proposes the redundants: axial forces and reaction forces
 * first, then end moments that nobody would release (free ends), then moments from the ends of the structure inward;
 * so that what is left over are, as far as possible, hinges over inner supports and at corners.
 */
export function proposalOrder(eq: Equilibrium): number[] {
  const rank = (q: Quantity): number => {
    switch (q.kind) {
      case 'axial':
        return 0;
      case 'reaction':
        return q.component === 'turn' ? 5 : 1;
      case 'moment':
        return meetsSupport(eq.analysis, q) ? 4 : 2;
    }
  };
  return eq.quantities
    .map((q, i) => ({ i, rank: rank(q) }))
    .sort((a, b) => a.rank - b.rank || a.i - b.i)
    .map((e) => e.i);
}

function meetsSupport(analysis: Analysis, q: Extract<Quantity, { kind: 'moment' }>): boolean {
  const member = analysis.members.find((m) => m.id === q.member);
  const joint = analysis.joints.find((j) => j.id === (q.end === 'start' ? member?.start : member?.end));
  return joint?.support !== undefined;
}

export function columnsOf(eq: Equilibrium, quantities: readonly Quantity[]): (number | undefined)[] {
  return quantities.map((q) => eq.indexOf.get(quantityKey(q)));
}
