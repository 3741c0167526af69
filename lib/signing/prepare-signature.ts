// server only
import { createHash } from 'node:crypto';
import {
  PDFArray,
  type PDFDict,
  type PDFDocument,
  PDFHexString,
  PDFName,
  PDFRef,
  PDFString,
} from '@cantoo/pdf-lib';
import type { Bytes } from './bytes';
import { PdfDocument } from './pdf-document';
import { placeOnPage } from './place-on-page';
import { readPdf } from './read-pdf';
import { readSignatureFields } from './read-signature-fields';
import type { Hole } from './signed-part';
import { openForUpdate, saveUpdate } from './update-pdf';

export interface SignatureRequest {
  /** The name of a placed, empty field. */
  readonly field: string;
  readonly name: string;
  readonly reason: string;
  readonly date: Date;
  /** What is seen in the field: PDF operators in a box of the field's width and height, with no resources. */
  readonly appearance?: (width: number, height: number) => string;
}

/** A file that lacks nothing but its signature. */
export interface PreparedFile {
  readonly bytes: Bytes;
  readonly hole: Hole;
  /** SHA-256 of the file it was made from, in hexadecimal. */
  readonly baseSha256: string;
}

/** Room for the signature with its certificates and time stamp, in bytes. */
export const signatureRoom = 12_288;
/** Ten digits, to be written over in place. */
const wide = 9_999_999_999;

function drawIn(
  document: PDFDocument,
  field: PDFDict,
  draw: (width: number, height: number) => string,
): void {
  const { context } = document;
  const page = document.getPages().find((one) => one.ref === field.get(PDFName.of('P')));
  if (!page) throw new Error('the field is on no page');
  const { width, height } = field.lookup(PDFName.of('Rect'), PDFArray).asRectangle();
  const [w, h] = page.getRotation().angle % 180 === 0 ? [width, height] : [height, width];
  const { matrix } = placeOnPage(page, [0, 0, w, h]);
  const shape = { Type: 'XObject', Subtype: 'Form', BBox: [0, 0, w, h], Matrix: matrix, Resources: {} };
  const form = context.register(context.flateStream(draw(w, h), shape));
  field.set(PDFName.of('AP'), context.obj({ N: form }));
}

/** Finds the hole, and writes over the placeholder of ByteRange, which is of the same length. */
function setByteRange(bytes: Bytes, from: number): Hole {
  const buffer = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.length);
  const once = (text: string) => {
    const at = buffer.indexOf(text, from, 'latin1');
    if (at < 0 || buffer.indexOf(text, at + 1, 'latin1') >= 0)
      throw new Error('placeholder of the signature');
    return at;
  };
  const gap = `<${'0'.repeat(signatureRoom * 2)}>`;
  const hole = { from: once(gap), to: once(gap) + gap.length };
  const mark = `[ 0 ${wide} ${wide} ${wide} ]`;
  const range = `[ 0 ${hole.from} ${hole.to} ${bytes.length - hole.to} ]`;
  buffer.write(range.padEnd(mark.length), once(mark), 'latin1');
  return hole;
}

/**
 * Fills a placed field by an appended revision, all but the signature: its ByteRange already reaches the end of the file, so
 * the bytes to be signed are final. Throws NotUnderstood for a file that could not be verified later.
 */
export async function prepareSignature(pdf: Uint8Array, request: SignatureRequest): Promise<PreparedFile> {
  const file = readPdf(pdf);
  const current = new PdfDocument(file, file.revisions.length - 1);
  Array.from(current.objects()); // reads every object, as verification will
  const found = readSignatureFields(current).find(({ name }) => name === request.field);
  if (!found) throw new Error(`no signature field is called ${request.field}`);
  if (found.signed) throw new Error(`the field ${request.field} is signed already`);
  const document = await openForUpdate(pdf);
  const { context } = document;
  const ref = PDFRef.of(found.ref.num, found.ref.gen);
  const field = context.lookup(ref) as PDFDict;
  const signature = context.obj({
    Type: 'Sig',
    Filter: 'Adobe.PPKLite',
    SubFilter: 'ETSI.CAdES.detached',
    ByteRange: [0, wide, wide, wide],
    Contents: PDFHexString.of('0'.repeat(signatureRoom * 2)),
    M: PDFString.fromDate(request.date),
    Name: PDFHexString.fromText(request.name),
    Reason: PDFHexString.fromText(request.reason),
  });
  field.set(PDFName.of('V'), context.register(signature));
  if (request.appearance) drawIn(document, field, request.appearance);
  context.assign(ref, field);
  const bytes = await saveUpdate(document, pdf);
  const hole = setByteRange(bytes, pdf.length);
  return { bytes, hole, baseSha256: createHash('sha256').update(pdf).digest('hex') };
}
