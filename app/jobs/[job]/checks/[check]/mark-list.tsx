'use client';

import { useActionState } from 'react';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, untouched } from '@/app/components/form-state';
import { StatusMark } from '@/app/components/status-mark';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';
import type { CheckMark } from './check-desk';

interface Props {
  marks: CheckMark[];
  mayAnswer: boolean;
  onAnswer: (markId: string, state: FormState, form: FormData) => Promise<FormState>;
}

/** Every mark with its answer; the originator answers here. */
export function MarkList({ marks, mayAnswer, onAnswer }: Props) {
  if (marks.length === 0) return <p className="ans">No marks yet.</p>;
  return (
    <section>
      <h2>Marks</h2>
      <ol className="marklist">
        {marks.map((m) => (
          <li key={m.id}>
            <StatusMark mark={m.kind} /> line {m.line}
            {m.text === '' ? null : <p>{m.text}</p>}
            {m.answer === null ? null : <p>Answer: {m.answer}</p>}
            {m.answer === null && mayAnswer && m.kind !== 'agrees' ? (
              <MarkAnswer action={onAnswer.bind(null, m.id)} line={m.line} />
            ) : null}
          </li>
        ))}
      </ol>
    </section>
  );
}

function MarkAnswer({
  action,
  line,
}: {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  line: string;
}) {
  const [state, send] = useActionState(action, untouched);
  return (
    <form action={send} aria-label={`Answer at line ${line}`}>
      <TextField name="answer" label={`Answer at line ${line}`} state={state} lines={2} maxLength={1000} />
      <FormMessage state={state} />
      <SubmitButton small>Record the answer</SubmitButton>
    </form>
  );
}
