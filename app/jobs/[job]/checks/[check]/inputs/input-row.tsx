'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { untouched } from '@/app/components/form-state';
import { StatusMark } from '@/app/components/status-mark';
import { TextField } from '@/app/components/text-field';
import type { CheckMark, FormAction } from '../check-mark';

interface Props {
  input: { place: string; value: string; mark: Pick<CheckMark, 'kind' | 'text' | 'drawing'> | undefined };
  /** Absent for those who only read. */
  action: FormAction | undefined;
}

/** One input: what is written, how it stands, and the checker's mark. */
export function InputRow({ input, action }: Props) {
  const { place, value, mark } = input;
  return (
    <li>
      <div>
        <b>{place}</b>
        <p className="inputvalue">{value}</p>
        {mark ? (
          <p>
            <StatusMark mark={mark.kind} /> {[mark.drawing, mark.text].filter(Boolean).join(': ')}
          </p>
        ) : (
          <p className="ans">not held against a drawing yet</p>
        )}
      </div>
      {action ? <InputForm place={place} mark={mark} action={action} /> : null}
    </li>
  );
}

function InputForm({
  place,
  mark,
  action,
}: {
  place: string;
  mark: Props['input']['mark'];
  action: FormAction;
}) {
  const [state, send, pending] = useActionState(action, untouched);
  return (
    <form action={send} aria-label={`Mark ${place}`} className="inputform">
      <TextField name="drawing" label="Drawing" state={state} initial={mark?.drawing} maxLength={120} />
      <TextField
        name="text"
        label="What is to be corrected or asked"
        state={state}
        initial={mark?.text}
        maxLength={1000}
      />
      <div className="flex flex-wrap gap-2">
        <button type="submit" name="kind" value="agrees" className="btn s" disabled={pending}>
          Agrees
        </button>
        <button type="submit" name="kind" value="correct" className="btn s q" disabled={pending}>
          Correct this
        </button>
        <button type="submit" name="kind" value="query" className="btn s q" disabled={pending}>
          Query
        </button>
      </div>
      <FormMessage state={state} />
    </form>
  );
}
