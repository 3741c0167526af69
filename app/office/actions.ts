'use server';

import { revalidatePath } from 'next/cache';
import { changeOffice } from '@/lib/services/change-office';
import { invitePerson } from '@/lib/services/invite-person';
import { afterRefusal, type FormState } from '../components/form-state';
import { orRefuse, requireActor } from '../session';

export async function submitInvite(_: FormState, form: FormData): Promise<FormState> {
  const actor = await requireActor();
  const email = form.get('email');
  const result = await orRefuse(
    invitePerson(actor, { ...Object.fromEntries(form), roles: form.getAll('roles') }),
  );
  if (!result.ok) return afterRefusal(result, form);
  revalidatePath('/office');
  return { errors: [], typed: {}, done: `An invitation is on its way to ${email}. It works for three days.` };
}

export async function submitOffice(_: FormState, form: FormData): Promise<FormState> {
  const actor = await requireActor();
  const changed = await orRefuse(
    changeOffice(actor, {
      lateAfter: form.get('lateAfter'),
      sealNeedsSecond: form.get('sealNeedsSecond') === 'yes',
    }),
  );
  if (!changed.ok) return afterRefusal(changed, form);
  revalidatePath('/office');
  return { errors: [], typed: {}, done: 'The settings are kept.' };
}
