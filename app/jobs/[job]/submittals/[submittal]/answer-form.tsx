'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';

/** The office's answer to one comment. */
export function AnswerForm({
  action,
  number,
}: {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  number: number;
}) {
  const [state, send] = useActionState(action, untouched);
  return (
    <form action={send} aria-label={`Answer to comment ${number}`}>
      <TextField
        name="answer"
        label={`Answer to comment ${number}`}
        state={state}
        lines={3}
        maxLength={2000}
      />
      <TextField
        name="place"
        label="Where it is answered, such as S-03 line 2.5"
        state={state}
        maxLength={120}
      />
      <FormMessage state={state} />
      <SubmitButton small>Record the answer</SubmitButton>
    </form>
  );
}
