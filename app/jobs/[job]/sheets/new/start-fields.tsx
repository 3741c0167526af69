import { ChoiceField } from '@/app/components/choice-field';
import type { FormState } from '@/app/components/form-state';
import { TextField } from '@/app/components/text-field';
import type { StartField } from './starts';

interface Props {
  fields: readonly StartField[];
  state: FormState;
  units: 'US' | 'SI';
}

const examples: Record<string, Record<Props['units'], string>> = {
  bays: { US: '2 @ 24\'-0"; 18\'-6"', SI: '2 @ 7.2 m; 6 m' },
  heights: { US: '14\'-0"; 2 @ 12\'-0"', SI: '4.2 m; 2 @ 3.6 m' },
};

/** What the chosen starting sheet asks for. */
export function StartFields({ fields, state, units }: Props) {
  return (
    <div className="formgrid">
      {fields.map((field) =>
        field.choices ? (
          <ChoiceField
            key={field.name}
            name={field.name}
            label={field.label}
            options={field.choices}
            state={state}
          />
        ) : (
          <TextField
            key={field.name}
            name={field.name}
            label={field.label}
            state={state}
            maxLength={200}
            note={field.note}
            placeholder={examples[field.name]?.[units] ?? (units === 'US' ? '24\'-0"' : '7.2 m')}
            required
          />
        ),
      )}
    </div>
  );
}
