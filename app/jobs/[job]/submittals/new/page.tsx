import type { Metadata } from 'next';
import Link from 'next/link';
import { forbidden } from 'next/navigation';
import { Page } from '@/app/components/page-layout';
import { orRefuse, requireActor } from '@/app/session';
import { openComments } from '@/lib/services/open-comments';
import { openJob } from '@/lib/services/open-job';
import { makers } from '@/lib/services/require-role';
import { gather } from './actions';
import { GatherForm } from './gather-form';

interface Props {
  params: Promise<{ job: string }>;
}

export const metadata: Metadata = { title: 'New submittal' };

/** Which checked sheets go out, and for what. */
export default async function NewSubmittalPage({ params }: Props) {
  const actor = await requireActor();
  if (!actor.roles.some((r) => makers.includes(r))) forbidden();
  const { job: id } = await params;
  const [{ job, sheets, submittals }, { comments }] = await orRefuse(
    Promise.all([openJob(actor, id), openComments(actor, id)]),
  );
  const waits = comments.filter((c) => c.state === 'open' || c.state === 'reopened').length;
  const number = Math.max(0, ...submittals.map((s) => s.number)) + 1;
  return (
    <Page
      actor={actor}
      path={[{ label: `${job.number} ${job.title}`, href: `/jobs/${id}` }, { label: 'New submittal' }]}
      margin={
        <>
          <div className="bigno">{number}</div>
          <div className="under">submittal</div>
        </>
      }
      foot={[actor.officeName, job.number]}
    >
      <div className="in">
        <h1>New submittal</h1>
        {waits > 0 ? (
          <p className="message">
            {waits === 1 ? 'One comment is' : `${waits} comments are`} not answered yet. The package prints
            the answers given so far, and is not sent before all are.{' '}
            <Link className="t" href={`/jobs/${id}/comments`}>
              To the comments
            </Link>
          </p>
        ) : null}
        <GatherForm
          action={gather.bind(null, id)}
          sheets={sheets.map((s) => ({
            number: s.number,
            title: s.title,
            revisionId: s.checkState === 'agreed' ? s.revisionId : null,
            why: whyNot(s.revisionId, s.checkState),
            revision: s.revision,
          }))}
        />
      </div>
    </Page>
  );
}

function whyNot(revision: string | null, check: 'open' | 'agreed' | 'returned' | 'void' | null): string {
  if (revision === null) return 'not frozen yet';
  switch (check) {
    case 'agreed':
      return '';
    case 'open':
      return 'with its checker';
    case 'returned':
      return 'returned by its checker';
    case 'void':
      return 'changed since its check';
    default:
      return 'not sent to check yet';
  }
}
