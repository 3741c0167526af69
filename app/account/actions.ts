'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { changePassword } from '@/lib/services/change-password';
import { issueApiToken } from '@/lib/services/issue-api-token';
import { revokeApiToken } from '@/lib/services/revoke-api-token';
import { signOutEverywhere } from '@/lib/services/sign-out-everywhere';
import { afterRefusal, type FormState } from '../components/form-state';
import { leaveSession, orRefuse, requireActor } from '../session';
import type { TokenState } from './token-state';

export async function submitChange(_: FormState, form: FormData): Promise<FormState> {
  const actor = await requireActor();
  const result = await orRefuse(changePassword(actor, Object.fromEntries(form)));
  if (!result.ok) return afterRefusal(result, form, ['current', 'password']);
  await leaveSession();
  redirect('/sign-in');
}

export async function leaveEverywhere(): Promise<void> {
  const actor = await requireActor();
  await orRefuse(signOutEverywhere(actor));
  await leaveSession();
  redirect('/sign-in');
}

/** Issues a token; its secret is in the answer and nowhere else. */
export async function submitToken(_: TokenState, form: FormData): Promise<TokenState> {
  const actor = await requireActor();
  const result = await orRefuse(issueApiToken(actor, Object.fromEntries(form)));
  if (!result.ok) return afterRefusal(result, form);
  revalidatePath('/account');
  return { errors: [], typed: {}, token: result.value.token };
}

export async function revokeToken(id: string): Promise<void> {
  const actor = await requireActor();
  await orRefuse(revokeApiToken(actor, { id }));
  revalidatePath('/account');
}
