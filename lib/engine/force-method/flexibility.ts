import type { PiecewisePolynomial } from '../diagrams/piecewise-polynomial';
import type { Equilibrium } from '../statics/equilibrium';
import { type Springs, springRow } from './support-rows';
import type { UnitState } from './unit-state';
import type { WorkRow } from './work';
import { axialShearRows, bendingRows } from './work-row';

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
