'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { TextField } from '@/app/components/text-field';
import type { ReviewAction } from './review-desk';

/** The back-check of one answer. */
export function SettleForm({ action, number }: { action: ReviewAction; number: number }) {
  const [state, send, pending] = useActionState(action, untouched);
  return (
    <form action={send} aria-label={`Answer to comment ${number}`}>
      <TextField
        name="text"
        label={`Still asked for under comment ${number}, when it is opened again`}
        state={state}
        lines={2}
        maxLength={2000}
      />
      <FormMessage state={state} />
      <div className="flex flex-wrap gap-2">
        <button type="submit" name="outcome" value="accepted" className="btn s" disabled={pending}>
          Accept the answer
        </button>
        <button type="submit" name="outcome" value="reopened" className="btn s" disabled={pending}>
          Open it again
        </button>
      </div>
    </form>
  );
}
