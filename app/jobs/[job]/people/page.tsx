import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { Hung } from '@/app/components/ledger';
import { Page } from '@/app/components/page-layout';
import { SubmitButton } from '@/app/components/submit-button';
import { orRefuse, requireActor } from '@/app/session';
import type { Role } from '@/lib/services/actor';
import { openJob } from '@/lib/services/open-job';
import { openOffice } from '@/lib/services/open-office';
import { makers } from '@/lib/services/require-role';
import { setState, submitPart } from './actions';
import { PartForm } from './part-form';

interface Props {
  params: Promise<{ job: string }>;
}

export const metadata: Metadata = { title: 'People of the job' };

const parts = [
  {
    part: 'engineer-of-record',
    role: 'engineer-of-record',
    legend: 'Engineer of record',
    note: 'Named on the cover, and alone seals. Packages already printed keep the name on their cover.',
  },
  {
    part: 'originator',
    role: 'engineer',
    legend: 'Originators',
    note: 'Who makes the sheets of this job.',
  },
  {
    part: 'checker',
    role: 'checker',
    legend: 'Checkers',
    note: 'A sheet is never checked by its originator.',
  },
] as const satisfies { part: string; role: Role; legend: string; note: string }[];

/** Who does what on a job, and whether it is open. */
export default async function JobPeoplePage({ params }: Props) {
  const actor = await requireActor();
  if (!actor.roles.some((r) => r === 'administrator' || makers.includes(r))) forbidden();
  const { job: id } = await params;
  const [{ job, people }, office] = await orRefuse(Promise.all([openJob(actor, id), openOffice(actor)]));
  const closed = job.state === 'closed';
  return (
    <Page
      wide
      path={[
        { label: 'Jobs', href: '/jobs' },
        { label: `${job.number} ${job.title}`, href: `/jobs/${id}` },
        { label: 'People' },
      ]}
      actor={actor}
      foot={[
        <span key="office">
          <b>{actor.officeName}</b>
        </span>,
        job.number,
      ]}
    >
      <Hung at="top" number={job.number}>
        <h1>People of the job</h1>
        {parts.map(({ part, role, legend, note }) => {
          const named = people.filter((p) => p.part === part).map((p) => p.personId);
          return (
            <PartForm
              key={part}
              action={submitPart.bind(null, id, part)}
              legend={legend}
              note={note}
              single={part === 'engineer-of-record'}
              people={office.people.filter(
                (p) => (p.active && p.roles.includes(role)) || named.includes(p.id),
              )}
              named={named}
            />
          );
        })}
      </Hung>
      <Hung at="section">
        <h2>{closed ? 'This job is closed' : 'Close the job'}</h2>
        <p className="i2 max-w-[676px]">
          {closed
            ? 'It can be read; nothing new is made in it. Open it again to go on.'
            : 'A closed job keeps its record and can be read; nothing new is made in it. Reviews in hand go on.'}
        </p>
        <form action={setState.bind(null, id, closed ? 'open' : 'closed')} className="row">
          <SubmitButton tone="plain">{closed ? 'Open the job again' : 'Close the job'}</SubmitButton>
        </form>
      </Hung>
    </Page>
  );
}
