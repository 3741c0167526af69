'use server';

import { redirect } from 'next/navigation';
import { createJob } from '@/lib/services/create-job';
import { afterRefusal, type FormState } from '../../components/form-state';
import { orRefuse, requireActor } from '../../session';

export async function submitJob(_: FormState, form: FormData): Promise<FormState> {
  const actor = await requireActor();
  const typed = Object.fromEntries(form);
  const result = await orRefuse(createJob(actor, { ...typed, authorityId: typed.authorityId || undefined }));
  if (!result.ok) return afterRefusal(result, form);
  redirect(`/jobs/${result.value.id}`);
}
