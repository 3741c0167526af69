import type { Metadata } from 'next';
import Link from 'next/link';
import { Page } from '@/app/components/page-layout';
import { sayDate, sayMoment } from '@/app/components/say-date';
import { orRefuse, requireActor } from '@/app/session';
import { openSubmittal } from '@/lib/services/open-submittal';
import { makers } from '@/lib/services/require-role';
import { answer, resend, revoke, send } from './actions';
import { CommentList } from './comment-list';
import { Delivery } from './delivery';
import { SendForm } from './send-form';
import { SheetTable } from './sheet-table';
import './submittal.css';

interface Props {
  params: Promise<{ job: string; submittal: string }>;
}

export const metadata: Metadata = { title: 'Submittal' };

/** One submittal: what is in it, whether it is sealed, where it went, what came back. */
export default async function SubmittalPage({ params }: Props) {
  const actor = await requireActor();
  const { submittal: id } = await params;
  const opened = await orRefuse(openSubmittal(actor, id));
  const { job, submittal, sheets, leftOut, file, authority, comments, decision, blocked } = opened;
  const mayMake = actor.roles.some((r) => makers.includes(r));
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
          <p className="message">
            {decision.author} decided on {sayDate(decision.at, actor.zone)}: <b>{decision.words}</b>
          </p>
        ) : null}
        {submittal.remarks === '' ? null : <p>{submittal.remarks}</p>}
        <section>
          <h2>Package</h2>
          <p>
            <a className="t" href={`${path}/file`}>
              {file.kind === 'sealed' ? 'The sealed package' : 'The package, not sealed yet'}
            </a>
            , {submittal.pages} pages, {(file.size / 1024).toFixed(0)} kB
          </p>
          <p className="ans digest">SHA-256 {file.sha256}</p>
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
          <SheetTable jobId={job.id} sheets={sheets} zone={actor.zone} />
          {leftOut.length > 0 ? <p>Left out since the last submittal: {leftOut.join('; ')}.</p> : null}
        </section>
        {submittal.state === 'void' ? (
          <p className="message e">This submittal is void: {submittal.voidReason}. Gather a new one.</p>
        ) : null}
        {submittal.state === 'drafted' || submittal.state === 'void' ? null : (
          <section>
            <h2>Delivery</h2>
            <Delivery
              opened={opened}
              zone={actor.zone}
              resend={mayMake ? resend.bind(null, path) : undefined}
              revoke={mayMake ? revoke.bind(null, path, id) : undefined}
            />
            {blocked ? (
              <p className="message e">{blocked}</p>
            ) : mayMake ? (
              <SendForm
                action={send.bind(null, path, id)}
                reviewer={authority?.reviewer ?? ''}
                email={authority?.email ?? ''}
                checklist={authority?.checklist ?? []}
                wish={authority?.wish ?? 'link'}
                again={opened.transmittals.length > 0}
              />
            ) : null}
          </section>
        )}
        {comments.length === 0 ? null : (
          <CommentList
            comments={comments}
            sheets={sheets}
            answer={mayMake ? answer.bind(null, path) : undefined}
          />
        )}
      </div>
    </Page>
  );
}
