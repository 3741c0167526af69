'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';

/** Queues a refused letter again. */
export function ResendForm({
  action,
  recipient,
}: {
  action: (state: FormState) => Promise<FormState>;
  recipient: string;
}) {
  const [state, send] = useActionState(action, untouched);
  return (
    <form action={send}>
      <FormMessage state={state} />
      <SubmitButton tone="plain" small>
        Send the letter to {recipient} again
      </SubmitButton>
    </form>
  );
}
