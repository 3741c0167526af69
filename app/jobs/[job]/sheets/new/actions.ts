'use server';

import { redirect } from 'next/navigation';
import { createSheet } from '@/lib/services/create-sheet';
import { afterRefusal, type FormState } from '../../../../components/form-state';
import { orRefuse, requireActor } from '../../../../session';

export async function submitSheet(jobId: string, _: FormState, form: FormData): Promise<FormState> {
  const actor = await requireActor();
  const result = await orRefuse(createSheet(actor, { ...Object.fromEntries(form), jobId }));
  if (!result.ok) return afterRefusal(result, form);
  redirect(`/jobs/${encodeURIComponent(jobId)}/sheets/${result.value.id}`);
}
