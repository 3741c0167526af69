'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { messageAt, untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import type { ReviewAction } from './review-desk';

interface Props {
  action: ReviewAction;
  decisions: string[];
  comments: number;
}

/** The decision in the authority's own words. */
export function DecisionForm({ action, decisions, comments }: Props) {
  const [state, send] = useActionState(action, untouched);
  const error = messageAt(state, 'words');
  return (
    <form action={send} aria-label="Decision">
      <fieldset className="decisions">
        <legend>
          <h2>Decision</h2>
        </legend>
        {decisions.map((words) => (
          <label key={words}>
            <input type="radio" name="words" value={words} /> {words}
          </label>
        ))}
      </fieldset>
      {error ? <p className="ans e">{error}</p> : null}
      <FormMessage state={state} />
      <SubmitButton>Record the decision</SubmitButton>
      <p className="ans">
        {comments === 1 ? 'One comment goes with it.' : `${comments} comments go with it.`}
      </p>
    </form>
  );
}
