'use server';

import { askPasswordReset } from '@/lib/services/ask-password-reset';
import { afterRefusal, type FormState } from '../components/form-state';
import { requestAddress } from '../session';

export async function submitAsk(_: FormState, form: FormData): Promise<FormState> {
  const result = await askPasswordReset(Object.fromEntries(form), await requestAddress());
  if (!result.ok) return afterRefusal(result, form);
  return {
    errors: [],
    typed: {},
    done: 'If the address belongs to an account, a link is on its way. It works once, within two hours.',
  };
}
