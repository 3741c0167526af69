'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import { ChoiceField } from '../../components/choice-field';
import { FormMessage } from '../../components/form-message';
import { untouched } from '../../components/form-state';
import { SubmitButton } from '../../components/submit-button';
import { TextField } from '../../components/text-field';
import { submitJob } from './actions';

const units = [
  { value: 'US', label: 'kip, ft, in' },
  { value: 'SI', label: 'kN, m, mm' },
];
const pageSizes = [
  { value: 'Letter', label: 'Letter' },
  { value: 'A4', label: 'A4' },
];

export function JobForm({ authorities }: { authorities: { id: string; name: string }[] }) {
  const [state, action] = useActionState(submitJob, untouched);
  const choices = [
    { value: '', label: 'none yet' },
    ...authorities.map((a) => ({ value: a.id, label: a.name })),
  ];
  return (
    <form action={action} noValidate>
      <FormMessage state={state} />
      <div className="formgrid">
        <TextField name="number" label="Job number" state={state} maxLength={20} required />
        <TextField name="title" label="Title" state={state} maxLength={120} required />
        <TextField name="place" label="Place" state={state} maxLength={160} />
        <TextField
          name="jurisdiction"
          label="Jurisdiction"
          state={state}
          maxLength={80}
          note="The engineer of record needs a licence for it."
          required
        />
        <ChoiceField name="units" label="Units" state={state} options={units} />
        <ChoiceField name="pageSize" label="Paper" state={state} options={pageSizes} />
        <ChoiceField name="authorityId" label="Authority" state={state} options={choices} />
        <div className="whole">
          <TextField
            name="codes"
            label="Codes and editions"
            state={state}
            lines={3}
            maxLength={2000}
            note="Printed on the cover. Local codes govern; the engineer chooses and answers for them."
          />
        </div>
      </div>
      <div className="row">
        <SubmitButton>Start the job</SubmitButton>
        <Link className="btn q" href="/jobs">
          Back to jobs
        </Link>
      </div>
    </form>
  );
}
