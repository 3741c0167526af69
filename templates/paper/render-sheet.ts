// server only
import { typesetter } from './faces';
import type { Imprint } from './imprint';
import type { PaperSize } from './page-geometry';
import type { AttachedData, PrintedDocument } from './printed-page';
import { renderDocument } from './render-document';
import { type PrintedSheet, setSheet } from './set-sheet';

export type SheetPrint = {
  readonly sheet: PrintedSheet;
  readonly imprint: Imprint;
  readonly jobTitle: string;
  readonly size: PaperSize;
  readonly language: PrintedDocument['language'];
  readonly date: Date;
  readonly data?: AttachedData;
};

/** One sheet by itself, as it is looked at before it goes into a package: PDF bytes and the labels of its pages. */
export async function renderSheet(print: SheetPrint): Promise<{ bytes: Uint8Array; labels: string[] }> {
  const { sheet, imprint, size } = print;
  const flowed = setSheet(sheet, { size }, typesetter);
  const pages = flowed.frame({ imprint, place: (index) => `${index + 1} of ${flowed.count}` });
  const bytes = await renderDocument({
    title: `${imprint.job} ${sheet.number} ${sheet.title}`,
    author: imprint.office,
    subject: `${print.jobTitle}: structural calculation`,
    language: print.language,
    date: print.date,
    size,
    pages,
    data: print.data,
  });
  return { bytes, labels: pages.map(({ label }) => label) };
}
