'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import type { StartingSheet } from '@/lib/model/starting-draft';
import { FormMessage } from '../../../../components/form-message';
import { messageAt, typedValue, untouched } from '../../../../components/form-state';
import { SubmitButton } from '../../../../components/submit-button';
import { TextField } from '../../../../components/text-field';
import { submitSheet } from './actions';
import { StartDrawing } from './start-drawing';

const starts: { start: StartingSheet; label: string; says: string }[] = [
  { start: 'beam', label: 'Beam', says: 'Spans in a line on any number of supports.' },
  { start: 'portal', label: 'Portal frame', says: 'One bay: two columns, one beam, bases of any kind.' },
  { start: 'frame', label: 'Frame', says: 'Any joints, members, hinges and supports in a plane.' },
];

export function SheetForm({ jobId }: { jobId: string }) {
  const [state, action] = useActionState(submitSheet.bind(null, jobId), untouched);
  const chosen = typedValue(state, 'start', 'beam');
  const error = messageAt(state, 'start');
  return (
    <form action={action} noValidate className="mt-5 max-w-[720px]">
      <FormMessage state={state} />
      <fieldset className="fld mb-5">
        <legend>Start from</legend>
        <div className="starts" key={chosen}>
          {starts.map(({ start, label, says }) => (
            <label key={start}>
              <StartDrawing start={start} />
              <span className="flex items-center gap-2">
                <input type="radio" name="start" value={start} defaultChecked={start === chosen} />
                <b>{label}</b>
              </span>
              <small className="i2 block">{says}</small>
            </label>
          ))}
        </div>
        {error ? <p className="ans e">{error}</p> : null}
      </fieldset>
      <TextField name="title" label="Title" state={state} maxLength={120} required />
      <div className="row">
        <SubmitButton>Make the sheet</SubmitButton>
        <Link className="btn q" href={`/jobs/${jobId}`}>
          Back to the job
        </Link>
      </div>
    </form>
  );
}
