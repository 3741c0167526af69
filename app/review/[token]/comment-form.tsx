'use client';

import { useActionState, useId, useRef } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { keepTyped } from '@/app/components/keep-typed';
import { TextField } from '@/app/components/text-field';
import type { ReviewAction } from './review-desk';

interface Place {
  revisionId: string;
  line: string;
}

interface Props {
  action: ReviewAction;
  place: Place | undefined;
  sheets: { revisionId: string; number: string; lines: string[] }[];
  onPlace: (place: Place) => void;
}

/** A comment pinned to a line, chosen on the page or from the list. */
export function CommentForm({ action, place, sheets, onPlace }: Props) {
  const id = useId();
  const form = useRef<HTMLFormElement>(null);
  const pin: ReviewAction = async (before, sent) => {
    const after = await action(before, sent);
    if (after.errors.length === 0) form.current?.reset();
    return after;
  };
  const [state, send, pending] = useActionState(pin, untouched);
  const value = place ? `${place.revisionId}|${place.line}` : '';
  return (
    <form ref={form} onSubmit={keepTyped(send)} aria-label="Comment">
      <h2>Comment</h2>
      <input type="hidden" name="place" value={value} />
      <div className="fld">
        <label htmlFor={id}>On line</label>
        <div className="wr">
          <select
            id={id}
            key={state.done}
            className="val"
            value={value}
            onChange={(e) => {
              const [revisionId = '', line = ''] = e.target.value.split('|');
              onPlace({ revisionId, line });
            }}
          >
            {sheets.flatMap((s) =>
              s.lines.map((line) => (
                <option key={`${s.revisionId}|${line}`} value={`${s.revisionId}|${line}`}>
                  {s.number}, line {line}
                </option>
              )),
            )}
          </select>
        </div>
      </div>
      <TextField name="text" label="What you ask for" state={state} lines={4} maxLength={2000} />
      <TextField name="code" label="Code, if one asks for it" state={state} maxLength={200} />
      <FormMessage state={state} />
      <div>
        <button type="submit" className={pending ? 'btn p wait' : 'btn p'} disabled={pending}>
          Pin the comment
        </button>
      </div>
    </form>
  );
}
