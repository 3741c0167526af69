'use client';

import { useActionState, useId } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, messageAt, untouched } from '@/app/components/form-state';
import { keepTyped } from '@/app/components/keep-typed';
import { StatusMark } from '@/app/components/status-mark';
import type { MarkDraft } from './check-desk';
import type { CheckMark, FormAction } from './check-mark';

const kinds: { kind: CheckMark['kind']; key: string; asks: string }[] = [
  { kind: 'agrees', key: 'A', asks: 'Remark, if any' },
  { kind: 'correct', key: 'C', asks: 'What is to be corrected' },
  { kind: 'query', key: 'Q', asks: 'What you ask' },
];

interface Props {
  action: FormAction;
  line: string;
  draft: MarkDraft;
  onWrite: (part: Partial<MarkDraft>) => void;
  onStep: (by: number) => void;
  onLeft: (line: string) => void;
}

/** The mark for the line in hand. */
export function MarkForm({ action, line, draft, onWrite, onStep, onLeft }: Props) {
  const id = useId();
  const leave: FormAction = async (before, form) => {
    const after: FormState = await action(before, form);
    if (after.errors.length === 0) onLeft(String(form.get('line')));
    return after;
  };
  const [state, send, pending] = useActionState(leave, untouched);
  const error = messageAt(state, 'text');
  const asks = kinds.find((k) => k.kind === draft.kind)?.asks;
  return (
    <form onSubmit={keepTyped(send)} aria-label={`Mark line ${line}`} className="grid gap-3">
      <h2 aria-live="polite">Line {line}</h2>
      <input type="hidden" name="line" value={line} />
      <fieldset className="kinds">
        <legend className="sr-only">Kind of mark</legend>
        {kinds.map(({ kind, key }) => (
          <label key={kind}>
            <input
              type="radio"
              name="kind"
              value={kind}
              checked={draft.kind === kind}
              onChange={() => onWrite({ kind })}
            />
            <StatusMark mark={kind} /> <kbd>{key}</kbd>
          </label>
        ))}
      </fieldset>
      <div className="fld">
        <label htmlFor={id}>{asks}</label>
        <div className={error ? 'wr err' : 'wr'}>
          <textarea
            id={id}
            name="text"
            className="val"
            rows={3}
            maxLength={1000}
            value={draft.text}
            onChange={(e) => onWrite({ text: e.target.value })}
            aria-invalid={error ? true : undefined}
            aria-describedby={error ? `${id}-says` : undefined}
          />
        </div>
        {error ? (
          <p id={`${id}-says`} className="ans e">
            {error}
          </p>
        ) : null}
      </div>
      <FormMessage state={state} />
      <div className="flex flex-wrap gap-2">
        <button type="submit" className={pending ? 'btn p wait' : 'btn p'} disabled={pending}>
          Leave the mark
        </button>
        <button type="button" className="btn q" onClick={() => onStep(-1)}>
          Line before <kbd>K</kbd>
        </button>
        <button type="button" className="btn q" onClick={() => onStep(1)}>
          Next line <kbd>J</kbd>
        </button>
      </div>
    </form>
  );
}
