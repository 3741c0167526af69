import type { LocalLoads } from '../diagrams/local-loads';
import { between, integralOfProduct, valueAt } from '../diagrams/piecewise';
import type { Piece } from '../diagrams/piecewise-polynomial';
import type { Stretch } from '../diagrams/stretches';
import type { Bar } from '../statics/equilibrium';
import type { memberDiagram } from './member-state';
import { shapesBetween } from './moment-parts';
import type { WorkRow } from './work';

type Diagrams = ReturnType<typeof memberDiagram>;

/**
 * Work of a unit load's forces on one member with the deformations of the final ones. The final moments are cut at
 * stiffness steps and at corners of the unit diagram; each shape's area meets the unit ordinate at its centroid.
 */
export function displacementRows(
  bar: Bar,
  unit: Diagrams,
  final: Diagrams,
  local: LocalLoads,
  EI0: number,
): WorkRow[] {
  const rows = bar.stretches.flatMap((own) => [
    ...between(unit.M, own.from, own.to).flatMap((piece) =>
      bendingWork(bar, piece, final, local, own.EI / EI0),
    ),
    ...axialWork(bar, own, unit, final, EI0),
    ...shearWork(bar, own, unit, final, EI0),
  ]);
  return [...rows, ...strainWork(bar, unit, local, EI0)];
}

function bendingWork(bar: Bar, piece: Piece, final: Diagrams, local: LocalLoads, k: number): WorkRow[] {
  const { from, to } = piece;
  if (piece.c.every((c) => c === 0)) return [];
  return shapesBetween(final.M, local, from, to).flatMap(({ shape: s, due }): WorkRow[] => {
    if (s.height === 0) return [];
    const ordinate = valueAt([piece], s.centroid);
    const { shape, height, area, centroid } = s;
    const value = (area * ordinate) / k;
    const place = { member: bar.member.id, from: s.from, to: s.to };
    return [{ kind: 'bending', ...place, shape, height, area, centroid, ordinate, k, value, due }];
  });
}

/** Rows where the unit axial force is constant; the mean of the final one is all that the work needs. */
function axialWork(
  bar: Bar,
  { from, to, EA }: Stretch,
  unit: Diagrams,
  final: Diagrams,
  EI0: number,
): WorkRow[] {
  if (EA === undefined) return [];
  return between(unit.N, from, to).flatMap((piece): WorkRow[] => {
    const [N, force, length] = [valueAt([piece], piece.from), mean(final.N, piece), piece.to - piece.from];
    if (N === 0) return [];
    return [
      {
        kind: 'axial',
        member: bar.member.id,
        unit: N,
        force,
        length,
        EA,
        value: (EI0 * N * force * length) / EA,
      },
    ];
  });
}

function shearWork(
  bar: Bar,
  { from, to, GAs }: Stretch,
  unit: Diagrams,
  final: Diagrams,
  EI0: number,
): WorkRow[] {
  if (GAs === undefined) return [];
  return between(unit.V, from, to).flatMap((piece): WorkRow[] => {
    const [V, force, length] = [valueAt([piece], piece.from), mean(final.V, piece), piece.to - piece.from];
    if (V === 0) return [];
    return [
      {
        kind: 'shear',
        member: bar.member.id,
        unit: V,
        force,
        length,
        GAs,
        value: (EI0 * V * force * length) / GAs,
      },
    ];
  });
}

function mean(f: Diagrams['N'], { from, to }: Piece): number {
  return integralOfProduct(between(f, from, to), [{ from, to, c: [1] }]) / (to - from);
}

/** Warmth, gradient and lack of fit: the mean unit axial force and the area of the unit moments. */
function strainWork(bar: Bar, unit: Diagrams, local: LocalLoads, EI0: number): WorkRow[] {
  const { L } = bar.axis;
  const { id: member, alpha } = bar.member;
  const { strain, curvature, misfit } = local;
  const rows: WorkRow[] = [];
  const N = mean(unit.N, { from: 0, to: L, c: [] });
  if (strain !== 0 && N !== 0 && alpha !== undefined) {
    const value = EI0 * N * strain * L;
    rows.push({ kind: 'temperature', member, unit: N, alpha, rise: strain / alpha, length: L, value });
  }
  if (misfit !== 0 && N !== 0)
    rows.push({ kind: 'misfit', member, unit: N, misfit, value: EI0 * N * misfit });
  const area = integralOfProduct(unit.M, [{ from: 0, to: L, c: [1] }]);
  if (curvature !== 0 && area !== 0)
    rows.push({ kind: 'gradient', member, area, curvature, value: EI0 * area * curvature });
  return rows;
}
