import { type CSSProperties, createElement, type ReactNode } from 'react';
import type { EquationRow } from '../block';
import { widestPiece } from './lay-out-label';
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
  if (chain.length === 0) return wholeRow(lhs, notes);
  const last = chain.length - 1;
  const links = chain.map((member, i) => {
    const tex = i === last && boxed ? `${equals}\\boxed{${member}}` : `${equals}${member}`;
    return createElement('span', { className: 'link', style: piece(tex) }, <Tex display>{tex}</Tex>);
  });
  return (
    <div className="eq">
      <span className="lhs">{lhs === '' ? null : <Tex display>{lhs}</Tex>}</span>
      {createElement('span', { className: 'chain' }, ...links, notes)}
    </div>
  );
}

function wholeRow(tex: string, notes: ReactNode) {
  return (
    <div className="eq whole" style={piece(tex)}>
      <Tex display>{tex}</Tex>
      {notes}
    </div>
  );
}

/** Tells the style sheet how wide the widest unbreakable piece is, so that it can be set small enough to fit. */
function piece(tex: string): CSSProperties {
  const width = widestPiece(`\\displaystyle ${tex}`);
  return { '--piece': width.toFixed(2) } as CSSProperties;
}
