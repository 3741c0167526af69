'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { StatusMark } from '@/app/components/status-mark';
import type { EarlierMark, FormAction, MarkAction } from './check-mark';

interface Props {
  marks: EarlierMark[];
  /** Absent for those who only read. */
  onVerify?: MarkAction;
}

/** What earlier revisions left open: the checker says of each whether it was corrected. */
export function EarlierMarks({ marks, onVerify }: Props) {
  if (marks.length === 0) return null;
  return (
    <section>
      <h2>Open in earlier revisions</h2>
      <ol className="marklist">
        {marks.map((m) => (
          <li key={m.id}>
            <StatusMark mark={m.kind} /> {m.where}, revision {m.revision}
            {m.text === '' ? null : <p>{m.text}</p>}
            {onVerify ? <VerifyForm action={onVerify.bind(null, m.id)} where={m.where} /> : null}
          </li>
        ))}
      </ol>
    </section>
  );
}

function VerifyForm({ action, where }: { action: FormAction; where: string }) {
  const [state, send, pending] = useActionState(action, untouched);
  return (
    <form action={send} aria-label={`Verify ${where}`}>
      <FormMessage state={state} />
      <div className="flex flex-wrap gap-2">
        <button type="submit" name="outcome" value="verified" className="btn s" disabled={pending}>
          Verified
        </button>
        <button type="submit" name="outcome" value="carried" className="btn s q" disabled={pending}>
          Not corrected: carry on
        </button>
      </div>
    </form>
  );
}
