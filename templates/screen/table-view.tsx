import { createElement } from 'react';
import type { TableBlock } from '../block';
import { RichText } from './rich-text';
import { Tex } from './tex';

/** A table of the calculation: meaning and unit in the head, totals bold under a rule. */
export function TableView({ block }: { block: TableBlock }) {
  const { caption, columns, rows, note, id } = block;
  const heads = columns.map(({ head, unit, align }) =>
    createElement(
      'th',
      { scope: 'col', className: `to-${align}` },
      <RichText text={head} />,
      unit === undefined ? null : (
        <span className="unit">
          <Tex>{unit}</Tex>
        </span>
      ),
    ),
  );
  const lines = rows.map(({ cells, emphasis }) =>
    createElement(
      'tr',
      { className: emphasis },
      ...cells.map((cell, i) =>
        createElement('td', { className: `to-${columns[i]?.align ?? 'left'}` }, <RichText text={cell} />),
      ),
    ),
  );
  const table = (
    <table className="cal">
      <thead>{createElement('tr', null, ...heads)}</thead>
      {createElement('tbody', null, ...lines)}
    </table>
  );
  // A wide table scrolls inside its column, by keyboard as well (WCAG 2.1.1), so the box takes the focus.
  const box = createElement(
    'section',
    { className: 'tablebox', 'aria-label': `Table at ${id}`, tabIndex: 0 },
    table,
  );
  return (
    <>
      {caption === undefined ? null : (
        <p>
          <RichText text={caption} />
        </p>
      )}
      {box}
      {note === undefined ? null : (
        <p className="note">
          <RichText text={note} />
        </p>
      )}
    </>
  );
}
