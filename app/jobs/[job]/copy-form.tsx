'use client';

import { useActionState } from 'react';
import { FormMessage } from '../../components/form-message';
import { untouched } from '../../components/form-state';
import { SubmitButton } from '../../components/submit-button';
import { submitCopy } from './actions';

/** Copies a sheet into a new draft with its own number. */
export function CopyForm({ sheet, jobId }: { sheet: { id: string; number: string }; jobId: string }) {
  const [state, action] = useActionState(submitCopy, untouched);
  return (
    <form action={action}>
      <input type="hidden" name="sheetId" value={sheet.id} />
      <input type="hidden" name="jobId" value={jobId} />
      <SubmitButton tone="plain" small>
        Copy<span className="sr-only"> {sheet.number}</span>
      </SubmitButton>
      <FormMessage state={state} />
    </form>
  );
}
