'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';
import { drop, type TwoFactorState } from './actions';

/** Turns the second factor off with a last code. */
export function TurnOff() {
  const [state, send] = useActionState<TwoFactorState, FormData>(drop, untouched);
  return (
    <form action={send} noValidate className="max-w-[320px] mt-4">
      <FormMessage state={state} />
      <TextField
        name="code"
        label="Code, or a recovery code"
        autoComplete="one-time-code"
        state={state}
        maxLength={60}
        required
      />
      <div className="row">
        <SubmitButton tone="plain">Turn the second factor off</SubmitButton>
      </div>
    </form>
  );
}
