'use server';

import { redirect } from 'next/navigation';
import { signIn } from '@/lib/services/sign-in';
import { afterRefusal, type FormState } from '../components/form-state';
import { keepSession, keepStep, requestAddress } from '../session';

export async function submitSignIn(_: FormState, form: FormData): Promise<FormState> {
  const result = await signIn(Object.fromEntries(form), await requestAddress());
  if (!result.ok) return afterRefusal(result, form, ['password']);
  if (result.value.step === 'code') {
    await keepStep(result.value);
    redirect('/sign-in/second-step');
  }
  await keepSession(result.value);
  redirect('/jobs');
}
