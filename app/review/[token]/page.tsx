import type { Metadata } from 'next';
import { Page } from '@/app/components/page-layout';
import { sayDate } from '@/app/components/say-date';
import { requestAddress } from '@/app/session';
import { openReview, reviewDoor } from '@/lib/services/open-review';
import { comment, decide, settle } from './actions';
import { type ReviewComment, ReviewDesk } from './review-desk';
import './review.css';

interface Props {
  params: Promise<{ token: string }>;
}

export const metadata: Metadata = { title: 'Review', robots: { index: false } };

const shut = {
  unknown: ['This link opens nothing', 'It may be cut off. Open it again from the letter, as a whole.'],
  expired: ['This link has run out', 'Ask the office for a new one. What was said here stays in the record.'],
  revoked: ['This link was revoked', 'The office closed it. What was said here stays in the record.'],
  'too-often': ['Too many requests', 'Wait a quarter of an hour, then open the link again.'],
} as const;

/** The reviewer's desk: no account, one submittal. */
export default async function ReviewPage({ params }: Props) {
  const { token } = await params;
  const door = await reviewDoor(token, await requestAddress());
  if (!door.open) {
    const [title, words] = shut[door.why];
    return (
      <Page path={[{ label: 'Review' }]} foot={[]}>
        <div className="in">
          <h1>{title}</h1>
          <p>{words}</p>
        </div>
      </Page>
    );
  }
  const review = await openReview(door.link);
  const { job, submittal, sealed } = review;
  const at = (revisionId: string | null, line: string) =>
    `${review.sheets.find((s) => s.revisionId === revisionId)?.number ?? 'package'}, line ${line}`;
  return (
    <Page
      path={[{ label: `${job.number} ${job.title}` }, { label: `Submittal ${submittal.number}` }]}
      margin={
        <>
          <div className="bigno">{submittal.pages}</div>
          <div className="under">
            pages, {review.sheets.length === 1 ? 'one sheet' : `${review.sheets.length} sheets`}
          </div>
          <ol className="pagesteps" aria-label="Sheets">
            {review.sheets.map((s) => (
              <li key={s.revisionId}>
                <a href={`#${s.number}`}>{s.number}</a>
              </li>
            ))}
          </ol>
        </>
      }
      foot={[
        `review for ${door.link.reviewer}, good until ${sayDate(door.link.expires_at, 'UTC')}`,
        sealed ? `sealed by ${sealed.by}, ${sayDate(sealed.at, 'UTC')}` : 'not sealed',
        <a key="verify" className="t" href="/verify">
          Verify a file
        </a>,
      ]}
    >
      <ReviewDesk
        purpose={submittal.purpose}
        remarks={submittal.remarks}
        sheets={review.sheets}
        comments={review.comments.map((c) => seen(c, at(c.revision_id, c.line)))}
        earlier={review.earlier.map((c) => seen(c, `submittal ${c.submittal}, line ${c.line}`))}
        decisions={review.decisions}
        decision={
          review.decision && {
            words: review.decision.words,
            author: review.decision.author,
            at: sayDate(review.decision.at, 'UTC'),
          }
        }
        file={`/review/${token}/file`}
        onComment={comment.bind(null, token)}
        onDecide={decide.bind(null, token)}
        onSettle={settle.bind(null, token)}
      />
    </Page>
  );
}

type Comment = Awaited<ReturnType<typeof openReview>>['comments'][number];

function seen(c: Comment, where: string): ReviewComment {
  const { id, number, revision_id: revisionId, line, code, text, answer, state } = c;
  return { id, number, revisionId, line, code, text, answer, state, where };
}
