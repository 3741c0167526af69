'use server';

import { redirect } from 'next/navigation';
import { afterRefusal, type FormState } from '@/app/components/form-state';
import { orRefuse, requireActor } from '@/app/session';
import { restoreRevision } from '@/lib/services/restore-revision';
import { sendToCheck } from '@/lib/services/send-to-check';

/** Gives the revision to a checker. */
export async function giveToChecker(
  jobId: string,
  revisionId: string,
  _state: FormState,
  form: FormData,
): Promise<FormState> {
  const actor = await requireActor();
  const given = await orRefuse(
    sendToCheck(actor, {
      revisionId,
      checkerId: form.get('checkerId') ?? '',
      category: form.get('category'),
      standardSolution: form.get('standardSolution') ?? '',
      blind: form.get('blind') === 'yes',
      inputsAsked: form.get('inputsAsked') === 'yes',
    }),
  );
  if (!given.ok) return afterRefusal(given, form);
  redirect(`/jobs/${jobId}/checks/${given.value.checkId}`);
}

/** Makes the inputs of the revision the newest draft, and opens the desk on it. */
export async function goBack(revisionId: string, state: FormState): Promise<FormState> {
  const actor = await requireActor();
  const made = await orRefuse(restoreRevision(actor, { revisionId }));
  if (!made.ok) return { ...state, errors: made.errors };
  redirect(`/jobs/${made.value.jobId}/sheets/${made.value.sheetId}`);
}
