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
  const [state, send, pending] = useActionState(action, untouched);
  const error = messageAt(state, 'revisionIds');
  // After a refusal the choice made stands; before it, every checked sheet is chosen.
  const sent = state !== untouched;
  const chosen = state.typed.revisionIds ?? [];
  if (sheets.every((s) => s.revisionId === null))
    return (
      <>
        <p>No sheet of this job is checked yet. Only checked sheets go out.</p>
        <ul className="plainlist">
          {sheets.map((s) => (
            <li key={s.number}>
              {s.number} {s.title}, {s.why}
            </li>
          ))}
        </ul>
      </>
    );
  return (
    <form action={send} className="gather">
      <fieldset>
        <legend>Sheets that go out</legend>
        {sheets.map((s) => (
          <label key={`${s.number} ${chosen.join()}`} className="block py-2">
            <input
              type="checkbox"
              name="revisionIds"
              value={s.revisionId ?? ''}
              disabled={s.revisionId === null}
              defaultChecked={s.revisionId !== null && (!sent || chosen.includes(s.revisionId))}
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
      <SubmitButton>{pending ? 'Drawing the package …' : 'Print the package'}</SubmitButton>
    </form>
  );
}
