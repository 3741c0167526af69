import type { Metadata } from 'next';
import Link from 'next/link';
import { Hung } from '@/app/components/ledger';
import { Page } from '@/app/components/page-layout';
import { sayDate } from '@/app/components/say-date';
import { StatusMark } from '@/app/components/status-mark';
import { orRefuse, requireActor } from '@/app/session';
import { openComments } from '@/lib/services/open-comments';
import { makers } from '@/lib/services/require-role';
import { answer } from '../submittals/[submittal]/actions';
import { AnswerForm } from '../submittals/[submittal]/answer-form';

interface Props {
  params: Promise<{ job: string }>;
}

export const metadata: Metadata = { title: 'Comments' };

const said = { answered: 'Answer', accepted: 'Accepted', reopened: 'Asked again' } as const;

/** The comment register of a job: every comment of every round, how it stands, and all that was said under it. */
export default async function CommentsPage({ params }: Props) {
  const actor = await requireActor();
  const { job, comments } = await orRefuse(openComments(actor, (await params).job));
  const mayAnswer = actor.roles.some((r) => makers.includes(r));
  const path = `/jobs/${job.id}/comments`;
  const waits = comments.filter((c) => c.state === 'open' || c.state === 'reopened');
  return (
    <Page
      wide
      path={[
        { label: 'Jobs', href: '/jobs' },
        { label: `${job.number} ${job.title}`, href: `/jobs/${job.id}` },
        { label: 'Comments' },
      ]}
      actor={actor}
      foot={[
        <span key="office">
          <b>{actor.officeName}</b>
        </span>,
        job.number,
        comments.length === 1 ? '1 comment' : `${comments.length} comments`,
        `${waits.length} to answer`,
        <span key="zone" className="end">{`Times in ${actor.zone}`}</span>,
      ]}
    >
      <Hung at="top" number={job.number}>
        <h1>Comments</h1>
        {comments.length === 0 ? (
          <p className="i2">No reviewer has commented on this job yet.</p>
        ) : (
          <p className="i2 max-w-[676px]">
            {waits.length === 0
              ? 'Every comment is answered.'
              : 'Nothing more of this job is sent until these are answered.'}{' '}
            <a className="t" href={`${path}/letter`}>
              The answers as PDF
            </a>
            ; the next package carries them on its last pages, as they stand when it is printed.
          </p>
        )}
      </Hung>
      <ol className="ruledlist mt-4">
        {comments.map((c) => (
          <li key={c.id}>
            <Hung number={`${c.round}.${c.number}`}>
              <div className="max-w-[760px]">
                <p>
                  <Link className="t" href={`/jobs/${job.id}/submittals/${c.submittalId}`}>
                    Submittal {c.round}
                  </Link>
                  , {c.about}
                  {c.code === '' ? '' : `, ${c.code}`} <StatusMark mark={c.state} />
                </p>
                <p>{c.text}</p>
                <small className="i2 block">
                  {c.author}, {sayDate(c.at, actor.zone)}
                </small>
                {c.said.map((s) => (
                  <p key={`${s.kind} ${s.date} ${s.text}`} className="i2 mt-1">
                    <em>{said[s.kind]}</em>
                    {s.text === '' ? '' : `: ${s.text}`}
                    {s.place === '' ? '' : ` (${s.place})`}
                    <small className="block">
                      {s.author}, {sayDate(new Date(s.date), 'UTC')}
                    </small>
                  </p>
                ))}
                {mayAnswer && (c.state === 'open' || c.state === 'reopened') ? (
                  <AnswerForm action={answer.bind(null, path, c.id)} number={c.number} />
                ) : null}
              </div>
            </Hung>
          </li>
        ))}
      </ol>
    </Page>
  );
}
