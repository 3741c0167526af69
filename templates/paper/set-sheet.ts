import { plainText } from '@/lib/typeset/split-rich-text';
import type { Typesetter } from '@/lib/typeset/typesetter';
import type { Block } from '../block';
import type { Imprint } from './imprint';
import { legendInk } from './legend';
import type { LineMarks } from './margin-note';
import { frameInk } from './page-frame';
import { type PaperSize, pageGeometry } from './page-geometry';
import { type Page, paginate } from './paginate';
import type { Bookmark, PrintedPage } from './printed-page';

/** A calc sheet as it is printed. */
export type PrintedSheet = {
  /** "S-03"; of the package's own last pages their name. */
  readonly number: string;
  /** Not a sheet of the job: its title stands alone, and its only page bears the bare name. */
  readonly unnumbered?: boolean;
  readonly title: string;
  readonly blocks: readonly Block[];
  readonly marks?: Readonly<Record<string, LineMarks>>;
  /** Initials of the person whose marks are printed; with them the legend stands on each page. */
  readonly markedBy?: string;
};

export type SheetLook = {
  readonly size: PaperSize;
  /** Keep the margin's foot free for a seal on every page. */
  readonly sealed?: boolean;
};

/** Where a sheet's pages stand: what the foot line says, and "13 of 31" of the page with this index. */
export type SheetPlace = {
  readonly imprint: Imprint;
  readonly place: (index: number) => string;
};

/** A sheet set and broken into pages, but not yet framed: the count is known before the numbers are. */
export type FlowedSheet = {
  readonly count: number;
  frame(at: SheetPlace): PrintedPage[];
};

/** Sets a sheet. Its first page is the destination named after its number, a line of it "S-03/7.5". */
export function setSheet(sheet: PrintedSheet, look: SheetLook, typesetter: Typesetter): FlowedSheet {
  const geometry = pageGeometry(look.size);
  const legend = legendInk(sheet, geometry, look.sealed ?? false, typesetter);
  const options = { ...look, marks: sheet.marks, legend: legend.height };
  const pages = paginate(sheet.blocks, options, typesetter);
  const name = sheet.unnumbered ? sheet.title : `${sheet.number} ${sheet.title}`;
  const frame = ({ imprint, place }: SheetPlace) =>
    pages.map((page, index): PrintedPage => {
      const label = sheet.unnumbered && index === 0 ? sheet.number : `${sheet.number}.${index + 1}`;
      const words = { run: name, label, imprint, place: place(index) };
      return {
        ink: [...frameInk(words, geometry, typesetter), ...legend.ink, ...page.ink],
        label,
        destinations: [
          ...(index === 0 ? [{ name: sheet.number, y: 0 }] : []),
          ...page.anchors.map(({ block, y }) => ({ name: `${sheet.number}/${block}`, y })),
        ],
        bookmarks: [
          ...(index === 0 ? [{ title: name, level: 0 as const, y: 0 }] : []),
          ...page.anchors.flatMap(sectionBookmark),
        ],
      };
    });
  return { count: pages.length, frame };
}

function sectionBookmark({ block, y, heading }: Page['anchors'][number]): Bookmark[] {
  if (heading === undefined) return [];
  const section = { id: block, title: heading };
  return [{ title: `${block} ${plainText(heading)}`, level: 1, y, section }];
}
