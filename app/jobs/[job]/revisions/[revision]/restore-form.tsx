'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, untouched } from '@/app/components/form-state';

interface Props {
  number: number;
  action: (state: FormState) => Promise<FormState>;
}

/** Goes back to a frozen revision: its inputs become the newest draft. */
export function RestoreForm({ number, action }: Props) {
  const [state, send] = useActionState(action, untouched);
  return (
    <form action={send} className="restore">
      <FormMessage state={state} />
      <button type="submit" className="linkish">
        Make revision {number} the draft again
      </button>
      <p className="ans">The draft of now stays in the history.</p>
    </form>
  );
}
