import { splitRichText } from '@/lib/typeset/split-rich-text';
import type { Typesetter } from '@/lib/typeset/typesetter';
import { type Ink, moved } from './ink';
import type { PageGeometry } from './page-geometry';
import { baseline, LOOKS, MM } from './paper-look';
import type { CoverEntry } from './set-cover';
import { setLines, wordInk } from './set-words';
import { LIST_HEAD, LIST_ROW, listHead, listRow } from './sheet-list';

/** A sheet of the index with its sections, each with the page and the destination it leads to. */
export type IndexEntry = CoverEntry & {
  readonly sections: readonly {
    readonly id: string;
    readonly title: string;
    readonly page: number;
    readonly to: string;
  }[];
};

const LOOK = { ...LOOKS.text, size: 8.4, leading: 11.6 };
const HEADING = 12 * MM;

/** The index, page by page, ending above a seal; how many pages there are does not depend on the numbers they print. */
export function setIndex(
  entries: readonly IndexEntry[],
  page: PageGeometry,
  typesetter: Typesetter,
  sealed: boolean,
): Ink[][] {
  const bottom = sealed ? page.marginSeal.y - 2 * MM : page.bottom;
  const pages: Ink[][] = [];
  let y = Number.POSITIVE_INFINITY;
  const turn = () => {
    const title = pages.length === 0 ? '**Index**' : '**Index** continued';
    const heading = setLines(title, LOOKS.headingAgain, 'ink', page.textWidth, typesetter)[0];
    pages.push((heading?.ink ?? []).map((mark) => moved(mark, page.textLeft, page.top)));
    pages.at(-1)?.push(...listHead(page, page.top + HEADING - LIST_HEAD, typesetter));
    y = page.top + HEADING;
  };
  for (const entry of entries) {
    // A sheet's row stays with its first sections.
    if (y + LIST_ROW + Math.min(2, entry.sections.length) * LOOK.leading > bottom) turn();
    pages.at(-1)?.push(...listRow(entry, page, y, typesetter));
    y += LIST_ROW + (entry.sections.length > 0 ? 1 * MM : 0);
    for (const section of entry.sections) {
      if (y + LOOK.leading > bottom) turn();
      pages.at(-1)?.push(...sectionInk(section, page, y, typesetter));
      y += LOOK.leading;
    }
    y += entry.sections.length > 0 ? 2 * MM : 0;
  }
  return pages;
}

function sectionInk(
  section: IndexEntry['sections'][number],
  page: PageGeometry,
  y: number,
  typesetter: Typesetter,
): Ink[] {
  const indent = 8 * MM;
  const right = page.textLeft + page.textWidth;
  const base = y + baseline(LOOK);
  const title = singleLine(section.title, page.textWidth - indent - 14 * MM, typesetter);
  return [
    wordInk(
      section.id,
      LOOK,
      'ink2',
      { x: page.textLeft + indent - 2.4 * MM, y: base, side: 'right' },
      typesetter,
    ),
    ...title.map((mark) => moved(mark, page.textLeft + indent, base)),
    wordInk(`${section.page}`, LOOK, 'ink2', { x: right, y: base, side: 'right' }, typesetter),
    { kind: 'link', x: page.textLeft, y, width: page.textWidth, height: LOOK.leading, to: section.to },
  ];
}

/** The title on its baseline, cut at the end of a line with an ellipsis. */
function singleLine(title: string, width: number, typesetter: Typesetter): Ink[] {
  const [line, more] = setLines(title, LOOK, 'ink2', width, typesetter);
  const first = line?.ink.find((mark) => mark.kind === 'words' || mark.kind === 'math');
  const ink = (line?.ink ?? []).map((mark) => moved(mark, 0, -(first && 'y' in first ? first.y : 0)));
  if (more && splitRichText(title).length > 0)
    ink.push(wordInk('…', LOOK, 'ink2', { x: line?.width ?? 0, y: 0 }, typesetter));
  return ink;
}
