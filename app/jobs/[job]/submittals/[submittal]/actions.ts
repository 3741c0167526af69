'use server';

import { revalidatePath } from 'next/cache';
import { afterRefusal, type FormState } from '@/app/components/form-state';
import { orRefuse, requireActor } from '@/app/session';
import { answerComment } from '@/lib/services/answer-comment';
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
  };
  const sent = await orRefuse(sendSubmittal(actor, input));
  if (!sent.ok) return afterRefusal(sent, form);
  revalidatePath(path);
  return { errors: [], typed: {}, done: `Transmittal ${sent.value.transmittal} is on its way.` };
}

export async function revoke(path: string, submittalId: string): Promise<void> {
  const actor = await requireActor();
  await orRefuse(revokeReview(actor, { submittalId }));
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
