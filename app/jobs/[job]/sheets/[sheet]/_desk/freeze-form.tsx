'use client';

import { useRouter } from 'next/navigation';
import { useId, useState, useTransition } from 'react';
import { freezeSheet } from '../actions';

interface Props {
  sheetId: string;
  number: number;
  ready: boolean;
  handOver: () => Promise<void>;
}

/** Freezes the sheet as it stands: inputs, results and written lines become a revision that nothing changes again. */
export function FreezeForm({ sheetId, number, ready, handOver }: Props) {
  const id = useId();
  const router = useRouter();
  const [open, setOpen] = useState(false);
  const [reason, setReason] = useState('');
  const [said, setSaid] = useState<string | undefined>();
  const [waiting, start] = useTransition();
  const freeze = () =>
    start(async () => {
      await handOver();
      const answer = await freezeSheet(sheetId, reason);
      if (answer.ok) router.push(answer.to);
      else setSaid(answer.message);
    });
  if (!open) {
    return (
      <div className="mgfoot">
        <button type="button" className="linkish" onClick={() => setOpen(true)} disabled={!ready}>
          Freeze<span className="wide-only"> as revision {number}</span>
        </button>
      </div>
    );
  }
  return (
    <form
      className="mgfoot freeze"
      onSubmit={(e) => {
        e.preventDefault();
        freeze();
      }}
    >
      <label htmlFor={id}>{number === 0 ? 'What it is issued for' : 'Why it changes'}</label>
      <textarea id={id} rows={3} maxLength={500} value={reason} onChange={(e) => setReason(e.target.value)} />
      <p className="ans e" role="status">
        {said ?? ''}
      </p>
      <div className="flex gap-2 justify-end">
        <button type="button" className="btn q s" onClick={() => setOpen(false)}>
          Not now
        </button>
        <button type="submit" className="btn p s" disabled={waiting || !ready}>
          Freeze
        </button>
      </div>
    </form>
  );
}
