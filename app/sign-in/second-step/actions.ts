'use server';

import { redirect } from 'next/navigation';
import { afterRefusal, type FormState } from '@/app/components/form-state';
import { keepSession, leaveStep, readStep, requestAddress } from '@/app/session';
import { answerSecondStep } from '@/lib/services/second-factor/answer-second-step';

export async function submitCode(_: FormState, form: FormData): Promise<FormState> {
  const token = (await readStep()) ?? '';
  const result = await answerSecondStep({ token, code: form.get('code') }, await requestAddress());
  if (!result.ok) return afterRefusal(result, form, ['code']);
  await leaveStep();
  await keepSession(result.value);
  redirect('/jobs');
}
