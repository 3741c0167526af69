import { between, integralOfProduct } from '../diagrams/piecewise';
import type { PiecewisePolynomial } from '../diagrams/piecewise-polynomial';
import type { Equilibrium } from '../statics/equilibrium';
import { solveBasisTransposed } from '../statics/solve-lu';
import type { memberDiagram } from './member-state';
import type { PrimaryBasis } from './self-stress';
import type { SolvedCase } from './solve-redundants';
import type { Springs } from './support-rows';

/**
 * Displacements of all joints from the deformations that the final forces cause: for every kept quantity its column of
 * the equilibrium matrix, turned into an equation, says how far its two sides move apart (principle of virtual forces,
 * all joints at once). Three numbers a joint, in the order of the rows; times EI0 when stiffness is in multiples.
 */
export function jointDisplacements(
  eq: Equilibrium,
  basis: PrimaryBasis,
  solved: SolvedCase,
  diagrams: readonly ReturnType<typeof memberDiagram>[],
  held: readonly Springs[],
): Float64Array {
  const right = basis.lu.basis.map((column) => {
    const q = eq.quantities[column];
    if (!q) throw new Error('no such quantity');
    const scale = eq.scale[column] as number;
    if (q.kind === 'reaction') {
      const spring = held.find((s) => s.column === column);
      if (spring) return -((solved.final[column] as number) * scale * scale) / spring.stiffness;
      const moves = solved.movements.filter((m) => m.column === column);
      return scale * moves.reduce((t, m) => t + m.value, 0);
    }
    const b = eq.barOf[column] as number;
    const bar = eq.bars[b];
    const d = diagrams[b];
    const local = solved.load.local[b];
    if (!bar || !d || !local) throw new Error(`no member ${q.member}`);
    const { L } = bar.axis;
    const own = bar.stretches;
    if (q.kind === 'axial') {
      const elongation = own.reduce(
        (t, s) => t + (s.EA === undefined ? 0 : within(d.N, s.from, s.to, [1]) / s.EA),
        0,
      );
      return -(elongation + local.strain * L + local.misfit);
    }
    const ordinate: [number, number] = q.end === 'start' ? [1, -1 / L] : [0, 1 / L];
    const bent = own.reduce((t, s) => t + within(d.M, s.from, s.to, ordinate) / s.EI, 0);
    const sheared = own.reduce(
      (t, s) => (s.GAs === undefined ? t : t + (ordinate[1] * within(d.V, s.from, s.to, [1])) / s.GAs),
      0,
    );
    return -(bent + sheared + (local.curvature * L) / 2) * scale;
  });
  const y = solveBasisTransposed(basis.lu, right);
  for (let r = 2; r < 3 * eq.analysis.joints.length; r += 3) y[r] = (y[r] as number) / eq.length;
  return y;
}

/** ∫ f · (a + b s) over a stretch of the member. */
function within(f: PiecewisePolynomial, from: number, to: number, [a, b = 0]: readonly number[]): number {
  return integralOfProduct(between(f, from, to), [{ from, to, c: [(a as number) + b * from, b] }]);
}
