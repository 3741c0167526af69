/** Every tolerance of the engine, by name. All are relative; nothing is compared with zero. */
export const tolerance = {
  /** A pivot of the equilibrium matrix, columns scaled to length 1, below which a column adds nothing new. */
  pivot: 1e-9,
  /** A self-stress entry, relative to the largest of its state, below which a quantity is fixed by equilibrium. */
  fixed: 1e-9,
  /** A self-stress entry, relative to the largest of its state, that is rounding and nothing else. */
  entry: 1e-12,
  /** Axial force or strain along members that are held lengthwise, relative to its parts, that bending would leave open. */
  along: 1e-9,
  /** Condition of a chosen set of redundants beyond which half of all figures would be lost on the way. */
  poorest: 1e8,
  /** Agreement of the two ways, joint equilibrium, reciprocity and gaps, relative to the largest value of their kind. */
  check: 1e-7,
} as const;
