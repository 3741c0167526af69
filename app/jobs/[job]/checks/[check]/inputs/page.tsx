import type { Metadata } from 'next';
import Link from 'next/link';
import { Page } from '@/app/components/page-layout';
import { orRefuse, requireActor } from '@/app/session';
import { openCheck } from '@/lib/services/open-check';
import { markInput } from '../actions';
import { InputRow } from './input-row';
import './inputs.css';

interface Props {
  params: Promise<{ job: string; check: string }>;
}

export const metadata: Metadata = { title: 'Inputs against drawings' };

/** Every input of the sheet, each to be held against the drawing it comes from. */
export default async function InputsPage({ params }: Props) {
  const actor = await requireActor();
  const { check: id } = await params;
  const { job, revision, check, inputs } = await orRefuse(openCheck(actor, id));
  const back = `/jobs/${job.id}/checks/${id}`;
  const path = `${back}/inputs`;
  const working = check.mine && check.state === 'open';
  const held = inputs.filter((i) => i.mark).length;
  return (
    <Page
      actor={actor}
      path={[
        { label: `${job.number} ${job.title}`, href: `/jobs/${job.id}` },
        { label: `${revision.sheet} ${revision.title}`, href: `/jobs/${job.id}/revisions/${revision.id}` },
        { label: 'Check', href: back },
        { label: 'Inputs' },
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
        <h1>Inputs against drawings</h1>
        <p>
          {held} of {inputs.length} inputs of revision {revision.number} are held against a drawing or marked.{' '}
          {working ? 'Name the drawing that each agrees with, or say what is to be corrected.' : ''}
        </p>
        <ul className="inputrows">
          {inputs.map((input) => (
            <InputRow
              key={input.place}
              input={input}
              action={working ? markInput.bind(null, path, id, input.place) : undefined}
            />
          ))}
        </ul>
        <p>
          <Link className="t" href={back}>
            Back to the sheet
          </Link>
        </p>
      </div>
    </Page>
  );
}
