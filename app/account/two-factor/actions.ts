'use server';

import { revalidatePath } from 'next/cache';
import { afterRefusal, type FormState } from '@/app/components/form-state';
import { keepSession, orRefuse, requireActor } from '@/app/session';
import { beginSecondFactor } from '@/lib/services/second-factor/begin-second-factor';
import { confirmSecondFactor } from '@/lib/services/second-factor/confirm-second-factor';
import { dropSecondFactor } from '@/lib/services/second-factor/drop-second-factor';

export interface TwoFactorState extends FormState {
  /** The secret for the device and its address, while it waits for a first code. */
  begun?: { secret: string; address: string };
  /** Recovery codes, shown once. */
  codes?: string[];
}

export async function begin(_: TwoFactorState): Promise<TwoFactorState> {
  const actor = await requireActor();
  const begun = await orRefuse(beginSecondFactor(actor));
  if (!begun.ok) return afterRefusal(begun, new FormData());
  return { errors: [], typed: {}, begun: begun.value };
}

export async function confirm(_: TwoFactorState, form: FormData): Promise<TwoFactorState> {
  const actor = await requireActor();
  const confirmed = await orRefuse(confirmSecondFactor(actor, { code: form.get('code') }));
  if (!confirmed.ok) return afterRefusal(confirmed, form, ['code']);
  await keepSession(confirmed.value.session);
  return { errors: [], typed: {}, codes: confirmed.value.codes };
}

export async function drop(_: TwoFactorState, form: FormData): Promise<TwoFactorState> {
  const actor = await requireActor();
  const dropped = await orRefuse(dropSecondFactor(actor, { code: form.get('code') }));
  if (!dropped.ok) return afterRefusal(dropped, form, ['code']);
  revalidatePath('/account', 'layout');
  return { errors: [], typed: {}, done: 'The second factor is off.' };
}
