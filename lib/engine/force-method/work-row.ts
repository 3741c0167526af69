import type { LocalLoads } from '../diagrams/local-loads';
import type { PiecewisePolynomial } from '../diagrams/piecewise-polynomial';
import type { Bar } from '../statics/equilibrium';
import type { MomentPart, WorkRow } from './work';

/** A straight unit moment diagram of one member by its end values. */
export interface UnitMoments {
  m0: number;
  m1: number;
}

const at = (u: UnitMoments, s: number, L: number) => u.m0 + ((u.m1 - u.m0) * s) / L;

/** A straight stretch from a to b as named shapes: a rectangle, a triangle, or two triangles on the diagonal. */
export function straightParts(
  from: number,
  to: number,
  a: number,
  b: number,
): { shape: 'rectangle' | 'triangle'; height: number; area: number; centroid: number }[] {
  const l = to - from;
  const size = Math.max(Math.abs(a), Math.abs(b));
  if (size === 0) return [];
  if (Math.abs(a - b) <= 1e-12 * size)
    return [{ shape: 'rectangle', height: a, area: a * l, centroid: from + l / 2 }];
  const triangle = (height: number, centroid: number) => ({
    shape: 'triangle' as const,
    height,
    area: (height * l) / 2,
    centroid,
  });
  const parts = [];
  if (Math.abs(a) > 1e-12 * size) parts.push(triangle(a, from + l / 3));
  if (Math.abs(b) > 1e-12 * size) parts.push(triangle(b, from + (2 * l) / 3));
  return parts;
}

/** ∫ m̄_i m̄_j / k over one member, as areas of m̄_j times ordinates of m̄_i. */
export function bendingRows(bar: Bar, i: UnitMoments, j: UnitMoments, EI0: number): WorkRow[] {
  const { L } = bar.axis;
  return bar.stretches.flatMap(({ from, to, EI }) =>
    straightParts(from, to, at(j, from, L), at(j, to, L)).map((part): WorkRow => {
      const k = EI / EI0;
      const ordinate = at(i, part.centroid, L);
      return {
        kind: 'bending',
        member: bar.member.id,
        from,
        to,
        ...part,
        ordinate,
        k,
        value: (part.area * ordinate) / k,
      };
    }),
  );
}

/** ∫ m̄_i M_0 / k: the area of each part times the ordinate of m̄_i at its centroid; a part lies within one stiffness. */
export function partRows(bar: Bar, i: UnitMoments, parts: readonly MomentPart[], EI0: number): WorkRow[] {
  const own = bar.stretches;
  return parts.map((part): WorkRow => {
    const ordinate = at(i, part.centroid, bar.axis.L);
    const { from, to, shape, height, area, centroid, due } = part;
    const stretch = own.findLast((s) => s.from <= from) ?? own[0];
    const k = (stretch?.EI ?? bar.member.EI) / EI0;
    return {
      kind: 'bending',
      member: bar.member.id,
      from,
      to,
      shape,
      height,
      area,
      centroid,
      ordinate,
      k,
      value: (area * ordinate) / k,
      due,
    };
  });
}

/** What warmth and lack of fit add: EI0 N̄ α T L, EI0 N̄ d and EI0 (area of m̄) κ. */
export function strainRows(
  bar: Bar,
  unit: { N: number; m0: number; m1: number },
  local: Pick<LocalLoads, 'strain' | 'curvature' | 'misfit'>,
  EI0: number,
): WorkRow[] {
  const { L } = bar.axis;
  const { id: member, alpha } = bar.member;
  const { strain, curvature, misfit } = local;
  const rows: WorkRow[] = [];
  if (strain !== 0 && unit.N !== 0 && alpha !== undefined) {
    const value = EI0 * unit.N * strain * L;
    rows.push({ kind: 'temperature', member, unit: unit.N, alpha, rise: strain / alpha, length: L, value });
  }
  if (misfit !== 0 && unit.N !== 0)
    rows.push({ kind: 'misfit', member, unit: unit.N, misfit, value: EI0 * unit.N * misfit });
  const area = ((unit.m0 + unit.m1) * L) / 2;
  if (curvature !== 0 && area !== 0)
    rows.push({ kind: 'gradient', member, area, curvature, value: EI0 * area * curvature });
  return rows;
}

/** EI0 Σ N̄ N L/EA and EI0 Σ V̄ V L/GAs of a member whose unit state has constant N̄ and V̄. */
export function axialShearRows(
  bar: Bar,
  unit: { N: number; V: number },
  force: { N: PiecewisePolynomial; V: PiecewisePolynomial },
  EI0: number,
): WorkRow[] {
  const mean = (f: PiecewisePolynomial, from: number, to: number) => meanValue(f, from, to);
  return bar.stretches.flatMap(({ from, to, EA, GAs }): WorkRow[] => {
    const length = to - from;
    const rows: WorkRow[] = [];
    if (EA !== undefined && unit.N !== 0) {
      const N = mean(force.N, from, to);
      rows.push({
        kind: 'axial',
        member: bar.member.id,
        unit: unit.N,
        force: N,
        length,
        EA,
        value: (EI0 * unit.N * N * length) / EA,
      });
    }
    if (GAs !== undefined && unit.V !== 0) {
      const V = mean(force.V, from, to);
      rows.push({
        kind: 'shear',
        member: bar.member.id,
        unit: unit.V,
        force: V,
        length,
        GAs,
        value: (EI0 * unit.V * V * length) / GAs,
      });
    }
    return rows;
  });
}

/** Mean of f between two places: with a constant unit force, the mean is all that the work needs. */
function meanValue(f: PiecewisePolynomial, from: number, to: number): number {
  let total = 0;
  for (const p of f) {
    const a = Math.max(p.from, from) - p.from;
    const b = Math.min(p.to, to) - p.from;
    if (b <= a) continue;
    total += p.c.reduce((sum, c, k) => sum + (c * (b ** (k + 1) - a ** (k + 1))) / (k + 1), 0);
  }
  return total / (to - from);
}
