import type { Metadata } from 'next';
import { Hung } from '@/app/components/ledger';
import { Page } from '@/app/components/page-layout';
import { RecordBar } from '@/app/components/record-bar';
import { RecordList } from '@/app/components/record-list';
import { recordFilter, recordHref, recordQuery, sayWalk } from '@/app/components/record-query';
import { VerifyRecord } from '@/app/components/verify-record';
import { orRefuse, requireActor } from '@/app/session';
import { openJob } from '@/lib/services/open-job';
import { openOffice } from '@/lib/services/open-office';
import { readAudit } from '@/lib/services/read-audit';

interface Props {
  params: Promise<{ job: string }>;
  searchParams: Promise<Record<string, unknown>>;
}

export const metadata: Metadata = { title: 'Record of the job' };

/** Who did what to which digest in one job; of one sheet, submittal or person if asked. */
export default async function JobRecordPage({ params, searchParams }: Props) {
  const actor = await requireActor();
  const { job: id } = await params;
  const query = recordQuery.parse(await searchParams);
  const [{ job, sheets, submittals }, { people }, read] = await orRefuse(
    Promise.all([
      openJob(actor, id),
      openOffice(actor),
      readAudit(actor, { ...recordFilter(query), jobId: id }),
    ]),
  );
  const base = `/jobs/${id}/record`;
  return (
    <Page
      wide
      path={[
        { label: 'Jobs', href: '/jobs' },
        { label: `${job.number} ${job.title}`, href: `/jobs/${id}` },
        { label: 'Record' },
      ]}
      actor={actor}
      foot={[
        <span key="office">
          <b>{actor.officeName}</b>
        </span>,
        job.number,
        <span key="zone" className="end">{`Times in ${actor.zone}`}</span>,
      ]}
    >
      <Hung at="top" number={job.number}>
        <h1>Record</h1>
        <VerifyRecord lastNight={sayWalk(read.walked, actor.zone)} />
        <RecordBar
          base={base}
          query={query}
          about={[
            ...sheets.map((s) => ({ id: s.id, label: `${s.number} ${s.title}` })),
            ...submittals.map((s) => ({ id: s.id, label: `submittal ${s.number}` })),
          ]}
          people={people}
        />
      </Hung>
      <RecordList read={read} zone={actor.zone} hrefOf={(page) => recordHref(base, query, page)} />
    </Page>
  );
}
