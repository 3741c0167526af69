// server only
import type { Block } from '../block';
import { cautionBlocks } from './cautions';
import { typesetter } from './faces';
import { type Attached, countPages, frameAttached } from './frame-attached';
import type { Imprint } from './imprint';
import type { Ink } from './ink';
import type { PackagePrint, PackageSheet, PrintedPackage, SealPlace } from './package-print';
import { frameInk } from './page-frame';
import { type PageGeometry, pageGeometry } from './page-geometry';
import type { PrintedPage } from './printed-page';
import { renderDocument } from './render-document';
import { coverSeal, setCover } from './set-cover';
import { type IndexEntry, setIndex } from './set-index';
import { type PrintedSheet, setSheet } from './set-sheet';

/** A part of the package: its pages made for given page numbers. */
type Part = {
  sheet?: PackageSheet;
  title: string;
  to: string;
  count: number;
  pages(from: number, of: number): PrintedPage[];
};

/**
 * Writes a package: cover, index, sheets, attached documents, and the last pages with what the office adds and the
 * cautions. Page numbers run through the whole file; links, bookmarks and page labels lead to every sheet.
 */
export async function renderPackage(print: PackagePrint): Promise<PrintedPackage> {
  const geometry = pageGeometry(print.size);
  const parts = await Promise.all([
    ...print.sheets.map((sheet) => sheetPart(sheet, print)),
    closingPart(print),
  ]);
  const sealed = print.seal?.on === 'every-page';
  const indexPages = setIndex(indexEntries(parts, 0, 1), geometry, typesetter, sealed).length;
  const first = 1 + indexPages;
  const of = parts.reduce((sum, part) => sum + part.count, first);
  const entries = indexEntries(parts, first, of);
  const front = [
    coverPage(setCover(print, entries, geometry, typesetter), print, geometry, of),
    ...setIndex(entries, geometry, typesetter, sealed).map((ink, index) =>
      indexPage(ink, index, print, geometry, of),
    ),
  ];
  const attached: Attached[] = [];
  const pages = [...front];
  const sheetOf: (string | undefined)[] = front.map(() => undefined);
  for (const part of parts) {
    if (part.sheet?.kind === 'attached') attached.push({ file: part.sheet.file, firstPage: pages.length });
    const own = part.pages(pages.length, of);
    pages.push(...own);
    sheetOf.push(...own.map(() => part.sheet?.number));
  }
  const bytes = await renderDocument({
    title: `${print.job.number} ${print.job.title}: structural calculations`,
    author: print.office,
    subject: print.purpose,
    language: print.language,
    date: print.date,
    size: print.size,
    pages,
    data: print.data,
  });
  return {
    bytes: await frameAttached(bytes, attached, geometry),
    pages: pages.map(({ label }, index) => ({ label, sheet: sheetOf[index] })),
    sealPlaces: sealPlaces(print, pages.length, geometry),
  };
}

function packageImprint({ office, job, submittal, mode, digest }: PackagePrint): Imprint {
  const issue = submittal === undefined ? undefined : `submittal ${submittal}`;
  return { office, job: job.number, issue, mode, digest };
}

async function sheetPart(sheet: PackageSheet, print: PackagePrint): Promise<Part> {
  const { originator, checker, digest, revision, title, number } = sheet;
  const imprint: Imprint = {
    office: print.office,
    job: print.job.number,
    issue: `rev ${revision}`,
    originator,
    checker,
    mode: print.mode,
    digest,
  };
  if (sheet.kind === 'calculated') return flowPart(sheet, imprint, print, sheet);
  const count = await countPages(sheet.file);
  const geometry = pageGeometry(print.size);
  return {
    sheet,
    title: `${title} (attached)`,
    to: number,
    count,
    pages: (from, of) =>
      Array.from({ length: count }, (_, index) => {
        const label = `${number}.${index + 1}`;
        const words = { run: `${number} ${title}`, label, imprint, place: `${from + index + 1} of ${of}` };
        const bookmarks = index === 0 ? [{ title: `${number} ${title}`, level: 0 as const, y: 0 }] : [];
        const destinations = index === 0 ? [{ name: number, y: 0 }] : [];
        return { ink: frameInk(words, geometry, typesetter), label, destinations, bookmarks };
      }),
  };
}

function flowPart(sheet: PrintedSheet, imprint: Imprint, print: PackagePrint, issued?: PackageSheet): Part {
  const flowed = setSheet(sheet, { size: print.size, sealed: print.seal?.on === 'every-page' }, typesetter);
  return {
    sheet: issued,
    title: sheet.title,
    to: sheet.number,
    count: flowed.count,
    pages: (from, of) => flowed.frame({ imprint, place: (index) => `${from + index + 1} of ${of}` }),
  };
}

function closingPart(print: PackagePrint): Part {
  const blocks: Block[] = [...(print.closing ?? []), ...cautionBlocks(print.mode, print.verifyAt)];
  const heads = (print.closing ?? []).flatMap((b) => (b.kind === 'heading' ? [b.text] : []));
  const title = heads.length > 0 ? `${heads.join(', ')}, cautions` : 'Cautions';
  const sheet = { number: 'cautions', unnumbered: true, title, blocks, marks: print.closingMarks };
  return flowPart(sheet, packageImprint(print), print);
}

function indexEntries(parts: readonly Part[], first: number, of: number): IndexEntry[] {
  let from = first;
  return parts.map((part) => {
    const pages = part.pages(from, of);
    const sections = pages.flatMap(({ bookmarks }, index) =>
      bookmarks.flatMap(({ section }) =>
        section ? [{ ...section, page: from + index + 1, to: `${part.to}/${section.id}` }] : [],
      ),
    );
    const entry = { title: part.title, page: from + 1, to: part.to, sheet: part.sheet, sections };
    from += part.count;
    return entry;
  });
}

function coverPage(ink: Ink[], print: PackagePrint, geometry: PageGeometry, of: number): PrintedPage {
  const words = { label: 'cover', imprint: packageImprint(print), place: `1 of ${of}` };
  return {
    ink: [...frameInk(words, geometry, typesetter), ...ink],
    label: 'cover',
    destinations: [{ name: 'cover', y: 0 }],
    bookmarks: [{ title: 'Cover', level: 0, y: 0 }],
  };
}

function indexPage(
  ink: Ink[],
  index: number,
  print: PackagePrint,
  geometry: PageGeometry,
  of: number,
): PrintedPage {
  const label = index === 0 ? 'index' : `index.${index + 1}`;
  const run = `${print.job.title}, ${print.purpose}`;
  const words = { run, label, imprint: packageImprint(print), place: `${index + 2} of ${of}` };
  const bookmarks = index === 0 ? [{ title: 'Index', level: 0 as const, y: 0 }] : [];
  return {
    ink: [...frameInk(words, geometry, typesetter), ...ink],
    label,
    destinations: [{ name: label, y: 0 }],
    bookmarks,
  };
}

function sealPlaces({ seal }: PackagePrint, count: number, geometry: PageGeometry): SealPlace[] {
  if (!seal) return [];
  const fromFoot = (page: number, { x, y, size }: { x: number; y: number; size: number }) => ({
    page,
    x,
    y: geometry.height - y - size,
    size,
  });
  const cover = fromFoot(0, coverSeal(geometry));
  if (seal.on === 'cover') return [cover];
  return [
    cover,
    ...Array.from({ length: count - 1 }, (_, index) => fromFoot(index + 1, geometry.marginSeal)),
  ];
}
