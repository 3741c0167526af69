import type { Quantity } from '@/lib/model/quantity';
import type { Dimension } from '@/lib/units/dimension';
import { pure } from '@/lib/units/dimension';

const of = (force: number, length: number, temperature = 0): Dimension => ({ force, length, temperature });

/** Dimensions of what a derivation prints. */
export const dimensions = {
  pure,
  length: of(0, 1),
  force: of(1, 0),
  moment: of(1, 1),
  intensity: of(1, -1),
  stiffness: of(1, 2),
  spring: of(1, -1),
  temperature: of(0, 0, 1),
  perLength: of(0, -1),
} as const;

/** Dimension of a force quantity: a force, or a moment. */
export function dimensionOf(q: Quantity): Dimension {
  const moment = q.kind === 'moment' || (q.kind === 'reaction' && q.component === 'turn');
  return moment ? dimensions.moment : dimensions.force;
}

/** a · b^power on dimensions, for what a unit state divides by its redundant: `per(moment, force)` is a length. */
export function per(a: Dimension, b: Dimension): Dimension {
  return {
    force: a.force - b.force,
    length: a.length - b.length,
    temperature: a.temperature - b.temperature,
  };
}

/** EI0 times the displacement that works with a quantity: EI0 δ. */
export function gapDimension(q: Quantity): Dimension {
  return dimensionOf(q).length === 0 ? of(1, 3) : of(1, 2);
}

/** EI0 f_ij. */
export function flexibilityDimension(i: Quantity, j: Quantity): Dimension {
  return per(gapDimension(i), dimensionOf(j));
}
