'use server';

import { revalidatePath } from 'next/cache';
import { afterRefusal, type FormState } from '@/app/components/form-state';
import { orRefuse, requireActor, sessionToken } from '@/app/session';
import { beginSecondFactor } from '@/lib/services/second-factor/begin-second-factor';
import { confirmSecondFactor } from '@/lib/services/second-factor/confirm-second-factor';
import { dropSecondFactor } from '@/lib/services/second-factor/drop-second-factor';

export interface TwoFactorState extends FormState {
  /** The secret for the device, its address and the recovery codes, shown once, while a first code is waited for. */
  begun?: { secret: string; address: string; codes: string[] };
}

export async function begin(_: TwoFactorState): Promise<TwoFactorState> {
  const actor = await requireActor();
  const begun = await orRefuse(beginSecondFactor(actor));
  if (!begun.ok) return afterRefusal(begun, new FormData());
  return { errors: [], typed: {}, begun: begun.value };
}

export async function confirm(_: TwoFactorState, form: FormData): Promise<TwoFactorState> {
  const actor = await requireActor();
  const confirmed = await orRefuse(
    confirmSecondFactor(actor, { code: form.get('code') }, await sessionToken()),
  );
  if (!confirmed.ok) return afterRefusal(confirmed, form, ['code']);
  revalidatePath('/account', 'layout');
  return { errors: [], typed: {} };
}

export async function drop(_: TwoFactorState, form: FormData): Promise<TwoFactorState> {
  const actor = await requireActor();
  const dropped = await orRefuse(dropSecondFactor(actor, { code: form.get('code') }));
  if (!dropped.ok) return afterRefusal(dropped, form, ['code']);
  revalidatePath('/account', 'layout');
  return { errors: [], typed: {}, done: 'The second factor is off.' };
}
