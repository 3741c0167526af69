'use server';

import { redirect } from 'next/navigation';
import { changePassword } from '@/lib/services/change-password';
import { signOutEverywhere } from '@/lib/services/sign-out-everywhere';
import { afterRefusal, type FormState } from '../components/form-state';
import { leaveSession, orRefuse, requireActor } from '../session';

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
