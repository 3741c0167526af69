'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import { ChoiceField } from '@/app/components/choice-field';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';

interface Authority {
  name: string;
  decisions: string[];
  checklist: string[];
  wish: 'link' | 'attachment';
  reviewer: string | null;
  email: string | null;
}

interface Props {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  /** Absent for a new one. */
  authority?: Authority | undefined;
}

const wishes = [
  { value: 'link', label: 'by a link in the letter' },
  { value: 'attachment', label: 'attached to the letter while it is small enough' },
];

/** What an authority is called, how it decides, and what it asks for. */
export function AuthorityForm({ action, authority }: Props) {
  const [state, send] = useActionState(action, untouched);
  return (
    <form action={send} noValidate>
      <FormMessage state={state} />
      <div className="formgrid">
        <TextField
          name="name"
          label="Name"
          state={state}
          initial={authority?.name}
          maxLength={120}
          required
        />
        <ChoiceField
          name="wish"
          label="How it wants a package"
          state={state}
          options={wishes}
          initial={authority?.wish}
        />
        <TextField
          name="reviewer"
          label="Its usual reviewer"
          state={state}
          initial={authority?.reviewer ?? ''}
          maxLength={120}
        />
        <TextField
          name="email"
          label="E-mail of the reviewer"
          type="email"
          state={state}
          initial={authority?.email ?? ''}
          maxLength={190}
        />
        <TextField
          name="decisions"
          label="Its words for decisions, one a line"
          state={state}
          initial={authority?.decisions.join('\n')}
          lines={5}
          note="The reviewer chooses one of these. Decisions already recorded keep their words."
        />
        <TextField
          name="checklist"
          label="What it wants seen to before sending, one a line"
          state={state}
          initial={authority?.checklist.join('\n')}
          lines={5}
          note="Each line is ticked off before a submittal goes out."
        />
      </div>
      <div className="row">
        <SubmitButton>Keep the authority</SubmitButton>
        <Link className="btn q" href="/office">
          Back to the office
        </Link>
      </div>
    </form>
  );
}
