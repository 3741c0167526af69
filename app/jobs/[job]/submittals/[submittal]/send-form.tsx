'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, messageAt, untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';

interface Props {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  reviewer: string;
  email: string;
  /** The authority's own list, to be ticked off. */
  checklist: string[];
  wish: 'link' | 'attachment';
  again: boolean;
}

/** To whom the sealed package goes, and how long the link is good. */
export function SendForm({ action, reviewer, email, checklist, wish, again }: Props) {
  const [state, send] = useActionState(action, untouched);
  const error = messageAt(state, 'seenTo');
  const seenTo = state.typed.seenTo ?? [];
  return (
    <form action={send} className="sendform" aria-label="Send">
      <TextField name="reviewer" label="Plan reviewer" state={state} initial={reviewer} maxLength={120} />
      <TextField name="email" label="E-mail" state={state} type="email" initial={email} maxLength={190} />
      <TextField name="days" label="Days the link is good" state={state} initial="60" maxLength={3} />
      <TextField
        name="action"
        label="What you ask the reviewer to do"
        state={state}
        initial="Review and record your decision."
        maxLength={200}
      />
      {checklist.length > 0 ? (
        <fieldset className="fld" key={`${seenTo.join()} ${error ?? ''}`}>
          <legend>The authority wants seen to first</legend>
          {checklist.map((line) => (
            <label key={line} className="block py-1">
              <input
                type="checkbox"
                name="seenTo"
                value={line}
                defaultChecked={seenTo.includes(line)}
                aria-describedby={error ? 'seen-to-says' : undefined}
              />{' '}
              {line}
            </label>
          ))}
          {error ? (
            <p id="seen-to-says" className="ans e">
              {error}
            </p>
          ) : null}
        </fieldset>
      ) : null}
      <p className="ans">
        {wish === 'attachment'
          ? 'The authority wants the package attached. One larger than 7 MB goes by the link alone.'
          : 'The letter carries a link; the package itself stays here.'}
      </p>
      <FormMessage state={state} />
      <SubmitButton>{again ? 'Send the submittal again' : 'Send the submittal'}</SubmitButton>
    </form>
  );
}
