'use server';

import { acceptInvitation } from '@/lib/services/accept-invitation';
import { afterRefusal, type FormState } from '../../components/form-state';

export async function submitInvitation(_: FormState, form: FormData): Promise<FormState> {
  const result = await acceptInvitation(Object.fromEntries(form));
  if (!result.ok) return afterRefusal(result, form, ['password', 'token']);
  return { errors: [], typed: {}, done: 'The password is set and the invitation accepted. Sign in with it.' };
}
