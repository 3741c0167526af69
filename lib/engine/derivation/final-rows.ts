import type { MemberDiagrams } from '../diagrams/member-diagrams';
import { between, breaks, integralOfProduct, valueAt } from '../diagrams/piecewise';
import type { WorkRow } from '../force-method/work';

/** The final moments as shapes on the stretches where the unit moments are straight: triangles from both ends, and what the load adds. */
export function finalRows(
  member: string,
  unit: MemberDiagrams['M'],
  final: MemberDiagrams['M'],
  k: number,
): WorkRow[] {
  const places = [...new Set([...breaks(unit), ...breaks(final)])].sort((a, b) => a - b);
  const size = Math.max(
    ...final.flatMap((p) => [Math.abs(valueAt([p], p.from)), Math.abs(valueAt([p], p.to, 'left'))]),
  );
  return places.slice(1).flatMap((to, i): WorkRow[] => {
    const from = places[i] ?? 0;
    const [piece] = between(final, from, to);
    const [straight] = between(unit, from, to);
    if (!piece || !straight || integralOfProduct([straight], [straight]) === 0) return [];
    const l = to - from;
    const at = (s: number) => valueAt([straight], s, s === to ? 'left' : 'right');
    const row = (
      shape: 'triangle' | 'parabola' | 'cubic',
      height: number,
      factor: number,
      x: number,
    ): WorkRow[] => {
      if (Math.abs(height) <= 1e-11 * size) return [];
      const area = factor * l * height;
      const ordinate = at(from + x * l);
      return [
        {
          kind: 'bending',
          member,
          from,
          to,
          shape,
          height,
          area,
          centroid: from + x * l,
          ordinate,
          k,
          value: (area * ordinate) / k,
        },
      ];
    };
    const [, , c2 = 0, c3 = 0] = piece.c;
    // c2 x² + c3 x³ less its own chord: −c2 l² of a parabola, −c3 l³ of a cubic whose load grows from the start.
    return [
      ...row('triangle', valueAt([piece], from), 1 / 2, 1 / 3),
      ...row('triangle', valueAt([piece], to, 'left'), 1 / 2, 2 / 3),
      ...row('parabola', (-c2 * l * l) / 4, 2 / 3, 1 / 2),
      ...row('cubic', -c3 * l ** 3, 1 / 4, 8 / 15),
    ];
  });
}
