/** One piece of a function of s: Σ c[k] (s − from)^k on [from, to]. */
export interface Piece {
  from: number;
  to: number;
  c: readonly number[];
}

/** A piecewise polynomial on a member; neighbouring pieces may jump where they meet. */
export type PiecewisePolynomial = readonly Piece[];
