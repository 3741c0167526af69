import type { Typesetter } from '@/lib/typeset/typesetter';
import { type Ink, moved } from './ink';
import { crossIcon, deltaIcon, queryIcon, tickIcon } from './mark-icons';
import type { PageGeometry } from './page-geometry';
import { baseline, LOOKS, MM } from './paper-look';
import { setLines, wordInk } from './set-words';

/** What checking and revising left on a line; shapes first, so that they read in grey. */
export type LineMarks = {
  readonly mark?: 'agrees' | 'correct' | 'query';
  /** The revision in which the line last changed. */
  readonly changedIn?: number;
};

type Note = { readonly ink: Ink[]; readonly height: number };

/**
 * Number, source and marks of a line, outside the double rule: ink from the left edge of the text, so x is negative.
 * `first` is where the baseline of the line's own first words lies under its top.
 */
export function marginNote(
  line: { id: string; source?: string; marks?: LineMarks; heading?: boolean },
  first: number,
  page: PageGeometry,
  typesetter: Typesetter,
): Note {
  const right = page.marginRight - page.textLeft;
  const left = page.marginLeft - page.textLeft;
  const look = line.heading ? LOOKS.headingNumber : LOOKS.number;
  const number = wordInk(line.id, look, 'ink', { x: right, y: first, side: 'right' }, typesetter);
  const ink: Ink[] = [number];
  if (line.marks?.changedIn !== undefined) {
    ink.push(...deltaIcon(line.marks.changedIn, number.x - 2.2 * MM, first, typesetter));
  }
  if (line.marks?.mark) ink.push(...MARK[line.marks.mark](left, first));
  let y = first - baseline(look) + look.leading;
  if (line.source) {
    y += 0.4 * MM;
    for (const set of setLines(line.source, LOOKS.source, 'ink2', right - left, typesetter, 'right')) {
      ink.push(...set.ink.map((mark) => moved(mark, left, y)));
      y += set.height;
    }
  }
  return { ink, height: y };
}

const MARK = { agrees: tickIcon, correct: crossIcon, query: queryIcon };
