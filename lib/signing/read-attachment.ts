// server only
import { inflateSync } from 'node:zlib';
import { PdfDocument } from './pdf-document';
import { NotUnderstood } from './pdf-scanner';
import { PdfDict, PdfName, PdfStream, PdfString, type PdfValue } from './pdf-value';
import { readPdf } from './read-pdf';

/** Most that an attachment may inflate to, so that a small file cannot fill the memory. */
const most = 64 * 1024 * 1024;

/**
 * The bytes of the file attached to a PDF under a name (ISO 32000-2, 7.11.4), as its newest revision has it; undefined
 * when there is none. Throws NotUnderstood for a file or an attachment that cannot be read.
 */
export function readAttachment(pdf: Uint8Array, name: string): Buffer | undefined {
  const file = readPdf(pdf);
  const document = new PdfDocument(file, file.revisions.length - 1);
  const names = document.resolve(document.catalog.get('Names'));
  if (!(names instanceof PdfDict)) return undefined;
  const tree = document.resolve(names.get('EmbeddedFiles'));
  const found = tree instanceof PdfDict ? findName(document, tree, name, 0) : undefined;
  if (found === undefined) return undefined;
  const files = document.dict(document.dict(found).get('EF'));
  const stream = document.resolve(files.get('F'));
  if (!(stream instanceof PdfStream)) throw new NotUnderstood('an attachment without its bytes');
  return inflate(document, stream);
}

function findName(document: PdfDocument, node: PdfDict, name: string, depth: number): PdfValue | undefined {
  if (depth > 20) throw new NotUnderstood('a tree of names that does not end');
  const pairs = document.list(node.get('Names'));
  for (let i = 0; i + 1 < pairs.length; i += 2) {
    const key = document.resolve(pairs[i]);
    if (key instanceof PdfString && key.text === name) return pairs[i + 1];
  }
  for (const kid of document.list(node.get('Kids'))) {
    const found = findName(document, document.dict(kid), name, depth + 1);
    if (found !== undefined) return found;
  }
  return undefined;
}

function inflate(document: PdfDocument, stream: PdfStream): Buffer {
  const { from, to } = stream.data;
  const bytes = document.file.bytes.subarray(from, to);
  const filter = document.resolve(stream.dict.get('Filter'));
  if (filter === null) return Buffer.from(bytes);
  if (!(filter instanceof PdfName) || filter.text !== 'FlateDecode') throw new NotUnderstood('a filter');
  try {
    return inflateSync(bytes, { maxOutputLength: most });
  } catch (cause) {
    throw new NotUnderstood(cause instanceof Error ? cause.message : 'an attachment that does not inflate');
  }
}
