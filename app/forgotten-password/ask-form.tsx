'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import { FormMessage } from '../components/form-message';
import { untouched } from '../components/form-state';
import { SubmitButton } from '../components/submit-button';
import { TextField } from '../components/text-field';
import { submitAsk } from './actions';

export function AskForm() {
  const [state, action] = useActionState(submitAsk, untouched);
  return (
    <form className="signin" action={action} noValidate>
      <FormMessage state={state} />
      <TextField name="email" label="E-mail" type="email" autoComplete="username" state={state} required />
      <div className="row">
        <SubmitButton>Send the link</SubmitButton>
        <Link className="btn q" href="/sign-in">
          Back to sign-in
        </Link>
      </div>
    </form>
  );
}
