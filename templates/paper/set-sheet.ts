import { plainText } from '@/lib/typeset/split-rich-text';
import type { Typesetter } from '@/lib/typeset/typesetter';
import type { Block } from '../block';
import type { Imprint } from './imprint';
import { legendInk } from './legend';
import type { LineMarks } from './margin-note';
import { frameInk } from './page-frame';
import { type PaperSize, pageGeometry } from './page-geometry';
import { paginate } from './paginate';
import type { PrintedPage } from './printed-page';

/** A calc sheet as it is printed. */
export type PrintedSheet = {
  /** "S-03". */
  readonly number: string;
  readonly title: string;
  readonly blocks: readonly Block[];
  readonly marks?: Readonly<Record<string, LineMarks>>;
  /** Initials of the person whose marks are printed; with them the legend stands on each page. */
  readonly markedBy?: string;
};

export type SheetPlace = {
  readonly size: PaperSize;
  readonly imprint: Imprint;
  readonly sealed?: boolean;
  /** "13 of 31" of the page with this index on the sheet and this count of pages. */
  readonly place: (index: number, count: number) => string;
};

/** The sheet's pages, framed. Its first page is the destination named after its number, a line "S-03/7.5". */
export function setSheet(sheet: PrintedSheet, at: SheetPlace, typesetter: Typesetter): PrintedPage[] {
  const geometry = pageGeometry(at.size);
  const legend = legendInk(sheet, geometry, at.sealed ?? false, typesetter);
  const pages = paginate(
    sheet.blocks,
    { size: at.size, marks: sheet.marks, sealed: at.sealed, legend: legend.height },
    typesetter,
  );
  return pages.map((page, index) => {
    const label = `${sheet.number}.${index + 1}`;
    const words = {
      run: `${sheet.number} ${sheet.title}`,
      label,
      imprint: at.imprint,
      place: at.place(index, pages.length),
    };
    const headings = page.anchors.filter(({ heading }) => heading !== undefined);
    return {
      ink: [...frameInk(words, geometry, typesetter), ...legend.ink, ...page.ink],
      label,
      destinations: [
        ...(index === 0 ? [{ name: sheet.number, y: 0 }] : []),
        ...page.anchors.map(({ block, y }) => ({ name: `${sheet.number}/${block}`, y })),
      ],
      bookmarks: [
        ...(index === 0 ? [{ title: `${sheet.number} ${sheet.title}`, level: 0 as const, y: 0 }] : []),
        ...headings.map(({ block, y, heading = '' }) => ({
          title: `${block} ${plainText(heading)}`,
          level: 1 as const,
          y,
        })),
      ],
    };
  });
}
