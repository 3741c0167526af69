import type { Metadata } from 'next';
import Link from 'next/link';
import { Page } from '@/app/components/page-layout';
import { sayMoment } from '@/app/components/say-date';
import { orRefuse, requireActor } from '@/app/session';
import { openRevision } from '@/lib/services/open-revision';
import { giveToChecker } from './actions';
import { CheckForm } from './check-form';
import { FrozenSheet } from './frozen-sheet';
import './revision.css';

interface Props {
  params: Promise<{ job: string; revision: string }>;
}

export const metadata: Metadata = { title: 'Revision' };

/** A frozen revision: what was written, and who is to check it. */
export default async function RevisionPage({ params }: Props) {
  const actor = await requireActor();
  const { revision: id } = await params;
  const { job, revision, blocks, check, checkers } = await orRefuse(openRevision(actor, id));
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
          <div className="under">revision {revision.number}</div>
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
        <section className="frozenpage" aria-label="Sheet">
          <FrozenSheet blocks={blocks} />
        </section>
        <aside className="frozenside">
          <h1>
            {revision.sheet} revision {revision.number}
          </h1>
          <p>{revision.reason}</p>
          <p className="ans">
            Frozen by {revision.originator}, engine {revision.engine}. It is never changed again.
          </p>
          {check ? (
            <p>
              <Link className="t" href={`/jobs/${job.id}/checks/${check.id}`}>
                {check.state === 'open'
                  ? `With ${check.checker} for checking`
                  : `Check by ${check.checker}: ${check.state}`}
              </Link>
            </p>
          ) : (
            <CheckForm action={giveToChecker.bind(null, job.id, id)} checkers={checkers} />
          )}
          <p>
            <Link className="t" href={`/jobs/${job.id}/sheets/${revision.sheetId}`}>
              Back to the desk
            </Link>
          </p>
        </aside>
      </div>
    </Page>
  );
}
