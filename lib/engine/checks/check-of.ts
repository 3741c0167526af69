import type { Check } from '../solution';
import { tolerance } from '../tolerance';

/** A check with its residual, held against the one tolerance of checks. */
export const checkOf = (kind: Check['kind'], subject: string, residual: number, caseId?: string): Check => ({
  kind,
  subject,
  case: caseId,
  residual,
  tolerance: tolerance.check,
  holds: residual <= tolerance.check,
});
