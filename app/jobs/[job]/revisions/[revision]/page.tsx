import type { Metadata } from 'next';
import Link from 'next/link';
import { Page } from '@/app/components/page-layout';
import { ReadingPage } from '@/app/components/reading-page';
import { sayMoment } from '@/app/components/say-date';
import { type Mark, StatusMark } from '@/app/components/status-mark';
import { orRefuse, requireActor } from '@/app/session';
import { openRevision } from '@/lib/services/open-revision';
import { makers } from '@/lib/services/require-role';
import { giveToChecker, goBack } from './actions';
import { CheckForm } from './check-form';
import { FrozenSheet } from './frozen-sheet';
import { NewerNote } from './newer-note';
import { RestoreForm } from './restore-form';
import './revision.css';

interface Props {
  params: Promise<{ job: string; revision: string }>;
}

export const metadata: Metadata = { title: 'Revision' };

/** A frozen revision: what was written, and who is to check it. */
export default async function RevisionPage({ params }: Props) {
  const actor = await requireActor();
  const { revision: id } = await params;
  const { job, revision, newer, blocks, changedIn, check, checkers } = await orRefuse(
    openRevision(actor, id),
  );
  const mayMake = actor.roles.some((r) => makers.includes(r));
  return (
    <Page
      actor={actor}
      path={[
        { label: `${job.number} ${job.title}`, href: `/jobs/${job.id}` },
        { label: `${revision.sheet} ${revision.title}`, href: `/jobs/${job.id}/sheets/${revision.sheetId}` },
        { label: `revision ${revision.number}` },
      ]}
      margin={
        <>
          <div className="bigno">{revision.sheet}</div>
          <div className="under">
            revision {revision.number}
            <br />
            {revision.digest.slice(0, 8)}
          </div>
        </>
      }
      foot={[
        actor.officeName,
        job.number,
        revision.sheet,
        `rev ${revision.number}`,
        `originator ${revision.originator}, ${sayMoment(revision.frozenAt, actor.zone)}`,
        `digest ${revision.digest.slice(0, 8)}`,
      ]}
    >
      <div className="frozenzones">
        <ReadingPage className="frozenpage" label="Sheet" focusable>
          <h1>
            {revision.sheet} {revision.title}, revision {revision.number}
          </h1>
          <FrozenSheet blocks={blocks} changedIn={changedIn} />
        </ReadingPage>
        <aside className="frozenside">
          <StatusMark mark={standing(check?.state)} />
          {newer ? <NewerNote jobId={job.id} newer={newer} zone={actor.zone} /> : null}
          <dl className="facts3">
            <dt>Reason</dt>
            <dd>{revision.reason}</dd>
            <dt>Frozen</dt>
            <dd>
              {sayMoment(revision.frozenAt, actor.zone)} by {revision.originator}
            </dd>
            <dt>Engine</dt>
            <dd>{revision.engine}</dd>
            <dt>Digest, SHA-256</dt>
            <dd className="digest">{revision.digest}</dd>
          </dl>
          <p className="ans">A frozen revision is never changed again.</p>
          {check ? (
            <p>
              <Link className="t" href={`/jobs/${job.id}/checks/${check.id}`}>
                {check.state === 'open'
                  ? `With ${check.checker} for checking`
                  : `Check by ${check.checker}: ${check.state}`}
              </Link>
            </p>
          ) : newer ? null : mayMake ? (
            <CheckForm action={giveToChecker.bind(null, job.id, id)} checkers={checkers} />
          ) : (
            <p>An engineer of the office sends it to a checker.</p>
          )}
          {revision.number > 0 ? (
            <p>
              <Link className="t" href={`/jobs/${job.id}/revisions/${id}/changes`}>
                Changes since revision {revision.number - 1}
              </Link>
            </p>
          ) : null}
          <p>
            <Link className="t" href={`/jobs/${job.id}/sheets/${revision.sheetId}`}>
              Back to the desk
            </Link>
          </p>
          {mayMake ? <RestoreForm action={goBack.bind(null, id)} number={revision.number} /> : null}
        </aside>
      </div>
    </Page>
  );
}

function standing(check: 'open' | 'agreed' | 'returned' | 'void' | undefined): Mark {
  switch (check) {
    case undefined:
      return 'frozen';
    case 'open':
      return 'checking';
    case 'agreed':
      return 'checked';
    default:
      return check;
  }
}
