'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, messageAt, untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';

interface Props {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  legend: string;
  note: string;
  /** One person has this part at most. */
  single?: boolean;
  people: { id: string; name: string }[];
  named: string[];
}

/** Who has one part in a job. */
export function PartForm({ action, legend, note, single = false, people, named }: Props) {
  const [state, send] = useActionState(action, untouched);
  const refused = messageAt(state, 'personIds');
  const chosen = refused ? (state.typed.personIds ?? []) : named;
  const kind = single ? 'radio' : 'checkbox';
  const choices = single ? [{ id: '', name: 'not named' }, ...people] : people;
  return (
    <form action={send} aria-label={legend} className="max-w-[676px] mt-4">
      <fieldset className="fld" key={chosen.join()}>
        <legend>{legend}</legend>
        {people.length === 0 ? <p className="i2">Nobody in the office has this role.</p> : null}
        <div className="picks">
          {choices.map((p) => (
            <label key={p.id}>
              <input
                type={kind}
                name="personIds"
                value={p.id}
                defaultChecked={p.id === '' ? chosen.length === 0 : chosen.includes(p.id)}
              />
              {p.name}
            </label>
          ))}
        </div>
        <p className={refused ? 'ans e' : 'ans'}>{refused ?? note}</p>
      </fieldset>
      <FormMessage state={state} />
      <SubmitButton tone="plain" small>
        Keep<span className="sr-only"> {legend}</span>
      </SubmitButton>
    </form>
  );
}
