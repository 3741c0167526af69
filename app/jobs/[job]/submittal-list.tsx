import Link from 'next/link';
import type { openJob } from '@/lib/services/open-job';
import { sayDate } from '../../components/say-date';

type Submittal = Awaited<ReturnType<typeof openJob>>['submittals'][number];

const words = {
  drafted: 'being prepared',
  sealed: 'sealed, not sent',
  sent: 'with the reviewer',
  decided: 'decided',
  void: 'void',
} as const satisfies Record<Submittal['state'], string>;

/** The submittals of a job, newest first, each with how it stands. */
export function SubmittalList(props: { jobId: string; submittals: Submittal[]; zone: string }) {
  const { jobId, submittals, zone } = props;
  return (
    <ol className="plainlist max-w-[620px] border-t border-line">
      {submittals
        .toSorted((a, b) => b.number - a.number)
        .map((submittal) => (
          <li key={submittal.id} className="flex items-baseline gap-4">
            <b className="font-medium">{submittal.number}</b>
            <span className="flex-1">
              {submittal.decision ?? words[submittal.state]}
              <small className="i2 block">begun {sayDate(submittal.createdAt, zone)}</small>
            </span>
            <Link className="t" href={`/jobs/${jobId}/submittals/${submittal.id}`}>
              Open<span className="sr-only"> submittal {submittal.number}</span>
            </Link>
          </li>
        ))}
    </ol>
  );
}
