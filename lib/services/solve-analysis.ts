// server only
import { z } from 'zod';
import { solve } from '@/lib/engine/solve';
import { analysisForm, analysis as analysisSchema } from '@/lib/model/analysis';
import type { Refusal } from '@/lib/model/refusal';
import { compose } from '@/templates/compose';
import type { Actor } from './actor';
import { allowAttempt, tooOften } from './limit-attempts';
import { makers, requireRole } from './require-role';

/** Name of the form in which answers are given; raised when a field is renamed or taken out. */
export const answerForm = 'fairhand.answer/1';

const perQuarterHour = 600;

export type AnalysisAnswer =
  | { ok: true; answer: ReturnType<typeof answerOf> }
  | { ok: false; refusal: Refusal; tooOften: boolean };

/** Solves an analysis that a program sent and writes its steps. Nothing is stored. */
export async function solveAnalysis(actor: Actor, raw: unknown, figures: boolean): Promise<AnalysisAnswer> {
  requireRole(actor, ...makers);
  if (!(await allowAttempt(`analyses:${actor.personId}`, perQuarterHour)))
    return { ok: false, tooOften: true, refusal: { code: 'too-often', message: tooOften, place: {} } };
  const solved = solve(raw);
  if (!solved.ok) return { ok: false, tooOften: false, refusal: solved.refusal };
  return { ok: true, answer: answerOf(solved.value, figures) };
}

function answerOf(solution: Extract<ReturnType<typeof solve>, { ok: true }>['value'], figures: boolean) {
  const { engine, analysis, determinacy, fixed, redundants, proposed, condition } = solution;
  const { X, cases, combinations, envelopes, displacements, checks } = solution;
  return {
    form: answerForm,
    engine,
    units: analysis.units,
    determinacy,
    fixed,
    redundants,
    proposed,
    condition,
    X,
    cases,
    combinations,
    envelopes,
    displacements: displacements.map(({ ask, cases: perCase, combinations: perSum }) => ({
      ask,
      cases: Object.fromEntries(
        Object.entries(perCase).map(([id, { total, value }]) => [id, { total, value }]),
      ),
      combinations: perSum,
    })),
    checks,
    /** The written calculation: lines with their mathematics as TeX between dollar signs. */
    steps: compose(solution, { title: analysis.title, figures, narrowFigures: false }),
  };
}

const conventions =
  'Numbers are in coherent units: US kip, ft, °F; SI kN, m, K; rotations in rad. Global x runs right, y up; couples and ' +
  'rotations are counter-clockwise. N is tension positive; M is positive with tension on the right-hand face when walking ' +
  'a member from start to end (the underside of a beam drawn left to right); V = dM/ds. Reactions are forces of the ' +
  'support on the structure. EI, EA and GAs may be given as values, or EI as multiples of one EI0.';

/** The JSON schema (draft 2020-12) of the form that is read. */
export function analysisJsonSchema(): Record<string, unknown> {
  return {
    ...z.toJSONSchema(analysisSchema, { io: 'input' }),
    title: analysisForm,
    description: conventions,
  };
}
