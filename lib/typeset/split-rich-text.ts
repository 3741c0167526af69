import { texInWords } from '@/lib/typeset/tex-in-words';

/** A piece of rich text: words, bold words, or TeX; `bold` on TeX tells that it stands within bold words. */
export type RichPiece = { readonly kind: 'words' | 'tex'; readonly text: string; readonly bold: boolean };

/** Splits rich text at `$TeX$` and `**bold**`; `\$` is a dollar sign. */
export function splitRichText(text: string): RichPiece[] {
  const pieces: RichPiece[] = [];
  let bold = false;
  for (const [index, part] of text.split(/(?<!\\)\$/).entries()) {
    if (index % 2 === 1) {
      pieces.push({ kind: 'tex', text: part, bold });
      continue;
    }
    for (const [turn, words] of part.split('**').entries()) {
      if (turn > 0) bold = !bold;
      if (words !== '') pieces.push({ kind: 'words', text: words.replaceAll('\\$', '$'), bold });
    }
  }
  return pieces;
}

/** Rich text as plain words, for bookmarks, titles and alternative text. */
export function plainText(text: string): string {
  return splitRichText(text)
    .map((piece) => (piece.kind === 'tex' ? texInWords(piece.text) : piece.text))
    .join('');
}
