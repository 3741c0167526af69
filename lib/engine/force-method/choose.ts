import type { Analysis } from '@/lib/model/analysis';
import type { Quantity } from '@/lib/model/quantity';
import type { Choice } from '../solution';
import { type Equilibrium, equilibrium } from '../statics/equilibrium';
import { validate } from '../validate';
import { chooseBasis } from './choose-basis';
import { flexibilityMatrix } from './flexibility-matrix';
import { poorChoice } from './poor-choice';
import { proposeRedundants } from './propose-redundants';
import { type Reference, referenceStiffness, withReference } from './reference';
import type { PrimaryBasis } from './self-stress';

/**
 * The answer about a set of redundants, for a form: whether it leaves a stable primary structure and how well
 * conditioned it is, or why not, with the motion. Refuses an analysis that `solve` would refuse.
 */
export function choose(analysis: Analysis, quantities: readonly Quantity[]): Choice {
  return chooser(analysis)(quantities);
}

/** Answers about many sets of one analysis, which is prepared once. */
export function chooser(analysis: Analysis): (quantities: readonly Quantity[]) => Choice {
  const ground = groundOf(analysis);
  if ('good' in ground) return () => ground;
  const { eq, proposed, reference } = ground;
  return (quantities) => {
    const chosen = chooseBasis(eq, proposed, quantities);
    if (!chosen.good) return chosen;
    const { condition } = flexibilityMatrix(eq, chosen.basis, reference.EI0);
    return poorChoice(condition) ?? { good: true, condition };
  };
}

interface Ground {
  eq: Equilibrium;
  proposed: PrimaryBasis;
  reference: Reference;
}

/** What every answer starts from, or why there can be none. */
export function groundOf(analysis: Analysis): Ground | Extract<Choice, { good: false }> {
  const fault = validate(analysis);
  if (fault) return { good: false, code: fault.code, message: fault.message };
  const reference = referenceStiffness(analysis);
  const eq = equilibrium(withReference(analysis, reference));
  const proposed = proposeRedundants(eq);
  if (proposed.unstable)
    return {
      good: false,
      code: 'unstable',
      message: 'The structure is unstable before anything is released.',
    };
  return { eq, proposed, reference };
}
