'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import { FormMessage } from './form-message';
import { type FormState, untouched } from './form-state';
import { SubmitButton } from './submit-button';
import { TextField } from './text-field';

interface PasswordFormProps {
  token: string;
  button: string;
  send: (state: FormState, form: FormData) => Promise<FormState>;
}

/** Chooses a password by a link that works once. */
export function PasswordForm({ token, button, send }: PasswordFormProps) {
  const [state, action] = useActionState(send, untouched);
  if (state.done)
    return (
      <div className="signin">
        <FormMessage state={state} />
        <Link className="btn p" href="/sign-in">
          Sign in
        </Link>
      </div>
    );
  return (
    <form className="signin" action={action} noValidate>
      <FormMessage state={state} />
      <input type="hidden" name="token" value={token} />
      <TextField
        name="password"
        label="New password"
        type="password"
        autoComplete="new-password"
        state={state}
        note="At least 12 characters. A few words in a row do well."
        required
      />
      <div className="row">
        <SubmitButton>{button}</SubmitButton>
        <Link className="btn q" href="/forgotten-password">
          Ask for a new link
        </Link>
      </div>
    </form>
  );
}
