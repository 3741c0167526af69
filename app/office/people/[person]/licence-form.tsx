'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';

/** A licence as it stands in the register of its jurisdiction. */
export function LicenceForm({
  action,
}: {
  action: (state: FormState, form: FormData) => Promise<FormState>;
}) {
  const [state, send] = useActionState(action, untouched);
  return (
    <form action={send} noValidate aria-label="Enter a licence">
      <FormMessage state={state} />
      <div className="formgrid">
        <TextField name="jurisdiction" label="Jurisdiction" state={state} maxLength={80} required />
        <TextField
          name="profession"
          label="Profession, as on the licence"
          state={state}
          maxLength={80}
          required
        />
        <TextField name="number" label="Licence number" state={state} maxLength={40} required />
        <TextField name="expires" label="Last day in force" type="date" state={state} required />
      </div>
      <div className="row">
        <SubmitButton>Enter the licence</SubmitButton>
      </div>
    </form>
  );
}
