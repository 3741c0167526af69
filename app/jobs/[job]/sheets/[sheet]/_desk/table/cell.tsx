'use client';

import { type ClipboardEvent, type KeyboardEvent, useId, useState } from 'react';
import { useDesk, useFieldError } from '../desk-context';
import { understood, unitWord } from '../understood';
import { type Column, kindOf, optionsOf } from './column';

interface Props<Row> {
  row: Row;
  column: Column<Row>;
  /** "row:column", by which the table moves the focus. */
  place: string;
  path: string;
  name: string;
  onWrite: (row: Row) => void;
  onKey: (event: KeyboardEvent<HTMLElement>) => void;
  onPaste: (event: ClipboardEvent) => void;
}

/** One cell: words to choose from, or text with what was understood or is wrong on a slip below it. */
export function Cell<Row>({ row, column, place, path, name, onWrite, onKey, onPaste }: Props<Row>) {
  const id = useId();
  const { draft, visit } = useDesk();
  const [focused, setFocused] = useState(false);
  const text = column.read(row);
  const error = useFieldError(path, text);
  const align = column.align === 'right' ? 'r' : undefined;
  if (column.used && !column.used(row)) return <td className="unused" />;

  if (column.fixed) return <td className="num">{text}</td>;

  const options = optionsOf(column, row);
  if (options) {
    return (
      <td className={error ? 'cerr' : undefined}>
        <select
          aria-label={name}
          data-cell={place}
          data-path={path}
          aria-invalid={error ? true : undefined}
          value={text}
          onKeyDown={onKey}
          onChange={(e) => onWrite(column.write(row, e.target.value))}
          onBlur={() => visit(path)}
        >
          {options.some((o) => o.value === text) ? null : (
            <option value={text}>{text === '' ? '–' : text}</option>
          )}
          {options.map((o) => (
            <option key={o.value} value={o.value}>
              {o.label}
            </option>
          ))}
        </select>
      </td>
    );
  }
  const kind = kindOf(column, row);
  const read = kind && focused ? understood(text, kind, draft.units, column.L?.(row)) : undefined;
  const slip = focused ? (error ?? (read ? `understood: ${read}` : undefined)) : undefined;
  return (
    <td className={[align, error ? 'cerr' : undefined].filter(Boolean).join(' ')}>
      <input
        aria-label={error && !focused ? `${name}: ${error}` : name}
        data-cell={place}
        data-path={path}
        className={kind ? 'num' : undefined}
        value={text}
        placeholder={kind && column.unit === undefined ? unitWord(kind, draft.units) : undefined}
        autoComplete="off"
        spellCheck={false}
        aria-invalid={error ? true : undefined}
        aria-describedby={slip ? id : undefined}
        onChange={(e) => onWrite(column.write(row, e.target.value))}
        onKeyDown={onKey}
        onPaste={onPaste}
        onFocus={(e) => {
          setFocused(true);
          e.target.select();
        }}
        onBlur={() => {
          setFocused(false);
          visit(path);
        }}
      />
      {slip ? (
        <span id={id} role="status" className={error ? 'slip e' : 'slip'}>
          {slip}
        </span>
      ) : null}
    </td>
  );
}
