import type { Metadata } from 'next';
import Link from 'next/link';
import { Hung } from '@/app/components/ledger';
import { Page } from '@/app/components/page-layout';
import { sayDate } from '@/app/components/say-date';
import { orRefuse, requireActor } from '@/app/session';
import { compareRevisions } from '@/lib/services/compare-revisions';
import { InputChanges } from './input-changes';
import { LineChanges } from './line-changes';
import { ValueChanges } from './value-changes';
import './changes.css';

interface Props {
  params: Promise<{ revision: string }>;
  searchParams: Promise<{ with?: string }>;
}

export const metadata: Metadata = { title: 'Changes' };

/** What a revision changed against an earlier one: inputs, results, lines. */
export default async function ChangesPage({ params, searchParams }: Props) {
  const actor = await requireActor();
  const { revision } = await params;
  const found = await orRefuse(
    compareRevisions(actor, { revisionId: revision, with: (await searchParams).with }),
  );
  const { job, sheet, before, after, others, inputs, values, lines } = found;
  const here = `/jobs/${job.id}/revisions/${after.id}`;
  return (
    <Page
      wide
      actor={actor}
      path={[
        { label: `${job.number} ${job.title}`, href: `/jobs/${job.id}` },
        { label: `${sheet.number} ${sheet.title}`, href: `/jobs/${job.id}/sheets/${sheet.id}` },
        { label: `revision ${after.number}`, href: here },
        { label: 'Changes' },
      ]}
      foot={[actor.officeName, job.number, sheet.number, `rev ${before.number} to rev ${after.number}`]}
    >
      <Hung at="top" number={sheet.number}>
        <h1>
          Revision {before.number} to revision {after.number}
        </h1>
        <p className="facts">
          <span>
            {after.originator}, {sayDate(after.frozenAt, actor.zone)}
          </span>
          <span>{after.reason}</span>
        </p>
        {others.length > 1 ? (
          <p className="i2">
            Against revision{' '}
            {others.map((n) => (
              <span key={n}>
                {n === before.number ? (
                  <b>{n}</b>
                ) : (
                  <Link className="t" href={`${here}/changes?with=${n}`}>
                    {n}
                  </Link>
                )}{' '}
              </span>
            ))}
          </p>
        ) : null}
      </Hung>
      <Hung at="section">
        <h2>Inputs</h2>
        <InputChanges inputs={inputs} before={before.number} after={after.number} />
      </Hung>
      <Hung at="section">
        <h2>Results</h2>
        <ValueChanges values={values} before={before.number} after={after.number} />
      </Hung>
      <Hung at="section">
        <h2>Lines</h2>
        <LineChanges lines={lines} before={before.number} after={after.number} />
      </Hung>
    </Page>
  );
}
