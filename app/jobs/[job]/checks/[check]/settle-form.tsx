'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { TextField } from '@/app/components/text-field';
import type { FormAction } from './check-mark';

/** The checker's word on an answer: accepted, or opened again with the reason. */
export function SettleForm({ action, where }: { action: FormAction; where: string }) {
  const [state, send, pending] = useActionState(action, untouched);
  return (
    <form action={send} aria-label={`Settle ${where}`}>
      <TextField
        name="text"
        label="Remark, or what is still asked for"
        state={state}
        lines={2}
        maxLength={1000}
      />
      <FormMessage state={state} />
      <div className="flex flex-wrap gap-2">
        <button type="submit" name="outcome" value="accepted" className="btn s" disabled={pending}>
          Accept the answer
        </button>
        <button type="submit" name="outcome" value="reopened" className="btn s q" disabled={pending}>
          Open again
        </button>
      </div>
    </form>
  );
}
