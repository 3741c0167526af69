import { Fragment, type ReactNode } from 'react';
import { renderTex } from './render-tex';
import { splitRichText } from './split-rich-text';

/** Rich text of a block: words, `**bold**`, `$TeX$`. A mark that follows a formula stays on its line. */
export function RichText({ text }: { text: string }): ReactNode {
  const pieces = splitRichText(text);
  const nodes: ReactNode[] = [];
  for (let i = 0; i < pieces.length; i++) {
    const piece = pieces[i];
    if (!piece) continue;
    const key = `${i}`;
    if (piece.kind === 'bold') nodes.push(<b key={key}>{piece.text}</b>);
    else if (piece.kind === 'words') nodes.push(<Fragment key={key}>{piece.text}</Fragment>);
    else {
      const next = pieces[i + 1];
      const mark = next && next.kind !== 'tex' ? /^[.,;:!?)]+/.exec(next.text)?.[0] : undefined;
      const math = renderTex(piece.text);
      if (!next || !mark) nodes.push(<Fragment key={key}>{math}</Fragment>);
      else {
        nodes.push(
          <span key={key} className="keep">
            {math}
            {mark}
          </span>,
        );
        pieces[i + 1] = { ...next, text: next.text.slice(mark.length) };
      }
    }
  }
  return nodes;
}
