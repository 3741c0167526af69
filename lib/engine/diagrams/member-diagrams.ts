import type { PiecewisePolynomial } from './piecewise-polynomial';

/** N, V, M and displacements of one member as exact functions of s. Signs: see Solution. */
export interface MemberDiagrams {
  N: PiecewisePolynomial;
  V: PiecewisePolynomial;
  M: PiecewisePolynomial;
  /** Rotation of the section, counter-clockwise. */
  rotation: PiecewisePolynomial;
  /** Displacement across the member, to the left of the walk. */
  across: PiecewisePolynomial;
  /** Displacement along the member, from start to end. */
  along: PiecewisePolynomial;
}
