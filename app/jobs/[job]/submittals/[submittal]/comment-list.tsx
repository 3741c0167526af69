import type { FormState } from '@/app/components/form-state';
import { StatusMark } from '@/app/components/status-mark';
import type { openSubmittal } from '@/lib/services/open-submittal';
import { AnswerForm } from './answer-form';

interface Props extends Pick<Awaited<ReturnType<typeof openSubmittal>>, 'comments' | 'sheets'> {
  /** Absent for those who do not answer. */
  answer: ((commentId: string, state: FormState, form: FormData) => Promise<FormState>) | undefined;
}

/** What the reviewer asked, how it stands, and the newest answer. An answer can follow until one is accepted. */
export function CommentList({ comments, sheets, answer }: Props) {
  return (
    <section>
      <h2>Comments</h2>
      <ol className="plain">
        {comments.map((c) => (
          <li key={c.id}>
            <p>
              <b>{c.number}</b> {sheets.find((s) => s.revisionId === c.revision_id)?.number} line {c.line}
              {c.code === '' ? '' : `, ${c.code}`} <StatusMark mark={c.state} />
            </p>
            <p>{c.text}</p>
            {c.answer === null ? null : (
              <p className="i2">
                Answer: {c.answer}
                {c.place ? ` (${c.place})` : ''}
              </p>
            )}
            {answer && (c.state === 'open' || c.state === 'reopened') ? (
              <AnswerForm action={answer.bind(null, c.id)} number={c.number} />
            ) : null}
          </li>
        ))}
      </ol>
    </section>
  );
}
