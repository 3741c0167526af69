'use client';

import { useActionState, useState } from 'react';
import { ChoiceField } from '@/app/components/choice-field';
import { FormMessage } from '@/app/components/form-message';
import { type FormState, untouched } from '@/app/components/form-state';
import { SubmitButton } from '@/app/components/submit-button';
import { TextField } from '@/app/components/text-field';
import { categories, categorySource } from '@/lib/model/independence';

const options = categories.map(({ category, name }) => ({
  value: `${category}`,
  label: `${category}, ${name}`,
}));

interface Props {
  action: (state: FormState, form: FormData) => Promise<FormState>;
  checkers: { id: string; name: string }[];
}

/** Who checks, how independently, and whether every input is to be held against a drawing. */
export function CheckForm({ action, checkers }: Props) {
  const [state, send] = useActionState(action, untouched);
  const [category, setCategory] = useState('1');
  if (checkers.length === 0) return <p>The office has no checker other than the originator.</p>;
  return (
    <form action={send} aria-label="Send to check" className="grid gap-3">
      <ChoiceField
        name="checkerId"
        label="Checker"
        state={state}
        options={checkers.map((c) => ({ value: c.id, label: c.name }))}
      />
      <div onChange={(e) => e.target instanceof HTMLSelectElement && setCategory(e.target.value)}>
        <ChoiceField
          name="category"
          label="Independence"
          state={state}
          options={options}
          initial="1"
          note={`${categories[Number(category)]?.rule} (${categorySource})`}
        />
      </div>
      {category === '0' ? (
        <TextField name="standardSolution" label="Standard solution" state={state} maxLength={200} />
      ) : null}
      {Number(category) >= 2 ? (
        <p className="ans">
          The checker works without this sheet: they derive their own, and the two are compared value by
          value.
        </p>
      ) : (
        <label className="declare">
          <input type="checkbox" name="blind" value="yes" />
          The checker works without this sheet, and derives their own.
        </label>
      )}
      <label className="declare">
        <input type="checkbox" name="inputsAsked" value="yes" defaultChecked />
        Every input is held against a drawing before the sheet is agreed.
      </label>
      <FormMessage state={state} />
      <SubmitButton>Send to check</SubmitButton>
    </form>
  );
}
