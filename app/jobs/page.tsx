import type { Metadata } from 'next';
import Link from 'next/link';
import type { Actor } from '@/lib/services/actor';
import { listJobs } from '@/lib/services/list-jobs';
import { myWork } from '@/lib/services/my-work';
import { Empty } from '../components/empty';
import { Hung, Ledger, LedgerRow } from '../components/ledger';
import { Page } from '../components/page-layout';
import { sayMoment, sayToday } from '../components/say-date';
import { SheetStates } from '../components/sheet-states';
import { orRefuse, requireActor } from '../session';
import { JobsBar } from './jobs-bar';
import { type JobsQuery, jobsHref, jobsQuery } from './jobs-query';
import { WorkList } from './work-list';

export const metadata: Metadata = { title: 'Jobs' };

export default async function JobsPage({ searchParams }: { searchParams: Promise<Record<string, unknown>> }) {
  const actor = await requireActor();
  const query = jobsQuery.parse(await searchParams);
  const [jobs, work] = await orRefuse(Promise.all([listJobs(actor, query), myWork(actor)]));
  const mayStart = actor.roles.some((r) => r !== 'checker');
  return (
    <Page
      wide
      path={[{ label: 'Jobs' }]}
      actor={actor}
      foot={[
        <span key="office">
          <b>{actor.officeName}</b>
        </span>,
        `${jobs.total} ${jobs.total === 1 ? 'job' : 'jobs'} ${query.search ? 'found' : query.state}`,
        <span key="zone" className="end">{`Times in ${actor.zone}`}</span>,
      ]}
    >
      <Hung at="top">
        <h1>{sayToday(actor.zone)}</h1>
      </Hung>
      <WorkList title="Waiting on you" nothing="Nothing waits on you." work={work.toDo} first />
      {work.waiting.length > 0 ? (
        <WorkList title="Waiting for others" nothing="" work={work.waiting} />
      ) : null}
      <Hung at="section">
        <JobsBar query={query} mayStart={mayStart} />
      </Hung>
      <JobRows rows={jobs.rows} zone={actor.zone} query={query} />
      {jobs.pages > 1 ? (
        <Hung at="section">
          <nav className="row" aria-label="Pages of the list">
            {jobs.page > 1 ? (
              <Link className="btn s" href={jobsHref(query, { page: jobs.page - 1 })}>
                Before
              </Link>
            ) : null}
            <span className="i2">
              Page {jobs.page} of {jobs.pages}
            </span>
            {jobs.page < jobs.pages ? (
              <Link className="btn s" href={jobsHref(query, { page: jobs.page + 1 })}>
                Next
              </Link>
            ) : null}
          </nav>
        </Hung>
      ) : null}
    </Page>
  );
}

type Rows = Awaited<ReturnType<typeof listJobs>>['rows'];

function JobRows({ rows, zone, query }: { rows: Rows; zone: Actor['zone']; query: JobsQuery }) {
  if (rows.length === 0)
    return (
      <Hung>
        <Empty
          title={query.search ? `No ${query.state} job has “${query.search}” in it.` : 'No jobs here yet.'}
        >
          {query.search ? (
            <Link className="t" href={jobsHref(query, { search: '' })}>
              Show all {query.state} jobs
            </Link>
          ) : query.state === 'open' ? (
            'A job holds the calc sheets of one piece of work. Start one to make its first sheet.'
          ) : (
            'A job that is closed keeps its record and is listed here.'
          )}
        </Empty>
      </Hung>
    );
  return (
    <Ledger kind="jobs">
      {rows.map((job) => (
        <LedgerRow key={job.id} number={job.number}>
          <span>
            <b>
              <Link className="hover:text-pen" href={`/jobs/${job.id}`}>
                {job.title}
              </Link>
            </b>
            <small className="i2">{job.authority ?? job.place}</small>
          </span>
          <SheetStates sheets={job.sheets} />
          <span className="i2">{sayMoment(job.changedAt, zone)}</span>
        </LedgerRow>
      ))}
    </Ledger>
  );
}
