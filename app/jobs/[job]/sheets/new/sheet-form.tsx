'use client';

import Link from 'next/link';
import { useActionState, useState } from 'react';
import { FormMessage } from '../../../../components/form-message';
import { messageAt, typedValue, untouched } from '../../../../components/form-state';
import { SubmitButton } from '../../../../components/submit-button';
import { TextField } from '../../../../components/text-field';
import { submitSheet } from './actions';
import { StartDrawing } from './start-drawing';
import { StartFields } from './start-fields';
import { starts } from './starts';

interface Props {
  jobId: string;
  units: 'US' | 'SI';
}

/** The gallery of starting sheets, and what the chosen one asks for. */
export function SheetForm({ jobId, units }: Props) {
  const [state, action] = useActionState(submitSheet.bind(null, jobId), untouched);
  const [chosen, choose] = useState(typedValue(state, 'start', 'beam'));
  const error = messageAt(state, 'start');
  const fields = starts.find((s) => s.start === chosen)?.fields ?? [];
  return (
    <form action={action} noValidate className="mt-5 max-w-[960px]">
      <FormMessage state={state} />
      <fieldset className="fld mb-5">
        <legend>Start from</legend>
        <div className="starts">
          {starts.map(({ start, label, says }) => (
            <label key={start}>
              <StartDrawing start={start} />
              <span className="flex items-center gap-2">
                <input
                  type="radio"
                  name="start"
                  value={start}
                  checked={start === chosen}
                  onChange={() => choose(start)}
                />
                <b>{label}</b>
              </span>
              <small className="i2 block">{says}</small>
            </label>
          ))}
        </div>
        {error ? <p className="ans e">{error}</p> : null}
      </fieldset>
      <div className="mb-5">
        <StartFields fields={fields} state={state} units={units} />
      </div>
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
