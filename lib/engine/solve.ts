import { type Analysis, analysis as schema } from '@/lib/model/analysis';
import type { Refusal } from '@/lib/model/refusal';
import { assembleCases } from './assemble-cases';
import { checkSolution } from './check-solution';
import { combineResults } from './combinations/combine-results';
import { envelopes } from './combinations/envelopes';
import { askedDisplacements } from './force-method/asked-displacements';
import { chooseBasis } from './force-method/choose';
import { proposeRedundants } from './force-method/propose-redundants';
import { referenceStiffness, withReference } from './force-method/reference';
import { fixedQuantities, type PrimaryBasis } from './force-method/self-stress';
import { type SolvedForces, solveRedundants } from './force-method/solve-redundants';
import type { Outcome } from './outcome';
import { primaryStructure } from './primary-structure';
import type { Solution } from './solution';
import { describeMechanism } from './statics/describe-mechanism';
import { describeDeterminacy } from './statics/determinacy';
import { type Equilibrium, equilibrium } from './statics/equilibrium';
import { mechanismOf } from './statics/mechanism';
import { leftNullVector } from './statics/sparse-lu';
import { validate } from './validate';

/** Version of the engine, frozen with every revision. Raised whenever a result or a written step could change. */
export const engineVersion = '1.0.0';

/** Entries of all unit states together; beyond it an answer would keep a person waiting. */
const largestStates = 60_000;

const refused = (refusal: Refusal): Outcome<never> => ({ ok: false, refusal });

/**
 * The one public entry. Takes the versioned JSON form (lib/model/analysis.ts) and answers everything the engine found, or
 * a refusal with a code, a sentence and a place. Nothing a caller can mend is thrown; no answer holds NaN or Infinity.
 */
export function solve(input: unknown): Outcome<Solution> {
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
  return fault ? refused(fault) : solveValid(parsed.data);
}

function solveValid(analysis: Analysis): Outcome<Solution> {
  const reference = referenceStiffness(analysis);
  const eq = equilibrium(withReference(analysis, reference));
  const proposed = proposeRedundants(eq);
  const unstable = refuseUnstable(eq, proposed);
  if (unstable) return refused(unstable);
  const heavy = loadedHinge(eq);
  if (heavy) return refused(heavy);
  const chosen = analysis.redundants
    ? chooseBasis(eq, proposed, analysis.redundants)
    : { good: true as const, basis: proposed };
  if (!chosen.good) {
    const { code, message, mechanism } = chosen;
    return refused({ code, message, place: { path: 'redundants' }, mechanism });
  }
  const size = chosen.basis.units.reduce((n, u) => n + u.size, 0);
  if (size > largestStates)
    return refused({
      code: 'too-large',
      message: `With ${chosen.basis.redundants.length} redundants on ${analysis.members.length} members this structure is larger than is solved here. Divide it.`,
      place: { path: 'members' },
    });
  const solved = solveRedundants(eq, chosen.basis, analysis.cases, reference.EI0);
  if (!solved)
    return refused({
      code: 'open-axial',
      message:
        'The redundants leave a force along the members open that bending cannot determine. Choose others, or state EA.',
      place: { path: 'redundants' },
    });
  const strained = openStrain(solved);
  if (strained) return refused(strained);
  const cases = assembleCases(eq, chosen.basis, solved, reference);
  const checks = checkSolution(eq, solved, cases, reference.EI0);
  const failed = checks.find((c) => !c.holds);
  if (failed) {
    const message = `A check of the solution failed (${failed.subject}), so it is not shown. The structure may be too near to instability.`;
    return refused({ code: 'check-failed', message, place: { case: failed.case } });
  }
  const combinations = combineResults(analysis, cases);
  return {
    ok: true,
    value: {
      engine: engineVersion,
      analysis,
      reference: { value: reference.value, member: reference.member },
      determinacy: describeDeterminacy(eq, proposed, solved),
      fixed: fixedOf(eq, chosen.basis, solved),
      redundants: chosen.basis.redundants.map((q) => eq.quantities[q] as Solution['redundants'][number]),
      proposed: analysis.redundants === undefined,
      condition: solved.condition,
      ...primaryStructure(eq, chosen.basis, solved),
      X: Object.fromEntries([...solved.cases].map(([id, c]) => [id, c.X])),
      cases,
      combinations,
      envelopes: envelopes(analysis, combinations),
      displacements: askedDisplacements(eq, chosen.basis, solved, reference),
      checks,
    },
  };
}

function refuseUnstable(eq: Equilibrium, basis: PrimaryBasis): Refusal | undefined {
  const free = basis.lu.freeRows.find((r) => !eq.trivialRows.has(r));
  if (free === undefined) return undefined;
  const mechanism = mechanismOf(eq, leftNullVector(basis.lu, free));
  const { code, message } = describeMechanism(eq, mechanism);
  const joint = Object.keys(mechanism.joints)[0];
  return {
    code: `unstable-${code}`,
    message: `The structure is unstable. ${message}`,
    place: { path: 'joints', joint, member: mechanism.pieces[0]?.members[0] },
    mechanism,
  };
}

/** A couple on a joint where nothing can turn against it. */
function loadedHinge(eq: Equilibrium): Refusal | undefined {
  for (const [k, c] of eq.analysis.cases.entries()) {
    for (const [i, load] of c.loads.entries()) {
      if (load.kind !== 'joint' || load.couple === 0) continue;
      const j = eq.analysis.joints.findIndex((x) => x.id === load.joint);
      if (!eq.trivialRows.has(3 * j + 2)) continue;
      return {
        code: 'couple-on-hinge',
        message: `Joint ${load.joint} is a hinge: nothing there takes the couple of case ${c.id}.`,
        place: { path: `cases.${k}.loads.${i}`, joint: load.joint, case: c.id, load: i },
      };
    }
  }
  return undefined;
}

/** Strain along members that are held lengthwise and said not to stretch: no finite force could close the gap. */
function openStrain(solved: SolvedForces): Refusal | undefined {
  for (const [id, c] of solved.cases) {
    for (const i of c.open) {
      const gap = c.gaps[i];
      if (gap?.rows.some((r) => r.value !== 0 && r.kind !== 'bending')) {
        return {
          code: 'needs-EA',
          message: `Case ${id} strains members that are held lengthwise and said not to stretch. State their EA (the area).`,
          place: { path: 'members', case: id },
        };
      }
    }
  }
  return undefined;
}

function fixedOf(eq: Equilibrium, basis: PrimaryBasis, solved: SolvedForces): Solution['fixed'] {
  return fixedQuantities(eq, basis).map((q) => ({
    quantity: eq.quantities[q] as Solution['redundants'][number],
    values: Object.fromEntries(
      [...solved.cases].map(([id, c]) => [id, (c.final[q] as number) * (eq.scale[q] as number)]),
    ),
  }));
}
