'use client';

import { useActionState } from 'react';
import type { Role } from '@/lib/services/actor';
import { FormMessage } from '../components/form-message';
import { messageAt, untouched } from '../components/form-state';
import { SubmitButton } from '../components/submit-button';
import { TextField } from '../components/text-field';
import { submitInvite } from './actions';
import { roleWords } from './role-words';

export function InviteForm() {
  const [state, action] = useActionState(submitInvite, untouched);
  const error = messageAt(state, 'roles');
  const picked = state.typed.roles ?? [];
  return (
    <form action={action} noValidate>
      <FormMessage state={state} />
      <div className="formgrid">
        <TextField name="name" label="Name" state={state} autoComplete="off" maxLength={120} required />
        <TextField name="email" label="E-mail" type="email" state={state} autoComplete="off" required />
        <TextField name="initials" label="Initials" state={state} autoComplete="off" maxLength={4} required />
        <fieldset className="fld whole">
          <legend>Roles</legend>
          <div className="picks" key={picked.join()}>
            {(Object.keys(roleWords) as Role[]).map((role) => (
              <label key={role}>
                <input type="checkbox" name="roles" value={role} defaultChecked={picked.includes(role)} />
                {roleWords[role]}
              </label>
            ))}
          </div>
          {error ? <p className="ans e">{error}</p> : null}
        </fieldset>
      </div>
      <div className="row">
        <SubmitButton>Send the invitation</SubmitButton>
      </div>
    </form>
  );
}
