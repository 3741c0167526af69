import type { Choice } from '../solution';
import { tolerance } from '../tolerance';

/** A set that is stable but so near to instability that the figures of its equations would be lost in rounding. */
export function poorChoice(condition: number): Extract<Choice, { good: false }> | undefined {
  if (condition <= tolerance.poorest) return undefined;
  const size = Number.isFinite(condition)
    ? condition.toExponential(0).replace('e+', ' × 10^')
    : 'beyond all figures';
  return {
    good: false,
    code: 'poorly-conditioned',
    message: `These redundants leave a structure that is stable but so near to instability that its figures would be lost in rounding (condition ${size}). Choose others.`,
  };
}
