'use server';

import { redirect } from 'next/navigation';
import { afterRefusal, type FormState } from '@/app/components/form-state';
import { orRefuse, requireActor } from '@/app/session';
import { createSubmittal } from '@/lib/services/create-submittal';

/** Gathers the chosen sheets and prints the package. */
export async function gather(jobId: string, _state: FormState, form: FormData): Promise<FormState> {
  const actor = await requireActor();
  const made = await orRefuse(
    createSubmittal(actor, {
      jobId,
      purpose: form.get('purpose') ?? '',
      remarks: form.get('remarks') ?? '',
      revisionIds: form.getAll('revisionIds'),
    }),
  );
  if (!made.ok) return afterRefusal(made, form);
  redirect(`/jobs/${jobId}/submittals/${made.value.id}`);
}
