/** A piece of rich text: words, bold words, or TeX. */
export type RichPiece = { kind: 'words' | 'bold' | 'tex'; text: string };

/** Splits rich text at `$TeX$` and `**bold**`; `\$` is a dollar sign. Mathematics inside bold stays mathematics. */
export function splitRichText(text: string): RichPiece[] {
  const pieces: RichPiece[] = [];
  let bold = false;
  for (const [i, part] of text.split(/(?<!\\)\$/).entries()) {
    if (i % 2 === 1) {
      pieces.push({ kind: 'tex', text: part });
      continue;
    }
    for (const [j, words] of part.split('**').entries()) {
      if (j > 0) bold = !bold;
      if (words !== '') pieces.push({ kind: bold ? 'bold' : 'words', text: words.replaceAll('\\$', '$') });
    }
  }
  return pieces;
}
