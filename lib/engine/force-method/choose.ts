import type { Analysis } from '@/lib/model/analysis';
import type { Quantity } from '@/lib/model/quantity';
import type { Choice } from '../solution';
import { validate } from '../validate';
import { chooseBasis } from './choose-basis';
import { flexibilityMatrix } from './flexibility-matrix';
import { type Ground, isLaid, layGround } from './ground';
import { poorChoice } from './poor-choice';
import { fixedQuantities } from './self-stress';
import { tryRedundants } from './try-redundants';

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

/** Whether sets of one analysis leave a stable structure, and the motion where they do not; without their condition. */
export function trier(analysis: Analysis): (quantities: readonly Quantity[]) => Tried {
  const ground = groundOf(analysis);
  if ('good' in ground) return () => ground;
  const { eq, proposed } = ground;
  const fixed = new Set(fixedQuantities(eq, proposed));
  return (quantities) => tryRedundants(eq, proposed, quantities, fixed);
}

type Tried = { good: true } | Extract<Choice, { good: false }>;

/** What every answer starts from, or why there can be none. */
export function groundOf(analysis: Analysis): Ground | Extract<Choice, { good: false }> {
  const fault = isLaid(analysis) ? undefined : validate(analysis);
  if (fault) return { good: false, code: fault.code, message: fault.message };
  const ground = layGround(analysis);
  if (ground.proposed.unstable)
    return {
      good: false,
      code: 'unstable',
      message: 'The structure is unstable before anything is released.',
    };
  return ground;
}
