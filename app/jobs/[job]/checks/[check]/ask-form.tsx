'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';
import type { FormAction } from './check-mark';

/** A query about the basis, kept in the schedule of queries. */
export function AskForm({ action }: { action: FormAction }) {
  const [state, send] = useActionState(action, untouched);
  return (
    <form action={send} aria-label="Query about the basis" className="grid gap-3">
      <TextField name="line" label="What it is about" state={state} maxLength={250} />
      <TextField name="text" label="What you ask" state={state} lines={2} maxLength={1000} />
      <FormMessage state={state} />
      <SubmitButton small>Leave the query</SubmitButton>
    </form>
  );
}
