import { type HTMLInputTypeAttribute, useId } from 'react';
import { type FormState, messageAt, typedValue } from './form-state';

interface TextFieldProps {
  name: string;
  label: string;
  state: FormState;
  type?: HTMLInputTypeAttribute;
  initial?: string;
  placeholder?: string;
  autoComplete?: string;
  maxLength?: number;
  lines?: number;
  note?: string;
  required?: boolean;
}

/** One written field: label above, the line it is written on, the reason of a refusal below. */
export function TextField({
  name,
  label,
  state,
  type = 'text',
  initial,
  note,
  lines,
  ...rest
}: TextFieldProps) {
  const id = useId();
  const error = messageAt(state, name);
  const secret = type === 'password';
  const field = {
    ...rest,
    id,
    name,
    className: 'val',
    defaultValue: secret ? undefined : typedValue(state, name, initial),
    'aria-invalid': error ? true : undefined,
    'aria-describedby': error || note ? `${id}-says` : undefined,
  };
  return (
    <div className="fld">
      <label htmlFor={id}>{label}</label>
      <div className={error ? 'wr err' : 'wr'}>
        {lines ? <textarea {...field} rows={lines} /> : <input {...field} type={type} />}
      </div>
      {error || note ? (
        <p id={`${id}-says`} className={error ? 'ans e' : 'ans'}>
          {error ?? note}
        </p>
      ) : null}
    </div>
  );
}
