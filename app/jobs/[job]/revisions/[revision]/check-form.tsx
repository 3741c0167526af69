'use client';

import { useActionState } from 'react';
import { ChoiceField } from '@/app/components/choice-field';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';

const categories = [
  { value: '0', label: '0, standard solution' },
  { value: '1', label: '1, another member of the team' },
  { value: '2', label: '2, not involved and not consulted' },
  { value: '3', label: '3, another organisation' },
];

interface Props {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  checkers: { id: string; name: string }[];
}

/** Who checks, and how independently (categories as in BS 5975 and CG 300). */
export function CheckForm({ action, checkers }: Props) {
  const [state, send] = useActionState(action, untouched);
  if (checkers.length === 0) return <p>The office has no checker other than the originator.</p>;
  return (
    <form action={send} aria-label="Send to check" className="grid gap-3">
      <ChoiceField
        name="checkerId"
        label="Checker"
        state={state}
        options={checkers.map((c) => ({ value: c.id, label: c.name }))}
      />
      <ChoiceField name="category" label="Independence" state={state} options={categories} initial="1" />
      <FormMessage state={state} />
      <SubmitButton>Send to check</SubmitButton>
    </form>
  );
}
