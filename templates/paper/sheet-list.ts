import type { Typesetter } from '@/lib/typeset/typesetter';
import { type SignOff, writeDate } from './imprint';
import type { Ink } from './ink';
import { deltaIcon } from './mark-icons';
import type { PackageSheet } from './package-print';
import type { PageGeometry } from './page-geometry';
import { LOOKS, MM, type PaperTone } from './paper-look';
import { setLines, wordInk } from './set-words';

const LOOK = { ...LOOKS.text, size: 9.2, leading: 13 };
const HEAD = { ...LOOKS.text, size: 7.8, leading: 10 };
const NUMBER = { ...LOOK, regular: 'Inter-600' as const };

export const LIST_HEAD = 5.4 * MM;
export const LIST_ROW = 7.35 * MM;

/** Left edges of the columns after the title, from the right edge of the text. */
const COLUMNS = { revision: 71 * MM, originator: 60 * MM, checker: 35 * MM };

/** Heads of a list of sheets, their top at y. */
export function listHead(page: PageGeometry, y: number, typesetter: Typesetter): Ink[] {
  const right = page.textLeft + page.textWidth;
  const base = y + 3.2 * MM;
  const word = (text: string, x: number, side: 'left' | 'right' = 'left') =>
    wordInk(text, HEAD, 'ink2', { x, y: base, side }, typesetter);
  return [
    word('sheet', page.marginRight, 'right'),
    word('Rev', right - COLUMNS.revision),
    word('Originator', right - COLUMNS.originator),
    word('Checker', right - COLUMNS.checker),
    word('Page', right, 'right'),
    rule(page, y + LIST_HEAD - 0.3 * MM, 'ink'),
  ];
}

/** One sheet of the list: number, title, revision, who and when, page; the whole row leads to the sheet. */
export function listRow(
  entry: { title: string; page: number; to: string; sheet?: PackageSheet },
  page: PageGeometry,
  y: number,
  typesetter: Typesetter,
): Ink[] {
  const right = page.textLeft + page.textWidth;
  const base = y + 4.7 * MM;
  const { sheet } = entry;
  const word = (text: string, x: number, side: 'left' | 'right' = 'left') =>
    wordInk(text, LOOK, 'ink', { x, y: base, side }, typesetter);
  const ink: Ink[] = [
    ...titleInk(
      entry.title,
      sheet ? page.textWidth - COLUMNS.revision - 3 * MM : page.textWidth - 12 * MM,
      page,
      base,
      typesetter,
    ),
    word(`${entry.page}`, right, 'right'),
    rule(page, y + LIST_ROW, 'hairline'),
    { kind: 'link', x: page.textLeft, y, width: page.textWidth, height: LIST_ROW, to: entry.to },
  ];
  if (!sheet) return ink;
  const number = wordInk(
    sheet.number,
    NUMBER,
    'ink',
    { x: page.marginRight, y: base, side: 'right' },
    typesetter,
  );
  ink.push(number, word(`${sheet.revision}`, right - COLUMNS.revision));
  ink.push(word(signed(sheet.originator), right - COLUMNS.originator));
  if (sheet.checker) ink.push(word(signed(sheet.checker), right - COLUMNS.checker));
  if (sheet.since === 'changed')
    ink.push(...deltaIcon(sheet.revision, number.x - 2.2 * MM, base, typesetter));
  if (sheet.since === 'new')
    ink.push(wordInk('new', HEAD, 'ink2', { x: number.x - 2.2 * MM, y: base, side: 'right' }, typesetter));
  return ink;
}

/** A title on one line, its size taken down where it is too long. */
function titleInk(
  title: string,
  width: number,
  page: PageGeometry,
  y: number,
  typesetter: Typesetter,
): Ink[] {
  const natural = typesetter.text(title, LOOK.regular).width * LOOK.size;
  const size = LOOK.size * Math.max(0.75, Math.min(1, width / natural));
  const [line] = setLines(title, { ...LOOK, size }, 'ink', width, typesetter);
  const own = line?.ink[0];
  const shift = y - (own && 'y' in own ? own.y : 0);
  return (line?.ink ?? []).map(
    (mark) =>
      ({
        ...mark,
        x: page.textLeft + ('x' in mark ? mark.x : 0),
        y: ('y' in mark ? mark.y : 0) + shift,
      }) as Ink,
  );
}

/** Initials and day without the year: the imprint of the sheet has it. */
function signed({ initials, date }: SignOff): string {
  return `${initials} ${writeDate(date).replace(/ \d{4}$/, '')}`;
}

function rule(page: PageGeometry, y: number, tone: PaperTone): Ink {
  return {
    kind: 'line',
    x1: page.textLeft,
    y1: y,
    x2: page.textLeft + page.textWidth,
    y2: y,
    width: 0.25 * MM,
    tone,
  };
}
