'use server';

import { redirect } from 'next/navigation';
import { z } from 'zod';
import { copySheet } from '@/lib/services/copy-sheet';
import { afterRefusal, type FormState } from '../../components/form-state';
import { orRefuse, requireActor } from '../../session';

const jobId = z.uuid();

export async function submitCopy(_: FormState, form: FormData): Promise<FormState> {
  const actor = await requireActor();
  const job = jobId.parse(form.get('jobId'));
  const result = await orRefuse(copySheet(actor, { sheetId: form.get('sheetId') }));
  if (!result.ok) return afterRefusal(result, form);
  redirect(`/jobs/${job}/sheets/${result.value.id}`);
}
