'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import { FormMessage } from '../components/form-message';
import { untouched } from '../components/form-state';
import { SubmitButton } from '../components/submit-button';
import { TextField } from '../components/text-field';
import { submitSignIn } from './actions';

export function SignInForm() {
  const [state, action] = useActionState(submitSignIn, untouched);
  return (
    <form className="signin" action={action} noValidate>
      <FormMessage state={state} />
      <TextField name="email" label="E-mail" type="email" autoComplete="username" state={state} required />
      <TextField
        name="password"
        label="Password"
        type="password"
        autoComplete="current-password"
        state={state}
        required
      />
      <div className="row">
        <SubmitButton>Sign in</SubmitButton>
        <Link className="btn q" href="/forgotten-password">
          Set a new password
        </Link>
      </div>
    </form>
  );
}
