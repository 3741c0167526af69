'use server';

import { resetPassword } from '@/lib/services/reset-password';
import { afterRefusal, type FormState } from '../../components/form-state';

export async function submitPassword(_: FormState, form: FormData): Promise<FormState> {
  const result = await resetPassword(Object.fromEntries(form));
  if (!result.ok) return afterRefusal(result, form, ['password', 'token']);
  return { errors: [], typed: {}, done: 'The new password is set. Sign in with it.' };
}
