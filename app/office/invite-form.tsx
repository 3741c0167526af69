'use client';

import { useActionState } from 'react';
import { FormMessage } from '../components/form-message';
import { untouched } from '../components/form-state';
import { SubmitButton } from '../components/submit-button';
import { TextField } from '../components/text-field';
import { submitInvite } from './actions';
import { RolePicks } from './role-picks';

export function InviteForm() {
  const [state, action] = useActionState(submitInvite, untouched);
  return (
    <form action={action} noValidate>
      <FormMessage state={state} />
      <div className="formgrid">
        <TextField name="name" label="Name" state={state} autoComplete="off" maxLength={120} required />
        <TextField name="email" label="E-mail" type="email" state={state} autoComplete="off" required />
        <TextField name="initials" label="Initials" state={state} autoComplete="off" maxLength={4} required />
        <RolePicks state={state} />
      </div>
      <div className="row">
        <SubmitButton>Send the invitation</SubmitButton>
      </div>
    </form>
  );
}
