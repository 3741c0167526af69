import { createElement } from 'react';
import type { EquationRow } from '../block';
import { RichText } from './rich-text';
import { Tex } from './tex';

/** The sign is set as a letter, or KaTeX would let a line end after it; what follows it begins anew, so −x has no gap. */
const equals = '{=}\\;\\mathopen{}';

/** One row of a chain of equalities; it breaks before an equals sign, and the next member stands under the first. */
export function EquationView({ row }: { row: EquationRow }) {
  const { lhs, chain, boxed, note } = row;
  const notes =
    note === undefined ? null : (
      <span className="eqnote">
        <RichText text={note} />
      </span>
    );
  if (chain.length === 0) {
    return (
      <div className="eq whole">
        <Tex display>{lhs}</Tex>
        {notes}
      </div>
    );
  }
  const last = chain.length - 1;
  const links = chain.map((member, i) =>
    createElement(
      'span',
      { className: 'link' },
      <Tex display>{i === last && boxed ? `${equals}\\boxed{${member}}` : `${equals}${member}`}</Tex>,
    ),
  );
  return (
    <div className="eq">
      <span className="lhs">{lhs === '' ? null : <Tex display>{lhs}</Tex>}</span>
      {createElement('span', { className: 'chain' }, ...links, notes)}
    </div>
  );
}
