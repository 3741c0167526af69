import type { Metadata } from 'next';
import { forbidden } from 'next/navigation';
import { Page } from '@/app/components/page-layout';
import { sayDate } from '@/app/components/say-date';
import { orRefuse, requireActor } from '@/app/session';
import { openSubmittal } from '@/lib/services/open-submittal';
import { SealForm } from './seal-form';
import './seal.css';

interface Props {
  params: Promise<{ job: string; submittal: string }>;
}

export const metadata: Metadata = { title: 'Seal' };

/** What is sealed, by whom, with which key. */
export default async function SealPage({ params }: Props) {
  const actor = await requireActor();
  if (!actor.roles.includes('engineer-of-record')) forbidden();
  const { submittal: id } = await params;
  const { job, submittal, sheets, file, licence } = await orRefuse(openSubmittal(actor, id));
  const inForce = licence !== undefined && licence.expires >= new Date();
  return (
    <Page
      actor={actor}
      path={[
        { label: `${job.number} ${job.title}`, href: `/jobs/${job.id}` },
        { label: `Submittal ${submittal.number}`, href: `/jobs/${job.id}/submittals/${id}` },
        { label: 'Seal' },
      ]}
      margin={
        <>
          <div className="bigno">Seal</div>
          <div className="under">submittal {submittal.number}</div>
        </>
      }
      foot={[actor.officeName, job.number, `submittal ${submittal.number}`, `${submittal.pages} pages`]}
    >
      <div className="in sealgrid">
        <section aria-labelledby="what">
          <h1>
            Seal {sheets.length === 1 ? 'one sheet' : `${sheets.length} sheets`} of submittal{' '}
            {submittal.number}
          </h1>
          <p>You put your seal on exactly these pages. Any later change to the file shows in the seal.</p>
          <h2 id="what">What will be signed</h2>
          <dl className="facts2">
            <dt>File</dt>
            <dd>
              <a className="t" href={`/jobs/${job.id}/submittals/${id}/file`}>
                {submittal.pages} pages, {(file.size / 1024).toFixed(0)} kB
              </a>
            </dd>
            <dt>Digest, SHA-256</dt>
            <dd className="digest">{file.sha256}</dd>
          </dl>
          <table className="rl">
            <thead>
              <tr>
                <th scope="col">Covered sheet</th>
                <th scope="col">Rev</th>
                <th scope="col">Checked</th>
                <th scope="col">Digest</th>
              </tr>
            </thead>
            <tbody>
              {sheets.map((s) => (
                <tr key={s.number}>
                  <th scope="row">
                    {s.number} {s.title}
                  </th>
                  <td>{s.revision}</td>
                  <td>
                    {s.checker} {s.checkedAt ? sayDate(s.checkedAt, actor.zone) : ''}
                  </td>
                  <td>{s.digest.slice(0, 8)}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </section>
        <section aria-labelledby="who">
          <h2 id="who">Your licence</h2>
          {licence ? (
            <p>
              {actor.name}, {licence.profession}, {licence.jurisdiction}, licence {licence.number}:{' '}
              {inForce ? 'in force until' : 'expired on'} {sayDate(licence.expires, 'UTC')}
            </p>
          ) : (
            <p className="message e">
              You have no licence for {job.jurisdiction} in the register of the office.
            </p>
          )}
          {submittal.state === 'void' ? (
            <p>This submittal is void: {submittal.voidReason}. Gather a new one.</p>
          ) : submittal.state !== 'drafted' ? (
            <p>This submittal is sealed. A sealed file is stored once and never written again.</p>
          ) : !submittal.mine ? (
            <p>Only the engineer of record named on its cover seals this submittal.</p>
          ) : inForce ? (
            <SealForm submittalId={id} pages={submittal.pages} back={`/jobs/${job.id}/submittals/${id}`} />
          ) : (
            <p>Nothing can be sealed without a licence in force.</p>
          )}
        </section>
      </div>
    </Page>
  );
}
