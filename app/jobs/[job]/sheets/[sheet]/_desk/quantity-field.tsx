'use client';

import { useId, useState } from 'react';
import type { KindName } from '@/lib/units/kind';
import { useDesk, useFieldError } from './desk-context';
import { understood, unitWord } from './understood';

interface Props {
  path: string;
  label: string;
  text: string;
  kind: KindName;
  hint?: string;
  optional?: boolean;
}

/** A quantity written on a line: its unit at the end, what was understood below it, or what is wrong. */
export function QuantityField({ path, label, text, kind, hint, optional }: Props) {
  const id = useId();
  const { draft, edit, visit } = useDesk();
  const error = useFieldError(path, text);
  const [focused, setFocused] = useState(false);
  const read = focused ? understood(text, kind, draft.units) : undefined;
  const unit = unitWord(kind, draft.units);
  const said = error ?? (read ? `understood: ${read}` : hint);
  return (
    <div className="fld">
      <label htmlFor={id}>
        {label}
        {optional ? <span className="text-ink3"> (if it counts)</span> : null}
      </label>
      <div className={error ? 'wr err' : 'wr'}>
        <input
          id={id}
          data-path={path}
          className="val num"
          value={text}
          autoComplete="off"
          spellCheck={false}
          aria-invalid={error ? true : undefined}
          aria-describedby={said ? `${id}-said` : undefined}
          onChange={(e) => edit(path, e.target.value)}
          onFocus={() => setFocused(true)}
          onBlur={() => {
            setFocused(false);
            visit(path);
          }}
        />
        {unit ? <span className="unit">{unit}</span> : null}
      </div>
      <p id={`${id}-said`} className={error ? 'ans e' : 'ans'} aria-live="polite">
        {said ?? ''}
      </p>
    </div>
  );
}
