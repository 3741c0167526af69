import type { Metadata } from 'next';
import Link from 'next/link';
import { openJob } from '@/lib/services/open-job';
import { makers } from '@/lib/services/require-role';
import { Empty } from '../../components/empty';
import { Hung } from '../../components/ledger';
import { Page } from '../../components/page-layout';
import { orRefuse, requireActor } from '../../session';
import { SheetLedger } from './sheet-ledger';
import { SubmittalList } from './submittal-list';

interface JobPageProps {
  params: Promise<{ job: string }>;
}

export const metadata: Metadata = { title: 'Job' };

export default async function JobPage({ params }: JobPageProps) {
  const actor = await requireActor();
  const { job, sheets, submittals, people } = await orRefuse(openJob(actor, (await params).job));
  const mayMake = actor.roles.some((r) => makers.includes(r));
  const mayExport = mayMake || actor.roles.includes('administrator');
  const units = job.units === 'US' ? 'kip, ft, in' : 'kN, m, mm';
  const facts = new Set(
    [job.place, job.jurisdiction, job.authority, ...job.codes.split('\n'), units, job.pageSize].filter(
      Boolean,
    ),
  );
  return (
    <Page
      wide
      path={[{ label: 'Jobs', href: '/jobs' }, { label: `${job.number} ${job.title}` }]}
      actor={actor}
      foot={[
        <span key="office">
          <b>{actor.officeName}</b>
        </span>,
        job.number,
        job.pageSize,
        units,
        sheets.length === 1 ? '1 sheet' : `${sheets.length} sheets`,
        <span key="zone" className="end">{`Times in ${actor.zone}`}</span>,
      ]}
    >
      <Hung at="top" number={job.number}>
        <div className="titlerow">
          <h1>{job.title}</h1>
          <span className="sp" />
          {mayMake && job.state === 'open' ? (
            <>
              {sheets.some((s) => s.revisionId) ? (
                <Link className="btn" href={`/jobs/${job.id}/submittals/new`}>
                  New submittal
                </Link>
              ) : null}
              <Link className="btn p" href={`/jobs/${job.id}/sheets/new`}>
                New sheet
              </Link>
            </>
          ) : null}
        </div>
        <p className="facts">
          {[...facts].map((fact) => (
            <span key={fact}>{fact}</span>
          ))}
        </p>
        {job.state === 'closed' ? (
          <p className="message">This job is closed. It can be read; nothing new is made in it.</p>
        ) : null}
        <p className="facts">
          <span>
            {people.length === 0
              ? 'Nobody is named for this job yet.'
              : people.map((p) => `${p.name}, ${p.part.replaceAll('-', ' ')}`).join('; ')}
          </span>
          <Link className="t" href={`/jobs/${job.id}/comments`}>
            Comments
          </Link>
          <Link className="t" href={`/jobs/${job.id}/record`}>
            Record
          </Link>
          {mayExport ? (
            <Link className="t" href={`/jobs/${job.id}/people`}>
              People, close the job
            </Link>
          ) : null}
        </p>
      </Hung>
      {sheets.length === 0 ? (
        <Hung at="section">
          <Empty title="No sheets yet.">
            A calc sheet is one structure, solved and written out.
            {mayMake
              ? ' Make the first one from a starting sheet.'
              : ' An engineer of the office makes the first.'}
          </Empty>
        </Hung>
      ) : (
        <SheetLedger jobId={job.id} sheets={sheets} zone={actor.zone} mayMake={mayMake} />
      )}
      <Hung at="section">
        <h2>Submittals</h2>
        {submittals.length === 0 ? (
          <p className="i2">None yet. A submittal takes frozen and checked revisions to the plan reviewer.</p>
        ) : (
          <SubmittalList jobId={job.id} submittals={submittals} zone={actor.zone} />
        )}
      </Hung>
      {mayExport ? (
        <Hung at="section">
          <h2>The whole job</h2>
          <form method="post" action={`/jobs/${job.id}/export`} className="max-w-[676px]">
            <p className="i2">
              Every package, sheet and register in one ZIP that needs no program of ours to be read. The
              record keeps that it was taken out. It cannot be read back in yet.
            </p>
            <button type="submit" className="btn mt-2">
              Download the job
            </button>
          </form>
        </Hung>
      ) : null}
    </Page>
  );
}
