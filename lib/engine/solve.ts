import { type Analysis, analysis as schema } from '@/lib/model/analysis';
import type { Quantity } from '@/lib/model/quantity';
import type { Refusal } from '@/lib/model/refusal';
import { assembleCases } from './assemble-cases';
import { checkOtherRedundants } from './checks/check-other-redundants';
import { checkSolution } from './checks/check-solution';
import { combineResults } from './combinations/combine-results';
import { envelopes } from './combinations/envelopes';
import { askedDisplacements } from './force-method/asked-displacements';
import { chooseBasis } from './force-method/choose-basis';
import { layGround } from './force-method/ground';
import { refuseOpenAxial } from './force-method/open-axial';
import { poorChoice } from './force-method/poor-choice';
import { fixedQuantities, type PrimaryBasis } from './force-method/self-stress';
import { type SolvedForces, solveRedundants } from './force-method/solve-redundants';
import type { Outcome } from './outcome';
import { primaryStructure } from './primary-structure';
import { refuseForm } from './refuse-form';
import { refuseCoupleOnHinge, refuseUnstable } from './refuse-unstable';
import type { Choice, Solution } from './solution';
import { describeDeterminacy } from './statics/determinacy';
import type { Equilibrium } from './statics/equilibrium';
import { validate } from './validate';

/** Version of the engine, frozen with every revision. Raised whenever a result or a written step could change. */
export const engineVersion = '1.1.0';

const refused = (refusal: Refusal): Outcome<never> => ({ ok: false, refusal });

export interface SolveOptions {
  /** Solves once more with other redundants, as a check of the first, where there are no more than 30; takes about as long again. */
  otherRedundants?: boolean;
}

/**
 * The one public entry. Takes the versioned JSON form (lib/model/analysis.ts) and answers everything the engine found, or
 * a refusal with a code, a sentence and a place. Nothing a caller can mend is thrown; no answer holds NaN or Infinity.
 */
export function solve(input: unknown, options: SolveOptions = {}): Outcome<Solution> {
  const heavy = refuseForm(input);
  if (heavy) return refused(heavy);
  const parsed = schema.safeParse(input);
  if (!parsed.success) {
    const issue = parsed.error.issues[0];
    const path = issue?.path.join('.');
    return refused({
      code: 'form',
      message: `${path || 'The form'}: ${issue?.message ?? 'not the form that is read here'}.`,
      place: { path },
    });
  }
  const fault = validate(parsed.data);
  return fault ? refused(fault) : solveValid(parsed.data, options);
}

function solveValid(analysis: Analysis, options: SolveOptions): Outcome<Solution> {
  const { reference, eq, proposed } = layGround(analysis);
  const unstable = refuseUnstable(eq, proposed) ?? refuseCoupleOnHinge(eq);
  if (unstable) return refused(unstable);
  const chosen = analysis.redundants
    ? chooseBasis(eq, proposed, analysis.redundants)
    : { good: true as const, basis: proposed };
  if (!chosen.good) return refused(badChoice(chosen));
  const { basis } = chosen;
  const solved = solveRedundants(eq, basis, analysis.cases, reference.EI0);
  const poor = analysis.redundants && poorChoice(solved?.condition ?? Number.POSITIVE_INFINITY);
  if (poor) return refused(badChoice(poor));
  if (!solved) return refused(checkFailed('the flexibility matrix is positive definite'));
  const open = refuseOpenAxial(eq, basis, solved);
  if (open) return refused(open);
  const cases = assembleCases(eq, basis, solved, reference);
  const other = options.otherRedundants ? checkOtherRedundants(eq, basis, solved, reference.EI0) : undefined;
  const checks = [...checkSolution(eq, solved, cases, reference.EI0), ...(other?.checks ?? [])];
  const failed = checks.find((c) => !c.holds);
  if (failed) return refused(checkFailed(failed.subject, failed.case));
  const combinations = combineResults(analysis, cases);
  return {
    ok: true,
    value: {
      engine: engineVersion,
      analysis,
      reference: { value: reference.value, member: reference.member },
      determinacy: describeDeterminacy(eq, basis),
      fixed: fixedOf(eq, basis, solved),
      redundants: basis.redundants.map((q) => eq.quantities[q] as Quantity),
      proposed: analysis.redundants === undefined,
      condition: solved.condition,
      ...primaryStructure(eq, basis, solved),
      X: Object.fromEntries([...solved.cases].map(([id, c]) => [id, c.X])),
      cases,
      combinations,
      envelopes: envelopes(analysis, combinations),
      displacements: askedDisplacements(eq, basis, solved, reference),
      checks,
      other: other && { redundants: other.redundants, condition: other.condition },
    },
  };
}

function badChoice({ code, message, mechanism }: Extract<Choice, { good: false }>): Refusal {
  return { code, message, place: { path: 'redundants' }, mechanism };
}

function checkFailed(subject: string, id?: string): Refusal {
  return {
    code: 'check-failed',
    message: `A check of the solution failed (${subject}), so it is not shown. The structure may be too near to instability, or its stiffnesses too far apart.`,
    place: { case: id },
  };
}

function fixedOf(eq: Equilibrium, basis: PrimaryBasis, solved: SolvedForces): Solution['fixed'] {
  return fixedQuantities(eq, basis).map((q) => ({
    quantity: eq.quantities[q] as Quantity,
    values: Object.fromEntries(
      [...solved.cases].map(([id, c]) => [id, (c.final[q] as number) * (eq.scale[q] as number)]),
    ),
  }));
}
