'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { messageAt, untouched } from '@/app/components/form-state';
import { TextField } from '@/app/components/text-field';
import { declarationWords, needsDeclaration } from '@/lib/model/independence';
import type { FormAction } from './check-mark';

/** Agrees the whole sheet, or returns it; categories 2 and 3 ask for the checker's declaration. */
export function ConcludeForm({ action, category }: { action: FormAction; category: number }) {
  const [state, send, pending] = useActionState(action, untouched);
  const error = messageAt(state, 'declared');
  return (
    <form action={send} aria-label="Conclude" className="grid gap-3">
      <TextField name="note" label="Note on the whole sheet" state={state} lines={2} maxLength={1000} />
      {needsDeclaration(category) ? (
        <div>
          <label className="declare">
            <input
              type="checkbox"
              name="declared"
              value="yes"
              key={state.typed.declared?.[0]}
              defaultChecked={state.typed.declared?.[0] === 'yes'}
            />
            {declarationWords}
          </label>
          {error ? <p className="ans e">{error}</p> : null}
        </div>
      ) : null}
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
