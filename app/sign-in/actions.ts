'use server';

import { redirect } from 'next/navigation';
import { signIn } from '@/lib/services/sign-in';
import { afterRefusal, type FormState } from '../components/form-state';
import { keepSession, requestAddress } from '../session';

export async function submitSignIn(_: FormState, form: FormData): Promise<FormState> {
  const result = await signIn(Object.fromEntries(form), await requestAddress());
  if (!result.ok) return afterRefusal(result, form, ['password']);
  await keepSession(result.value);
  redirect('/jobs');
}
