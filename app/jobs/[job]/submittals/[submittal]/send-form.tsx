'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';

interface Props {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  reviewer: string;
  email: string;
}

/** To whom the sealed package goes, and how long the link is good. */
export function SendForm({ action, reviewer, email }: Props) {
  const [state, send] = useActionState(action, untouched);
  return (
    <form action={send} className="sendform" aria-label="Send">
      <TextField name="reviewer" label="Plan reviewer" state={state} initial={reviewer} maxLength={120} />
      <TextField name="email" label="E-mail" state={state} type="email" initial={email} maxLength={190} />
      <TextField name="days" label="Days the link is good" state={state} initial="60" maxLength={3} />
      <FormMessage state={state} />
      <SubmitButton>Send the submittal</SubmitButton>
    </form>
  );
}
