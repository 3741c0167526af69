import Link from 'next/link';
import { sayDate } from '@/app/components/say-date';
import type { openSubmittal } from '@/lib/services/open-submittal';

interface Props {
  jobId: string;
  sheets: Awaited<ReturnType<typeof openSubmittal>>['sheets'];
  zone: string;
}

/** The frozen revisions that the package holds. */
export function SheetTable({ jobId, sheets, zone }: Props) {
  return (
    <section className="scrollx" aria-label="Sheets of the package">
      <table className="rl">
        <thead>
          <tr>
            <th scope="col">Sheet</th>
            <th scope="col">Rev</th>
            <th scope="col">Originator</th>
            <th scope="col">Checked</th>
            <th scope="col">Digest</th>
          </tr>
        </thead>
        <tbody>
          {sheets.map((s) => (
            <tr key={s.number}>
              <td>
                <Link className="t" href={`/jobs/${jobId}/revisions/${s.revisionId}`}>
                  {s.number} {s.title}
                </Link>
                {s.change === '' ? null : <em className="block">{s.change}</em>}
              </td>
              <td>{s.revision}</td>
              <td>{s.originator}</td>
              <td>
                {s.checker} {s.checkedAt ? sayDate(s.checkedAt, zone) : ''}
              </td>
              <td>{s.digest.slice(0, 8)}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  );
}
