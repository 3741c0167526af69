import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { Page } from '@/app/components/page-layout';
import { ReadingPage } from '@/app/components/reading-page';
import { sayMoment } from '@/app/components/say-date';
import { orRefuse, requireActor } from '@/app/session';
import { openCheck } from '@/lib/services/open-check';
import { writeDifference, writeValue } from '@/templates/write-pair';
import '../../../revisions/[revision]/changes/changes.css';
import '../inputs/inputs.css';

interface Props {
  params: Promise<{ job: string; check: string }>;
}

export const metadata: Metadata = { title: 'Values side by side' };

/** The checker's own values beside the designer's, as they were frozen with the check. */
export default async function ComparisonPage({ params }: Props) {
  const actor = await requireActor();
  const { check: id } = await params;
  const { job, revision, check, own } = await orRefuse(openCheck(actor, id));
  const compared = own?.comparison;
  if (!own || !compared) notFound();
  const back = `/jobs/${job.id}/checks/${id}`;
  const alone = compared.pairs.filter((p) => p.before === undefined || p.after === undefined).length;
  return (
    <Page
      actor={actor}
      path={[
        { label: `${job.number} ${job.title}`, href: `/jobs/${job.id}` },
        { label: 'Check', href: back },
        { label: 'Values side by side' },
      ]}
      margin={
        <>
          <div className="bigno">{revision.sheet}</div>
          <div className="under">revision {revision.number}</div>
        </>
      }
      foot={[actor.officeName, job.number, revision.sheet, `rev ${revision.number}`]}
    >
      <div className="inputcheck">
        <h1>Values side by side</h1>
        <p>
          {revision.sheet} revision {revision.number} and{' '}
          <Link className="t" href={`/jobs/${job.id}/revisions/${compared.revisionId}`}>
            {own.name}, the sheet of {check.checker}
          </Link>
          , compared {sayMoment(compared.at, actor.zone)}. The difference is reckoned on the designer’s value.
        </p>
        {alone > 0 ? (
          <p className="message">
            {alone === 1 ? 'One value stands' : `${alone} values stand`} on one side only: the two sheets
            number or name it differently.
          </p>
        ) : null}
        <ReadingPage className="scroller" label="Values" focusable>
          <table className="rl changes">
            <thead>
              <tr>
                <th scope="col">Value</th>
                <th scope="col">Unit</th>
                <th scope="col" className="r">
                  Designer
                </th>
                <th scope="col" className="r">
                  Checker
                </th>
                <th scope="col" className="r">
                  Difference
                </th>
              </tr>
            </thead>
            <tbody>
              {compared.pairs.map((p) => (
                <tr key={`${p.name} ${p.unit}`}>
                  <th scope="row">{p.name}</th>
                  <td>{p.unit}</td>
                  <td className="r">{writeValue(p.before)}</td>
                  <td className="r">{writeValue(p.after)}</td>
                  <td className="r">{writeDifference(p.change)}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </ReadingPage>
        <p>
          <Link className="t" href={back}>
            Back to the check
          </Link>
        </p>
      </div>
    </Page>
  );
}
