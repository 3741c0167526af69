'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';
import type { FormAction } from './check-mark';

/** The originator's answer to one mark. */
export function MarkAnswer({ action, where }: { action: FormAction; where: string }) {
  const [state, send] = useActionState(action, untouched);
  return (
    <form action={send} aria-label={`Answer at ${where}`}>
      <TextField name="answer" label={`Answer at ${where}`} state={state} lines={2} maxLength={1000} />
      <FormMessage state={state} />
      <SubmitButton small>Record the answer</SubmitButton>
    </form>
  );
}
