import { StatusMark } from '@/app/components/status-mark';
import type { ReviewComment, SettleAction } from './review-desk';
import { SettleForm } from './settle-form';

interface Props {
  title: string;
  comments: ReviewComment[];
  onSettle: SettleAction;
}

/** Comments with their answers; an answered one is accepted or opened again here. */
export function CommentList({ title, comments, onSettle }: Props) {
  if (comments.length === 0) return null;
  return (
    <section>
      <h2>{title}</h2>
      <ol className="commentlist">
        {comments.map((c) => (
          <li key={c.id}>
            <span className="pin">{c.number}</span> {c.text}
            <small>
              {c.where}
              {c.code === '' ? '' : `, ${c.code}`} <StatusMark mark={c.state} />
            </small>
            {c.answer === null ? null : <p>Answer: {c.answer}</p>}
            {c.state === 'answered' ? (
              <SettleForm action={onSettle.bind(null, c.id)} number={c.number} />
            ) : null}
          </li>
        ))}
      </ol>
    </section>
  );
}
