'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { afterRefusal, type FormState } from '@/app/components/form-state';
import { orRefuse, requireActor } from '@/app/session';
import { answerMark } from '@/lib/services/answer-mark';
import { beginOwnSheet } from '@/lib/services/begin-own-sheet';
import { compareOwnSheet } from '@/lib/services/compare-own-sheet';
import { concludeCheck } from '@/lib/services/conclude-check';
import { markLine } from '@/lib/services/mark-line';
import type { Result } from '@/lib/services/result';
import { settleMark } from '@/lib/services/settle-mark';
import { verifyCorrection } from '@/lib/services/verify-correction';

function after(result: Result<null>, form: FormData, path: string, words: string): FormState {
  if (!result.ok) return afterRefusal(result, form);
  revalidatePath(path);
  return { errors: [], typed: {}, done: words };
}

export async function leaveMark(
  path: string,
  checkId: string,
  _state: FormState,
  form: FormData,
): Promise<FormState> {
  const actor = await requireActor();
  const line = String(form.get('line') ?? '');
  const mark = { checkId, line, kind: form.get('kind'), text: form.get('text') ?? '' };
  return after(await orRefuse(markLine(actor, mark)), form, path, `Line ${line} is marked.`);
}

export async function conclude(
  path: string,
  checkId: string,
  _state: FormState,
  form: FormData,
): Promise<FormState> {
  const actor = await requireActor();
  const outcome = form.get('outcome');
  const words = outcome === 'agreed' ? 'The sheet is agreed.' : 'The sheet goes back to its originator.';
  return after(
    await orRefuse(
      concludeCheck(actor, {
        checkId,
        outcome,
        note: form.get('note') ?? '',
        declared: form.get('declared') === 'yes',
      }),
    ),
    form,
    path,
    words,
  );
}

export async function answer(
  path: string,
  markId: string,
  _state: FormState,
  form: FormData,
): Promise<FormState> {
  const actor = await requireActor();
  return after(
    await orRefuse(answerMark(actor, { markId, answer: form.get('answer') ?? '' })),
    form,
    path,
    'The answer is recorded.',
  );
}

export async function settle(
  path: string,
  markId: string,
  _state: FormState,
  form: FormData,
): Promise<FormState> {
  const actor = await requireActor();
  const outcome = form.get('outcome');
  const words = outcome === 'accepted' ? 'The answer is accepted.' : 'The mark is open again.';
  const settled = await orRefuse(settleMark(actor, { markId, outcome, text: form.get('text') ?? '' }));
  return after(settled, form, path, words);
}

export async function verify(
  path: string,
  checkId: string,
  markId: string,
  _state: FormState,
  form: FormData,
): Promise<FormState> {
  const actor = await requireActor();
  const outcome = form.get('outcome');
  const words = outcome === 'verified' ? 'The correction is verified.' : 'The mark is carried on.';
  return after(await orRefuse(verifyCorrection(actor, { checkId, markId, outcome })), form, path, words);
}

/** Begins the checker's own sheet, and opens its desk. */
export async function beginOwn(checkId: string, state: FormState): Promise<FormState> {
  const actor = await requireActor();
  const begun = await orRefuse(beginOwnSheet(actor, { checkId }));
  if (!begun.ok) return { ...state, errors: begun.errors };
  redirect(`/jobs/${begun.value.jobId}/sheets/${begun.value.sheetId}`);
}

export async function compareOwn(path: string, checkId: string, state: FormState): Promise<FormState> {
  const actor = await requireActor();
  const compared = await orRefuse(compareOwnSheet(actor, { checkId }));
  if (!compared.ok) return { ...state, errors: compared.errors };
  redirect(`${path}/comparison`);
}

/** A query about the basis, of a checker who does not see the sheet. */
export async function askAboutBasis(
  path: string,
  checkId: string,
  _state: FormState,
  form: FormData,
): Promise<FormState> {
  const actor = await requireActor();
  const query = {
    checkId,
    place: 'basis',
    kind: 'query',
    line: form.get('line') ?? '',
    text: form.get('text') ?? '',
  };
  return after(await orRefuse(markLine(actor, query)), form, path, 'The query is in the schedule.');
}

/** The checker's mark at an input: agrees with a drawing, correct this, or query. */
export async function markInput(
  path: string,
  checkId: string,
  place: string,
  _state: FormState,
  form: FormData,
): Promise<FormState> {
  const actor = await requireActor();
  const mark = {
    checkId,
    place: 'input',
    line: place,
    kind: form.get('kind'),
    drawing: form.get('drawing') ?? '',
    text: form.get('text') ?? '',
  };
  return after(await orRefuse(markLine(actor, mark)), form, path, 'Marked.');
}
