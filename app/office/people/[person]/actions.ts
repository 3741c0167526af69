'use server';

import { revalidatePath } from 'next/cache';
import { afterRefusal, type FormState } from '@/app/components/form-state';
import { orRefuse, requireActor } from '@/app/session';
import { addLicence } from '@/lib/services/add-licence';
import { changePerson } from '@/lib/services/change-person';
import { clearSecondFactor } from '@/lib/services/second-factor/clear-second-factor';
import { withdrawLicence } from '@/lib/services/withdraw-licence';

export async function submitPerson(personId: string, _: FormState, form: FormData): Promise<FormState> {
  const actor = await requireActor();
  const active = form.get('account') === 'open';
  const change = {
    personId,
    name: form.get('name'),
    initials: form.get('initials'),
    organisation: form.get('organisation') ?? '',
    active,
  };
  const changed = await orRefuse(changePerson(actor, { ...change, roles: form.getAll('roles') }));
  if (!changed.ok) return afterRefusal(changed, form);
  revalidatePath('/office', 'layout');
  const done = active
    ? 'The change is kept. This person was signed out and signs in anew.'
    : 'The account is closed and its sessions are ended. What this person signed stays in the record.';
  return { errors: [], typed: {}, done };
}

export async function submitLicence(personId: string, _: FormState, form: FormData): Promise<FormState> {
  const actor = await requireActor();
  const added = await orRefuse(addLicence(actor, { ...Object.fromEntries(form), personId }));
  if (!added.ok) return afterRefusal(added, form);
  revalidatePath('/office', 'layout');
  return { errors: [], typed: {}, done: 'The licence is entered.' };
}

export async function withdraw(licenceId: string): Promise<void> {
  const actor = await requireActor();
  await orRefuse(withdrawLicence(actor, { licenceId }));
  revalidatePath('/office', 'layout');
}

export async function clearSecond(personId: string): Promise<void> {
  const actor = await requireActor();
  await orRefuse(clearSecondFactor(actor, { personId }));
  revalidatePath('/office', 'layout');
}
