// server only
import { NotUnderstood, PdfScanner } from './pdf-scanner';
import type { PdfDict } from './pdf-value';

/** Where an object stands; null: the table calls it free. */
export type Entry = { readonly offset: number; readonly gen: number } | null;

/** One revision of a file: the bytes from `from` to `to`, its own cross-reference table and trailer. */
export interface Revision {
  readonly entries: ReadonlyMap<number, Entry>;
  readonly trailer: PdfDict;
  readonly from: number;
  /** Where its objects end and its table begins. */
  readonly table: number;
  /** Just after its end mark. */
  readonly mark: number;
  /** Where the next revision begins, or the file ends; only line ends stand between `mark` and this. */
  readonly to: number;
}

export interface PdfFile {
  readonly bytes: Buffer;
  /** Oldest first; together they are the whole file, without a gap. */
  readonly revisions: readonly Revision[];
}

const most = { bytes: 200_000_000, revisions: 100, objects: 1_000_000 };

function fail(what: string): never {
  throw new NotUnderstood(what);
}

function readTable(scan: PdfScanner): Map<number, Entry> {
  const entries = new Map<number, Entry>();
  scan.take('xref').blank();
  while (!scan.sees('trailer')) {
    const first = scan.integer();
    const count = scan.integer();
    if (count > most.objects) fail('table too long');
    scan.blank();
    for (let num = first; num < first + count; num++) {
      const line = scan.bytes.toString('latin1', scan.at, Math.min(scan.at + 20, scan.end));
      const match = /^(\d{10}) (\d{5}) ([nf])(?: \n|\r\n| \r)$/.exec(line);
      if (!match) fail('cross-reference entry');
      if (entries.has(num)) fail('an object stands twice in a table');
      entries.set(num, match[3] === 'n' ? { offset: Number(match[1]), gen: Number(match[2]) } : null);
      scan.at += 20;
    }
    scan.blank();
  }
  return entries;
}

function onlyLineEnds(bytes: Buffer, from: number, to: number): boolean {
  for (let i = from; i < to; i++) if (bytes[i] !== 10 && bytes[i] !== 13) return false;
  return true;
}

/** The revision whose table stands at `table` and which ends at `to`; its beginning is found from its objects. */
function readRevision(bytes: Buffer, table: number, to: number): Revision {
  const scan = new PdfScanner(bytes, table, to);
  const entries = readTable(scan);
  const trailer = scan.take('trailer').blank().dict();
  if (scan.blank().take('startxref').integer() !== table) fail('a table is not where its trailer says');
  const mark = scan.blank().take('%%EOF').at;
  if (!onlyLineEnds(bytes, mark, to)) fail('bytes stand between two revisions');
  for (const key of ['Encrypt', 'XRefStm']) if (trailer.has(key)) fail(`trailer with ${key}`);
  const previous = trailer.get('Prev');
  if (previous === undefined) return { entries, trailer, from: 0, table, mark, to };
  const offsets = [...entries.values()].flatMap((entry) => (entry ? [entry.offset] : []));
  const first = offsets.reduce((a, b) => Math.min(a, b), table);
  if (typeof previous !== 'number' || previous >= first) fail('order of revisions');
  const before = bytes.lastIndexOf('%%EOF', first, 'latin1');
  if (before < previous || !onlyLineEnds(bytes, before + 5, first)) fail('bytes stand before a revision');
  return { entries, trailer, from: first, table, mark, to };
}

/**
 * Reads a PDF strictly by its cross-reference tables (ISO 32000-2, 7.5.4), back from its end: nothing is searched for and
 * nothing repaired. Throws NotUnderstood, also for encrypted files and cross-reference streams.
 */
export function readPdf(pdf: Uint8Array): PdfFile {
  const bytes = Buffer.from(pdf.buffer, pdf.byteOffset, pdf.length);
  if (bytes.length > most.bytes) fail('file too large');
  if (bytes.toString('latin1', 0, 5) !== '%PDF-') fail('not a PDF');
  const tail = /startxref[\r\n ]+(\d{1,10})[\r\n ]+%%EOF[\r\n]*$/.exec(
    bytes.toString('latin1', bytes.length - 80),
  );
  if (!tail) fail('bytes after the end mark');
  const revisions: Revision[] = [];
  let table = Number(tail[1]);
  for (let to = bytes.length; ; ) {
    if (revisions.length >= most.revisions) fail('too many revisions');
    if (table >= to) fail('a table stands outside its revision');
    const revision = readRevision(bytes, table, to);
    revisions.unshift(revision);
    if (revision.from === 0) return { bytes, revisions };
    to = revision.from;
    table = Number(revision.trailer.get('Prev'));
  }
}
