import type { Analysis } from '@/lib/model/analysis';
import { valueAt } from '../diagrams/piecewise';
import type { PiecewisePolynomial } from '../diagrams/piecewise-polynomial';
import type { Solution } from '../solution';
import { dimensionOf } from './dimensions';

/** Decimals by kind of number, the same through one sheet; a line that needs more figures takes them for itself. */
export interface FigurePlan {
  length: number;
  force: number;
  moment: number;
  /** Redundants, one more than what they produce. */
  redundantForce: number;
  redundantMoment: number;
  /** k = EI/EI0 */
  ratio: number;
  /** Unit reactions and other pure numbers of unit states. */
  unitForce: number;
  /** Moments of unit states. */
  unitMoment: number;
  /** Areas of moment diagrams. */
  area: number;
  /** EI0 δ and EI0 f. */
  gap: number;
  /** Right sides of the elimination once they are reduced. */
  rightSide: number;
  flexibility: number;
  /** Deflections in inches or millimetres. */
  deflection: number;
  /** Values of loads, as they were given. */
  load: number;
}

/** Decimals that give the greatest of some values so many significant figures, within limits. */
export function decimalsFor(values: Iterable<number>, figures: number, least = 0, most = 6): number {
  let greatest = 0;
  for (const v of values) greatest = Math.max(greatest, Math.abs(v));
  if (greatest === 0) return Math.max(least, Math.min(most, 2));
  return Math.min(most, Math.max(least, figures - 1 - Math.floor(Math.log10(greatest) + 1e-9)));
}

/** The fewest decimals that print every value as it is, to one part in 10⁹. */
export function exactDecimals(values: Iterable<number>, least: number, most: number): number {
  const all = [...values];
  for (let d = least; d < most; d++) {
    if (all.every((v) => Math.abs(v - Number(v.toFixed(d))) <= 1e-9 * Math.max(1, Math.abs(v)))) return d;
  }
  return most;
}

/** The plan of one sheet, from the sizes of what it prints. */
export function planFigures(solution: Solution): FigurePlan {
  const { analysis } = solution;
  const cases = Object.values(solution.cases);
  const ends = (pick: 'N' | 'V' | 'M') =>
    cases.flatMap((c) => Object.values(c.members).flatMap((m) => endsOf(m[pick])));
  const forces = [...ends('N'), ...ends('V')];
  const force = decimalsFor(forces, 5, 0, 3);
  const moment = decimalsFor(ends('M'), 5, 0, 2);
  const unit = solution.primary.units.flatMap((u) => Object.values(u.members).flatMap((m) => endsOf(m.M)));
  const unitForces = solution.primary.units.flatMap((u) => [
    ...u.reactions.map((r) => r.value),
    ...Object.values(u.members).flatMap((m) => [...endsOf(m.N), ...endsOf(m.V)]),
  ]);
  const gaps = solution.work.gaps.map((g) => g.total);
  const gap = noMoreThan(gaps, decimalsFor(gaps, 7, 0, 4));
  const flexibilities = solution.work.flexibility.map((f) => f.total);
  const parts = Object.values(solution.work.parts).flat();
  return {
    length: exactDecimals(lengthsOf(analysis), 2, 4),
    force,
    moment,
    redundantForce: force + 1,
    redundantMoment: moment + 1,
    ratio: exactDecimals(ratiosOf(analysis), 2, 4),
    unitForce: exactDecimals(unitForces, 4, supporting(solution, force)),
    unitMoment: exactDecimals(unit, 2, Math.max(4, supporting(solution, moment))),
    area: decimalsFor(
      parts.map((p) => p.area),
      6,
      0,
      3,
    ),
    gap,
    rightSide: gap,
    flexibility: noMoreThan(
      flexibilities,
      decimalsFor(flexibilities, supportingFigures(solution, force, moment), 0, 9),
    ),
    deflection: analysis.units === 'US' ? 3 : 2,
    load: 2,
  };
}

/** Fewer decimals where fewer print every value as it is. */
const noMoreThan = (values: readonly number[], most: number): number =>
  exactDecimals(values, Math.min(2, most), most);

/** Significant figures of the coefficients: two more than the longest redundant is printed with. */
function supportingFigures(solution: Solution, force: number, moment: number): number {
  const lengths = Object.values(solution.X).flatMap((X) =>
    X.map((x, i) => {
      const q = solution.redundants[i];
      const decimals = q && dimensionOf(q).length === 1 ? moment + 1 : force + 1;
      return Math.log10(Math.max(1, Math.abs(x) * 10 ** decimals));
    }),
  );
  return Math.max(7, Math.ceil(Math.max(0, ...lengths)) + 2);
}

/** Decimals of a factor of the redundants, so that Σ X times it keeps its place: what it may miss is X times its rounding. */
function supporting(solution: Solution, decimals: number): number {
  const sums = Object.values(solution.X).map((X) => X.reduce((t, x) => t + Math.abs(x), 0));
  const largest = Math.max(1, ...sums);
  return Math.min(9, Math.max(4, Math.ceil(decimals + Math.log10(largest / 0.4))));
}

const endsOf = (f: PiecewisePolynomial): number[] => {
  const last = f.at(-1);
  return last ? [valueAt(f, f[0]?.from ?? 0), valueAt(f, last.to, 'left')] : [];
};

function lengthsOf({ joints, cases }: Analysis): number[] {
  const places = joints.flatMap((j) => [j.x, j.y]);
  const loads = cases.flatMap((c) =>
    c.loads.flatMap((load) => {
      if (load.kind === 'point' || load.kind === 'couple') return [load.at];
      return load.kind === 'distributed' ? [load.from ?? 0, load.to ?? 0] : [];
    }),
  );
  return [...places, ...loads];
}

function ratiosOf(analysis: Analysis): number[] {
  return analysis.basis.kind === 'relative' ? analysis.members.map((m) => m.EI) : [];
}
