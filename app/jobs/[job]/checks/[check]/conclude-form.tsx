'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { TextField } from '@/app/components/text-field';
import type { FormAction } from './check-desk';

/** Agrees the whole sheet, or returns it. */
export function ConcludeForm({ action }: { action: FormAction }) {
  const [state, send, pending] = useActionState(action, untouched);
  return (
    <form action={send} aria-label="Conclude" className="grid gap-3">
      <TextField name="note" label="Note on the whole sheet" state={state} lines={2} maxLength={1000} />
      <FormMessage state={state} />
      <div className="flex gap-3">
        <button type="submit" name="outcome" value="agreed" className="btn p" disabled={pending}>
          Agree the sheet
        </button>
        <button type="submit" name="outcome" value="returned" className="btn" disabled={pending}>
          Return it
        </button>
      </div>
    </form>
  );
}
