// server only
import { PDFDocument } from '@cantoo/pdf-lib';
import type { Bytes } from './bytes';

/** Opens a PDF to append to it. Throws on a damaged or encrypted one. */
export function openForUpdate(pdf: Uint8Array): Promise<PDFDocument> {
  return PDFDocument.load(pdf, {
    forIncrementalUpdate: true,
    updateMetadata: false,
    throwOnInvalidObject: true,
    parseSpeed: Number.POSITIVE_INFINITY,
  });
}

/** Appends what changed as one more revision. The bytes before it must stay as they are, or earlier signatures break. */
export async function saveUpdate(document: PDFDocument, before: Uint8Array): Promise<Bytes> {
  const out = new Uint8Array(await document.save({ useObjectStreams: false, updateFieldAppearances: false }));
  const kept = Buffer.compare(out.subarray(0, before.length), before) === 0;
  if (!kept || out.length === before.length) throw new Error('the update did not leave earlier bytes alone');
  return out;
}
