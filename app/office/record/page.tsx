import type { Metadata } from 'next';
import { Hung } from '@/app/components/ledger';
import { Page } from '@/app/components/page-layout';
import { RecordBar } from '@/app/components/record-bar';
import { RecordList } from '@/app/components/record-list';
import { recordFilter, recordHref, recordQuery, sayWalk } from '@/app/components/record-query';
import { VerifyRecord } from '@/app/components/verify-record';
import { orRefuse, requireActor } from '@/app/session';
import { openOffice } from '@/lib/services/open-office';
import { readAudit } from '@/lib/services/read-audit';

interface Props {
  searchParams: Promise<Record<string, unknown>>;
}

export const metadata: Metadata = { title: 'Record of the office' };

/** Every entry of the office. */
export default async function OfficeRecordPage({ searchParams }: Props) {
  const actor = await requireActor();
  const query = recordQuery.parse(await searchParams);
  const [{ people }, read] = await orRefuse(
    Promise.all([openOffice(actor), readAudit(actor, recordFilter(query))]),
  );
  const base = '/office/record';
  return (
    <Page
      wide
      path={[{ label: 'Office', href: '/office' }, { label: 'Record' }]}
      actor={actor}
      foot={[
        <span key="office">
          <b>{actor.officeName}</b>
        </span>,
        <span key="zone" className="end">{`Times in ${actor.zone}`}</span>,
      ]}
    >
      <Hung at="top">
        <h1>Record of the office</h1>
        <VerifyRecord lastNight={sayWalk(read.walked, actor.zone)} />
        <RecordBar base={base} query={query} about={[]} people={people} />
      </Hung>
      <RecordList read={read} zone={actor.zone} hrefOf={(page) => recordHref(base, query, page)} />
    </Page>
  );
}
