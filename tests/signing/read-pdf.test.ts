import { beforeAll, describe, expect, it } from 'vitest';
import type { Bytes } from '@/lib/signing/bytes';
import { PdfDocument } from '@/lib/signing/pdf-document';
import { NotUnderstood, PdfScanner } from '@/lib/signing/pdf-scanner';
import { PdfName, PdfRef, PdfString, type PdfValue } from '@/lib/signing/pdf-value';
import { readPageTree } from '@/lib/signing/read-page-tree';
import { readPdf } from '@/lib/signing/read-pdf';
import { readSignatureFields } from '@/lib/signing/read-signature-fields';
import { makeBase, places } from './office';
import { appendObjects } from './tamper';

const read = (text: string): PdfValue => {
  const bytes = Buffer.from(text, 'latin1');
  return new PdfScanner(bytes, 0, bytes.length).value();
};

describe('a value', () => {
  // Examples and rules of ISO 32000-2, 7.3.
  it.each([
    ['numbers', '[ 0 -98 +17 34.5 -.002 4. 0.0 ]', [0, -98, 17, 34.5, -0.002, 4, 0]],
    ['booleans and null', '[ true false null ]', [true, false, null]],
    ['a name with an escape', '/A#42', new PdfName('AB')],
    ['a string with nested parentheses', '(a (b) c)', new PdfString(Buffer.from('a (b) c').toString('hex'))],
    ['a string with escapes', '(\\n\\053\\(\\q\\\r\n\\7x)', new PdfString('0a2b287107' + '78')],
    ['a hexadecimal string of odd length', '<901F A>', new PdfString('901fa0')],
    ['references beside numbers', '[ 12 0 R 7 0 ]', [new PdfRef(12, 0), 7, 0]],
  ] as [string, string, PdfValue][])('is read as the standard says: %s', (_, text, value) => {
    expect(read(text)).toEqual(value);
  });
  it.each([
    ['a key that stands twice', '<< /A 1 /A 2 >>'],
    ['a key that is no name', '<< 1 2 >>'],
    ['a comment', '[ 1 % 2\n ]'],
    ['an odd number', '--5'],
    ['an unclosed string', '(a (b)'],
    ['an unclosed list', '[ 1 2'],
    ['too deep a nesting', '['.repeat(100)],
    ['nothing', ''],
  ])('is refused: %s', (_, text) => {
    expect(() => read(text)).toThrow(NotUnderstood);
  });
});

describe('a file', () => {
  let base: Bytes;
  beforeAll(async () => {
    base = await makeBase();
  });
  const replaced = (from: string | RegExp, to: string) =>
    new Uint8Array(Buffer.from(Buffer.from(base).toString('latin1').replace(from, to), 'latin1'));

  it('is read revision by revision, which together are the whole of it', () => {
    const { revisions } = readPdf(base);
    expect(revisions).toHaveLength(2);
    expect(revisions.map(({ from }) => from)).toEqual([0, revisions[0]?.to]);
    expect(revisions[1]?.to).toBe(base.length);
  });
  it('gives its pages and fields as they stood after each revision', () => {
    const file = readPdf(base);
    expect(readSignatureFields(new PdfDocument(file, 0))).toEqual([]);
    const now = new PdfDocument(file, 1);
    expect(readSignatureFields(now).map(({ name, signed }) => [name, signed])).toEqual(
      places.map(({ field }) => [field, false]),
    );
    expect(readPageTree(now)).toHaveLength(2);
  });
  it.each([
    ['an encrypted file', () => replaced(/trailer\s*<</, 'trailer\n<</Encrypt 1 0 R')],
    [
      'a table that is not where its trailer says',
      () => replaced(/startxref\s+\d+(?=\s+%%EOF\s*$)/, 'startxref\n17'),
    ],
    ['a header of another kind', () => replaced('%PDF-', '%PDX-')],
    ['bytes before the header', () => new Uint8Array([0x20, ...base])],
    ['a table entry of odd length', () => replaced(/ 00000 n \r?\n/, ' 00000 n\n')],
  ] as [string, () => Bytes][])('is refused: %s', (_, make) => {
    expect(() => readPdf(make())).toThrow(NotUnderstood);
  });
  it('is refused when a stream’s length leads round in a circle', () => {
    const circle = appendObjects(base, { 899: '<< /Length 899 0 R >>\nstream\n\nendstream' });
    expect(() => new PdfDocument(readPdf(circle), 2).object(new PdfRef(899, 0))).toThrow(NotUnderstood);
  });
});
