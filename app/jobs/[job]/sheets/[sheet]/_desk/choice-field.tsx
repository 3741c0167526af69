'use client';

import { useId } from 'react';
import { useDesk } from './desk-context';

interface Props<T extends string> {
  path: string;
  label: string;
  value: T;
  options: readonly { value: T; label: string }[];
  onChoose?: (value: T) => void;
}

/** One of a few words. */
export function ChoiceField<T extends string>({ path, label, value, options, onChoose }: Props<T>) {
  const id = useId();
  const { edit } = useDesk();
  return (
    <div className="fld">
      <label htmlFor={id}>{label}</label>
      <div className="wr">
        <select
          id={id}
          data-path={path}
          className="val"
          value={value}
          onChange={(e) => {
            const chosen = options.find((o) => o.value === e.target.value);
            if (!chosen) return;
            if (onChoose) onChoose(chosen.value);
            else edit(path, chosen.value);
          }}
        >
          {options.map((o) => (
            <option key={o.value} value={o.value}>
              {o.label}
            </option>
          ))}
        </select>
      </div>
    </div>
  );
}
