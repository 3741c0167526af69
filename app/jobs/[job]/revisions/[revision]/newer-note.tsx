import Link from 'next/link';
import { sayMoment } from '@/app/components/say-date';

interface Props {
  jobId: string;
  newer: { id: string; number: number; reason: string; frozenAt: Date; originator: string };
  zone: string;
}

/** That a later revision took the place of this one, and what of this one no longer holds. */
export function NewerNote({ jobId, newer, zone }: Props) {
  return (
    <div className="message">
      <p>
        <Link className="t" href={`/jobs/${jobId}/revisions/${newer.id}`}>
          Revision {newer.number}
        </Link>{' '}
        took its place: {newer.reason} {newer.originator}, {sayMoment(newer.frozenAt, zone)}.
      </p>
      <p className="ans">
        Checks and marks of this revision no longer hold, nor does a seal that was not sent. All stay
        readable.{' '}
        <Link className="t" href={`/jobs/${jobId}/revisions/${newer.id}/changes`}>
          What changed
        </Link>
      </p>
    </div>
  );
}
