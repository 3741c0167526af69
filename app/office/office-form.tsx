'use client';

import { useActionState } from 'react';
import { ChoiceField } from '../components/choice-field';
import { FormMessage } from '../components/form-message';
import { untouched } from '../components/form-state';
import { SubmitButton } from '../components/submit-button';
import { TextField } from '../components/text-field';
import { submitOffice } from './actions';

const answers = [
  { value: 'no', label: 'no' },
  { value: 'yes', label: 'yes' },
];

/** What the office settles for everybody in it. */
export function OfficeForm({ lateAfter, sealNeedsSecond }: { lateAfter: number; sealNeedsSecond: boolean }) {
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
        <ChoiceField
          name="sealNeedsSecond"
          label="Sealing asks for a second factor"
          state={state}
          options={answers}
          initial={sealNeedsSecond ? 'yes' : 'no'}
          note="Then only who signs in with a code seals."
        />
      </div>
      <div className="row">
        <SubmitButton>Keep the settings</SubmitButton>
      </div>
    </form>
  );
}
