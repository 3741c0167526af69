'use client';

import { StatusMark } from '@/app/components/status-mark';
import { type CheckMark, type MarkAction, stateShape } from './check-mark';
import { MarkAnswer } from './mark-answer';
import { SettleForm } from './settle-form';

interface Props {
  marks: CheckMark[];
  mayAnswer: boolean;
  onAnswer: MarkAction;
  /** The checker's word on an answer; absent for everyone else. */
  onSettle?: MarkAction;
}

/** Every mark with all that was said about it. The originator answers here, the checker accepts or opens again. */
export function MarkList({ marks, mayAnswer, onAnswer, onSettle }: Props) {
  if (marks.length === 0) return <p className="ans">No marks yet.</p>;
  return (
    <section>
      <h2>Marks</h2>
      <ol className="marklist">
        {marks.map((m) => (
          <li key={m.id}>
            <StatusMark mark={m.kind} /> {m.where}
            {m.drawing === '' ? null : <span className="ans">, {m.drawing}</span>}
            {m.state === 'agrees' ? null : (
              <span className="markstate">
                <StatusMark {...stateShape[m.state]} />
              </span>
            )}
            {m.text === '' ? null : <p>{m.text}</p>}
            {m.steps.map((s) => (
              <p key={`${s.kind} ${s.at} ${s.text}`} className="markstep">
                {s.text === '' ? null : <>{s.text} </>}
                <span className="ans">
                  {s.kind === 'agrees' ? '' : stateShape[s.kind].word}, {s.by}, {s.at}
                </span>
              </p>
            ))}
            {mayAnswer && (m.state === 'open' || m.state === 'reopened') ? (
              <MarkAnswer action={onAnswer.bind(null, m.id)} where={m.where} />
            ) : null}
            {onSettle && m.state === 'answered' ? (
              <SettleForm action={onSettle.bind(null, m.id)} where={m.where} />
            ) : null}
          </li>
        ))}
      </ol>
    </section>
  );
}
