import type { Metadata } from 'next';
import Link from 'next/link';
import { Page } from '@/app/components/page-layout';
import { sayDate, sayMoment } from '@/app/components/say-date';
import { orRefuse, requireActor } from '@/app/session';
import { openSubmittal } from '@/lib/services/open-submittal';
import { answer, revoke, send } from './actions';
import { AnswerForm } from './answer-form';
import { SendForm } from './send-form';
import './submittal.css';

interface Props {
  params: Promise<{ job: string; submittal: string }>;
}

export const metadata: Metadata = { title: 'Submittal' };

/** One submittal: what is in it, whether it is sealed, where it went, what came back. */
export default async function SubmittalPage({ params }: Props) {
  const actor = await requireActor();
  const { submittal: id } = await params;
  const { job, submittal, sheets, file, authority, transmittals, mails, links, comments, decision } =
    await orRefuse(openSubmittal(actor, id));
  const path = `/jobs/${job.id}/submittals/${id}`;
  return (
    <Page
      actor={actor}
      path={[
        { label: `${job.number} ${job.title}`, href: `/jobs/${job.id}` },
        { label: `Submittal ${submittal.number}` },
      ]}
      margin={
        <>
          <div className="bigno">{submittal.number}</div>
          <div className="under">submittal, {submittal.state}</div>
        </>
      }
      foot={[
        actor.officeName,
        job.number,
        `submittal ${submittal.number}`,
        `${submittal.pages} pages`,
        `times in ${actor.zone}`,
      ]}
    >
      <div className="in submittal">
        <h1>
          Submittal {submittal.number}, {submittal.purpose}
        </h1>
        {decision ? (
          <p className="message done">
            {decision.author} decided on {sayDate(decision.at, actor.zone)}: <b>{decision.words}</b>
          </p>
        ) : null}
        <section>
          <h2>Package</h2>
          <p>
            <a className="t" href={`${path}/file`}>
              {file.kind === 'sealed' ? 'The sealed package' : 'The package, not sealed yet'}
            </a>
            , {submittal.pages} pages, {(file.size / 1024).toFixed(0)} kB, SHA-256 {file.sha256.slice(0, 16)}{' '}
            …
          </p>
          {file.signedBy ? (
            <p>
              Sealed by {file.signedBy}, {sayMoment(file.madeAt, actor.zone)}.
            </p>
          ) : null}
          {submittal.state === 'drafted' ? (
            submittal.mine ? (
              <Link className="btn" href={`${path}/seal`}>
                Go to the seal
              </Link>
            ) : (
              <p>It waits for the seal of the engineer of record.</p>
            )
          ) : null}
          <ul className="plain">
            {sheets.map((s) => (
              <li key={s.number}>
                {s.number} {s.title}, revision {s.revision}, by {s.originator}, checked by {s.checker}
              </li>
            ))}
          </ul>
        </section>
        {submittal.state === 'void' ? (
          <p className="message e">This submittal is void: {submittal.voidReason}. Gather a new one.</p>
        ) : null}
        {submittal.state === 'drafted' || submittal.state === 'void' ? null : (
          <section>
            <h2>Delivery</h2>
            <ul className="plain">
              {transmittals.map((t) => (
                <li key={t.id}>
                  Transmittal {t.number} to {t.recipient}, {sayMoment(t.sent_at, actor.zone)}
                </li>
              ))}
              {mails.map((m) => (
                <li key={m.id}>
                  Letter to {m.recipient}: {m.state}
                  {m.server_words === '' ? '' : `; the server said: ${m.server_words}`}
                </li>
              ))}
              {links.map((l) => (
                <li key={`${l.email}${l.expiresAt.getTime()}`}>
                  Link for {l.reviewer}:{' '}
                  {l.revokedAt
                    ? 'revoked'
                    : l.openedAt
                      ? `opened ${sayMoment(l.openedAt, actor.zone)}`
                      : 'not opened yet'}
                  , good until {sayDate(l.expiresAt, actor.zone)}
                </li>
              ))}
            </ul>
            {links.some((l) => !l.revokedAt) ? (
              <form action={revoke.bind(null, path, id)}>
                <button type="submit" className="btn">
                  Revoke the links
                </button>
              </form>
            ) : null}
            <SendForm
              action={send.bind(null, path, id)}
              reviewer={authority?.reviewer ?? ''}
              email={authority?.email ?? ''}
            />
          </section>
        )}
        {comments.length === 0 ? null : (
          <section>
            <h2>Comments</h2>
            <ol className="plain">
              {comments.map((c) => (
                <li key={c.id}>
                  <b>{c.number}</b> Line {c.line}
                  {c.code === '' ? '' : `, ${c.code}`}: {c.text}
                  {c.answer === null ? (
                    <AnswerForm action={answer.bind(null, path, c.id)} number={c.number} />
                  ) : (
                    <p>Answer: {c.answer}</p>
                  )}
                </li>
              ))}
            </ol>
          </section>
        )}
      </div>
    </Page>
  );
}
