'use client';

import { useActionState } from 'react';
import { ChoiceField } from '@/app/components/choice-field';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';
import type { Role } from '@/lib/services/actor';
import { RolePicks } from '../../role-picks';

interface Props {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  person: { name: string; initials: string; roles: Role[]; organisation: string; active: boolean };
}

const accounts = [
  { value: 'open', label: 'open' },
  { value: 'closed', label: 'closed: cannot sign in' },
];

/** Name, initials, roles and account of one person. */
export function PersonForm({ action, person }: Props) {
  const [state, send] = useActionState(action, untouched);
  return (
    <form action={send} noValidate>
      <FormMessage state={state} />
      <div className="formgrid">
        <TextField name="name" label="Name" state={state} initial={person.name} maxLength={120} required />
        <TextField
          name="initials"
          label="Initials"
          state={state}
          initial={person.initials}
          maxLength={4}
          required
        />
        <TextField
          name="organisation"
          label="Organisation"
          state={state}
          initial={person.organisation}
          maxLength={120}
          note="Only for a checker of another organisation; blank means this office."
        />
        <RolePicks state={state} initial={person.roles} />
        <ChoiceField
          name="account"
          label="Account"
          state={state}
          options={accounts}
          initial={person.active ? 'open' : 'closed'}
        />
      </div>
      <div className="row">
        <SubmitButton>Keep the change</SubmitButton>
      </div>
    </form>
  );
}
