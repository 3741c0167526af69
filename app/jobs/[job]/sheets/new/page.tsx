import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { openJob } from '@/lib/services/open-job';
import { makers } from '@/lib/services/require-role';
import { Page } from '../../../../components/page-layout';
import { orRefuse, requireActor } from '../../../../session';
import { SheetForm } from './sheet-form';

export const metadata: Metadata = { title: 'New sheet' };

export default async function NewSheetPage({ params }: { params: Promise<{ job: string }> }) {
  const actor = await requireActor();
  if (!actor.roles.some((r) => makers.includes(r))) forbidden();
  const { job } = await orRefuse(openJob(actor, (await params).job));
  return (
    <Page
      path={[
        { label: 'Jobs', href: '/jobs' },
        { label: `${job.number} ${job.title}`, href: `/jobs/${job.id}` },
        { label: 'New sheet' },
      ]}
      actor={actor}
      margin={
        <>
          <div className="bigno">{job.number}</div>
          <div className="under">{job.title}</div>
        </>
      }
      foot={[actor.officeName, job.number, job.units === 'US' ? 'kip, ft, in' : 'kN, m, mm']}
    >
      <div className="in">
        <h1>New sheet</h1>
        <p className="lead3">
          A starting sheet is blank but for its shape; everything can be changed at the desk. Its number is
          given once and kept.
        </p>
        <SheetForm jobId={job.id} units={job.units} />
      </div>
    </Page>
  );
}
