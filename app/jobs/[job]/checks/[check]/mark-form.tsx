'use client';

import { useActionState, useId } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';
import type { CheckMark, FormAction } from './check-desk';

const kinds: { value: CheckMark['kind']; label: string; key: string }[] = [
  { value: 'agrees', label: 'agrees', key: 'A' },
  { value: 'correct', label: 'correct this', key: 'C' },
  { value: 'query', label: 'query', key: 'Q' },
];

interface Props {
  action: FormAction;
  line: string;
  lines: string[];
  kind: CheckMark['kind'];
  onLine: (line: string) => void;
  onKind: (kind: CheckMark['kind']) => void;
}

/** The mark for the line in hand. */
export function MarkForm({ action, line, lines, kind, onLine, onKind }: Props) {
  const id = useId();
  const [state, send] = useActionState(action, untouched);
  return (
    <form action={send} aria-label="Mark" className="grid gap-3">
      <div className="fld">
        <label htmlFor={id}>Line</label>
        <div className="wr">
          <select id={id} name="line" className="val" value={line} onChange={(e) => onLine(e.target.value)}>
            {lines.map((l) => (
              <option key={l} value={l}>
                {l}
              </option>
            ))}
          </select>
        </div>
      </div>
      <fieldset>
        <legend className="sr-only">Kind of mark</legend>
        {kinds.map((k) => (
          <label key={k.value} className="block py-1">
            <input
              type="radio"
              name="kind"
              value={k.value}
              checked={kind === k.value}
              onChange={() => onKind(k.value)}
            />{' '}
            {k.label} <kbd>{k.key}</kbd>
          </label>
        ))}
      </fieldset>
      <TextField name="text" label="Reason" state={state} lines={3} maxLength={1000} />
      <FormMessage state={state} />
      <SubmitButton tone="plain">Leave the mark</SubmitButton>
    </form>
  );
}
