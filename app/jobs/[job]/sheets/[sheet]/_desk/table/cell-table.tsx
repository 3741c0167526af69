'use client';

import { type ClipboardEvent, type KeyboardEvent, useRef } from 'react';
import { flushSync } from 'react-dom';
import type { ShapeRef } from '@/lib/figures/drawing';
import { useDesk } from '../desk-context';
import { Cell } from './cell';
import type { Column } from './column';
import { fillDown, pasteBlock, readBlock } from './paste-block';

interface Props<Row> {
  /** Path of a row in the draft: "cases.0.loads.3". */
  pathOf: (index: number) => string;
  label: string;
  rows: readonly Row[];
  columns: readonly Column<Row>[];
  /** Writes the rows; `place` names what was touched, so that typing in one cell is one step to undo. */
  onRows: (rows: Row[], place: string) => void;
  /** How a row is added; absent: the rows are given. */
  add?: { label: string; blank: (rows: readonly Row[]) => Row };
  refOf?: (row: Row, index: number) => ShapeRef | undefined;
}

/** A table one types into: arrows, Enter and Tab move; a block may be pasted; Ctrl D fills down. */
export function CellTable<Row>({ pathOf, label, rows, columns, onRows, add, refOf }: Props<Row>) {
  const { lit, light } = useDesk();
  const table = useRef<HTMLTableElement>(null);

  /** At once, so that the next key already goes to the new cell. */
  const focusCell = (row: number, column: number) =>
    table.current?.querySelector<HTMLElement>(`[data-cell="${row}:${column}"]`)?.focus();
  const addRow = (at: number, copied?: Row) => {
    if (!add) return;
    const row = copied ?? add.blank(rows);
    flushSync(() => onRows([...rows.slice(0, at), row, ...rows.slice(at)], `${label} added`));
    focusCell(
      at,
      columns.findIndex((c) => !c.used || c.used(row)),
    );
  };
  const removeRow = (at: number) => {
    if (!add) return;
    const left = rows.filter((_, i) => i !== at);
    flushSync(() => onRows(left, `${label} removed`));
  };

  const onKey = (event: KeyboardEvent<HTMLElement>, row: number, column: number) => {
    const command = event.ctrlKey || event.metaKey;
    const chosen = columns[column];
    const current = rows[row];
    if (!chosen || current === undefined) return;
    if (event.key === 'Enter' && !event.shiftKey && !command) {
      event.preventDefault();
      if (row === rows.length - 1) addRow(rows.length);
      else focusCell(row + 1, column);
    } else if (command && event.key.toLowerCase() === 'd') {
      event.preventDefault();
      if (row > 0) onRows(fillDown(rows, chosen, row), `${pathOf(row)} filled`);
    } else if (command && event.key === 'Enter') {
      event.preventDefault();
      addRow(row + 1, current);
    } else if (command && event.key === 'Backspace') {
      event.preventDefault();
      removeRow(row);
      focusCell(Math.max(0, row - 1), column);
    } else if (event.target instanceof HTMLInputElement && !command && !event.altKey) {
      move(event, event.target, row, column);
    }
  };
  const move = (event: KeyboardEvent, input: HTMLInputElement, row: number, column: number) => {
    const atStart = input.selectionStart === 0 && input.selectionEnd === 0;
    const atEnd = input.selectionStart === input.value.length;
    const steps: Record<string, [number, number] | undefined> = {
      ArrowUp: [-1, 0],
      ArrowDown: [1, 0],
      ArrowLeft: atStart ? [0, -1] : undefined,
      ArrowRight: atEnd ? [0, 1] : undefined,
    };
    const step = steps[event.key];
    if (!step) return;
    event.preventDefault();
    focusCell(row + step[0], column + step[1]);
  };
  const onPaste = (event: ClipboardEvent, row: number, column: number) => {
    const block = readBlock(event.clipboardData.getData('text/plain'));
    if (block.length === 1 && block[0]?.length === 1) return;
    event.preventDefault();
    const made = add ? () => add.blank(rows) : undefined;
    onRows(pasteBlock(rows, columns, { row, column }, block, made), `${label} pasted`);
  };

  return (
    <div className="tbl">
      <table className="cells" ref={table} aria-label={label}>
        <thead>
          <tr>
            <th scope="col" className="rowno">
              <span className="sr-only">Row</span>
            </th>
            {columns.map((c) => (
              <th
                key={c.key}
                scope="col"
                style={{ width: c.width }}
                className={c.align === 'right' ? 'r' : undefined}
              >
                {c.head}
                {c.unit ? <span className="num block">{c.unit}</span> : null}
              </th>
            ))}
            <th scope="col" className="rowdo">
              <span className="sr-only">Remove</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row, i) => {
            const ref = refOf?.(row, i);
            const on = ref && lit?.of === ref.of && lit.id === ref.id;
            return (
              <tr
                key={pathOf(i)}
                className={on ? 'on' : undefined}
                onFocus={() => light(ref)}
                onMouseEnter={() => light(ref)}
              >
                <th scope="row" className="rowno">
                  {i + 1}
                </th>
                {columns.map((c, k) => (
                  <Cell
                    key={c.key}
                    row={row}
                    column={c}
                    place={`${i}:${k}`}
                    path={`${pathOf(i)}.${c.field}`}
                    name={`${c.head}, row ${i + 1}`}
                    onWrite={(next) =>
                      onRows(
                        rows.map((r, at) => (at === i ? next : r)),
                        `${pathOf(i)}.${c.field}`,
                      )
                    }
                    onKey={(e) => onKey(e, i, k)}
                    onPaste={(e) => onPaste(e, i, k)}
                  />
                ))}
                <td className="rowdo">
                  {add ? (
                    <button type="button" aria-label={`Remove row ${i + 1}`} onClick={() => removeRow(i)}>
                      ×
                    </button>
                  ) : null}
                </td>
              </tr>
            );
          })}
        </tbody>
      </table>
      {add ? (
        <button type="button" className="addrow" onClick={() => addRow(rows.length)}>
          {add.label}
        </button>
      ) : null}
    </div>
  );
}
