'use server';

import { revalidatePath } from 'next/cache';
import { afterRefusal, type FormState } from '@/app/components/form-state';
import { orRefuse, requireActor } from '@/app/session';
import { nameJobPeople } from '@/lib/services/name-job-people';
import { setJobState } from '@/lib/services/set-job-state';

export async function submitPart(
  jobId: string,
  part: string,
  _: FormState,
  form: FormData,
): Promise<FormState> {
  const actor = await requireActor();
  const personIds = form.getAll('personIds').filter((id) => id !== '');
  const named = await orRefuse(nameJobPeople(actor, { jobId, part, personIds }));
  if (!named.ok) return afterRefusal(named, form);
  revalidatePath(`/jobs/${jobId}`, 'layout');
  return { errors: [], typed: {}, done: 'Kept.' };
}

export async function setState(jobId: string, state: 'open' | 'closed'): Promise<void> {
  const actor = await requireActor();
  await orRefuse(setJobState(actor, { jobId, state }));
  revalidatePath(`/jobs/${jobId}`, 'layout');
}
