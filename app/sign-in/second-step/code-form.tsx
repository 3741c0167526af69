'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';
import { submitCode } from './actions';

export function CodeForm() {
  const [state, action] = useActionState(submitCode, untouched);
  return (
    <form className="signin" action={action} noValidate>
      <FormMessage state={state} />
      <TextField
        name="code"
        label="Code"
        autoComplete="one-time-code"
        state={state}
        maxLength={60}
        note="The six figures your device shows, or one of your recovery codes."
        required
      />
      <div className="row">
        <SubmitButton>Go on</SubmitButton>
        <Link className="btn q" href="/sign-in">
          Sign in as somebody else
        </Link>
      </div>
    </form>
  );
}
