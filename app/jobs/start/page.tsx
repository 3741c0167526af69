import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { openOffice } from '@/lib/services/open-office';
import { makers } from '@/lib/services/require-role';
import { Page } from '../../components/page-layout';
import { orRefuse, requireActor } from '../../session';
import { JobForm } from './job-form';

export const metadata: Metadata = { title: 'Start a job' };

export default async function StartJobPage() {
  const actor = await requireActor();
  if (!actor.roles.some((r) => r === 'administrator' || makers.includes(r))) forbidden();
  const { authorities } = await orRefuse(openOffice(actor));
  return (
    <Page
      path={[{ label: 'Jobs', href: '/jobs' }, { label: 'Start a job' }]}
      actor={actor}
      foot={[actor.officeName]}
    >
      <div className="in">
        <h1>Start a job</h1>
        <p className="lead3">A job holds the calc sheets of one piece of work, in one set of units.</p>
        <JobForm authorities={authorities.map(({ id, name }) => ({ id, name }))} />
      </div>
    </Page>
  );
}
