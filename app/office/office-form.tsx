'use client';

import { useActionState } from 'react';
import { FormMessage } from '../components/form-message';
import { untouched } from '../components/form-state';
import { SubmitButton } from '../components/submit-button';
import { TextField } from '../components/text-field';
import { submitOffice } from './actions';

/** What the office settles for everybody in it. */
export function OfficeForm({ lateAfter }: { lateAfter: number }) {
  const [state, action] = useActionState(submitOffice, untouched);
  return (
    <form action={action} noValidate aria-label="Settings of the office">
      <FormMessage state={state} />
      <div className="formgrid">
        <TextField
          name="lateAfter"
          label="Days after which waiting is late"
          state={state}
          initial={String(lateAfter)}
          maxLength={3}
          note="Marks what waits on the list of each person. Nothing is sent and nothing ends by it."
        />
      </div>
      <div className="row">
        <SubmitButton>Keep the settings</SubmitButton>
      </div>
    </form>
  );
}
