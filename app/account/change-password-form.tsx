'use client';

import { useActionState } from 'react';
import { FormMessage } from '../components/form-message';
import { untouched } from '../components/form-state';
import { SubmitButton } from '../components/submit-button';
import { TextField } from '../components/text-field';
import { submitChange } from './actions';

export function ChangePasswordForm() {
  const [state, action] = useActionState(submitChange, untouched);
  return (
    <form action={action} noValidate>
      <FormMessage state={state} />
      <div className="formgrid">
        <TextField
          name="current"
          label="Password you have now"
          type="password"
          autoComplete="current-password"
          state={state}
          required
        />
        <TextField
          name="password"
          label="New password"
          type="password"
          autoComplete="new-password"
          state={state}
          note="At least 12 characters. A few words in a row do well."
          required
        />
      </div>
      <div className="row">
        <SubmitButton>Change the password</SubmitButton>
      </div>
    </form>
  );
}
