import { useId } from 'react';
import { type FormState, messageAt, typedValue } from './form-state';

interface ChoiceFieldProps {
  name: string;
  label: string;
  state: FormState;
  options: readonly { value: string; label: string }[];
  initial?: string;
  note?: string;
}

/** One of a few words. */
export function ChoiceField({ name, label, state, options, initial, note }: ChoiceFieldProps) {
  const id = useId();
  const error = messageAt(state, name);
  const value = typedValue(state, name, initial ?? options[0]?.value);
  return (
    <div className="fld">
      <label htmlFor={id}>{label}</label>
      <div className={error ? 'wr err' : 'wr'}>
        <select
          // React resets a form after its action; the key lets the choice made survive a refusal.
          key={value}
          id={id}
          name={name}
          className="val"
          defaultValue={value}
          aria-invalid={error ? true : undefined}
          aria-describedby={error || note ? `${id}-says` : undefined}
        >
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      </div>
      {error || note ? (
        <p id={`${id}-says`} className={error ? 'ans e' : 'ans'}>
          {error ?? note}
        </p>
      ) : null}
    </div>
  );
}
