'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, messageAt, untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';

interface Props {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  sheets: {
    number: string;
    title: string;
    revisionId: string | null;
    why: string;
    revision: number | null;
  }[];
}

/** Checked sheets to choose from; the others are listed with what they lack. */
export function GatherForm({ action, sheets }: Props) {
  const [state, send] = useActionState(action, untouched);
  const error = messageAt(state, 'revisionIds');
  return (
    <form action={send} className="gather">
      <fieldset>
        <legend>Sheets that go out</legend>
        {sheets.map((s) => (
          <label key={s.number} className="block py-2">
            <input
              type="checkbox"
              name="revisionIds"
              value={s.revisionId ?? ''}
              disabled={s.revisionId === null}
              defaultChecked={s.revisionId !== null}
            />{' '}
            {s.number} {s.title}
            <span className="text-ink2">
              {s.revisionId === null ? `, ${s.why}` : `, revision ${s.revision}`}
            </span>
          </label>
        ))}
      </fieldset>
      {error ? <p className="ans e">{error}</p> : null}
      <TextField name="purpose" label="Purpose" state={state} initial="for permit" maxLength={200} />
      <TextField name="remarks" label="Remarks to the reviewer" state={state} lines={4} maxLength={2000} />
      <FormMessage state={state} />
      <SubmitButton>Print the package</SubmitButton>
    </form>
  );
}
