'use client';

import { useActionState } from 'react';
import { FormMessage } from '../components/form-message';
import { untouched } from '../components/form-state';
import { SubmitButton } from '../components/submit-button';
import { TextField } from '../components/text-field';
import { submitToken } from './actions';
import type { TokenState } from './token-state';

/** Issues an access token for a program of the engineer's own. */
export function TokenForm() {
  const [state, action] = useActionState<TokenState, FormData>(submitToken, untouched);
  return (
    <form action={action} noValidate>
      <FormMessage state={state} />
      {state.token ? (
        <p className="message done" role="status">
          The token, shown this once: <code className="[overflow-wrap:anywhere]">{state.token}</code>
        </p>
      ) : null}
      <div className="formgrid">
        <TextField name="name" label="What it is for" state={state} maxLength={80} required />
        <TextField name="days" label="Days it is good" state={state} initial="90" required />
      </div>
      <div className="row">
        <SubmitButton>Issue a token</SubmitButton>
      </div>
    </form>
  );
}
