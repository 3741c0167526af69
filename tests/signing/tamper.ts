import { PDFArray, type PDFDocument, PDFName, rgb } from '@cantoo/pdf-lib';
import { ContentInfo, SignedData } from 'pkijs';
import type { Bytes } from '@/lib/signing/bytes';
import { insertSignature } from '@/lib/signing/insert-signature';
import type { Hole } from '@/lib/signing/signed-part';
import { openForUpdate, saveUpdate } from '@/lib/signing/update-pdf';

/** What somebody might do to a file after it was sealed. Each leaves every signed byte as it was. */
export async function append(
  pdf: Bytes,
  change: (document: PDFDocument) => void | Promise<void>,
): Promise<Bytes> {
  const document = await openForUpdate(pdf);
  await change(document);
  return saveUpdate(document, pdf);
}

export const drawOver = (document: PDFDocument) =>
  document.getPage(0).drawRectangle({ x: 60, y: 690, width: 300, height: 40, color: rgb(1, 1, 1) });

/** A note put into the list of annotations, the page's drawing untouched. */
export function addNote(document: PDFDocument): void {
  const { context } = document;
  const note = { Type: 'Annot', Subtype: 'FreeText', Rect: [60, 600, 300, 640], DA: '/Helv 12 Tf', F: 4 };
  const page = document.getPage(0);
  page.node.lookup(PDFName.of('Annots'), PDFArray).push(context.register(context.obj(note)));
  context.snapshot?.markRefForSave(page.ref);
}

/** The file with one more revision written by hand: objects, table, trailer. */
export function appendObjects(pdf: Bytes, objects: Record<number, string>, extra = ''): Bytes {
  const text = Buffer.from(pdf).toString('latin1');
  const previous = text.slice(text.lastIndexOf('startxref') + 9).match(/\d+/)?.[0];
  const trailer = text.slice(text.lastIndexOf('trailer')).match(/\/Root \d+ 0 R/)?.[0];
  const info = text.slice(text.lastIndexOf('trailer')).match(/\/Info \d+ 0 R/)?.[0] ?? '';
  let body = text.endsWith('\n') ? '' : '\n';
  const entries = Object.entries(objects).map(([num, value]) => {
    const offset = String(text.length + body.length).padStart(10, '0');
    body += `${num} 0 obj\n${value}\nendobj\n${extra}`;
    return `${num} 1\n${offset} 00000 n \n`;
  });
  const table = text.length + body.length;
  const tail = `xref\n${entries.join('')}trailer\n<< /Size 900 /Prev ${previous} ${trailer} ${info} >>\nstartxref\n${table}\n%%EOF\n`;
  return new Uint8Array(Buffer.from(text + body + tail, 'latin1'));
}

/** Where the last signature of a file stands. */
export function lastHole(pdf: Bytes): Hole {
  const text = Buffer.from(pdf).toString('latin1');
  const from = text.lastIndexOf('/Contents <') + '/Contents '.length;
  return { from, to: text.indexOf('>', from) + 1 };
}

export function lastCms(pdf: Bytes): Bytes {
  const { from, to } = lastHole(pdf);
  const raw = Buffer.from(Buffer.from(pdf.subarray(from + 1, to - 1)).toString('latin1'), 'hex');
  return new Uint8Array(raw.subarray(0, raw.readUInt16BE(2) + 4));
}

export function withCms(pdf: Bytes, cms: Bytes): Bytes {
  const hole = lastHole(pdf);
  const empty = new Uint8Array(pdf);
  empty.fill(0x30, hole.from + 1, hole.to - 1);
  return insertSignature({ bytes: empty, hole }, cms);
}

/** A signature taken apart, altered, and put together again. */
export function editCms(cms: Bytes, edit: (data: SignedData) => void): Bytes {
  const info = ContentInfo.fromBER(cms);
  const data = new SignedData({ schema: info.content });
  edit(data);
  return new Uint8Array(
    new ContentInfo({ contentType: info.contentType, content: data.toSchema() }).toSchema().toBER(),
  );
}
