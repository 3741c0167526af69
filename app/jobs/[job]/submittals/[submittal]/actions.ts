'use server';

import { revalidatePath } from 'next/cache';
import { afterRefusal, type FormState } from '@/app/components/form-state';
import { orRefuse, requireActor } from '@/app/session';
import { answerComment } from '@/lib/services/answer-comment';
import { resendLetter } from '@/lib/services/resend-letter';
import { revokeReview } from '@/lib/services/revoke-review';
import { sendSubmittal } from '@/lib/services/send-submittal';

export async function send(
  path: string,
  submittalId: string,
  _state: FormState,
  form: FormData,
): Promise<FormState> {
  const actor = await requireActor();
  const input = {
    submittalId,
    reviewer: form.get('reviewer'),
    email: form.get('email'),
    days: form.get('days'),
    action: form.get('action') ?? undefined,
    seenTo: form.getAll('seenTo'),
  };
  const sent = await orRefuse(sendSubmittal(actor, input));
  if (!sent.ok) return afterRefusal(sent, form);
  revalidatePath(path);
  return { errors: [], typed: {}, done: `Transmittal ${sent.value.transmittal} is on its way.` };
}

export async function resend(path: string, mailId: string, _state: FormState): Promise<FormState> {
  const actor = await requireActor();
  const queued = await orRefuse(resendLetter(actor, { mailId }));
  if (!queued.ok) return afterRefusal(queued, new FormData());
  revalidatePath(path);
  return { errors: [], typed: {}, done: 'The letter is on its way again.' };
}

/** Closes the link of one reviewer, or of all. */
export async function revoke(path: string, submittalId: string, linkId: string | undefined): Promise<void> {
  const actor = await requireActor();
  await orRefuse(revokeReview(actor, { submittalId, linkId }));
  revalidatePath(path);
}

export async function answer(
  path: string,
  commentId: string,
  _state: FormState,
  form: FormData,
): Promise<FormState> {
  const actor = await requireActor();
  const input = { commentId, answer: form.get('answer') ?? '', place: form.get('place') ?? '' };
  const given = await orRefuse(answerComment(actor, input));
  if (!given.ok) return afterRefusal(given, form);
  revalidatePath(path);
  return { errors: [], typed: {}, done: 'The answer is recorded.' };
}
