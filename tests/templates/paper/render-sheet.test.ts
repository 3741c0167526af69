import { PDFArray, PDFDict, PDFDocument, PDFName } from '@cantoo/pdf-lib';
import { beforeAll, describe, expect, it } from 'vitest';
import { renderSheet, type SheetPrint } from '@/templates/paper/render-sheet';
import { checkFile, fontsOf, infoOf, textOf } from './read-pdf';
import { sheet } from './sample-sheet';

const print: SheetPrint = {
  sheet,
  imprint: {
    office: 'Tern & Alder Structures',
    job: '26-041',
    issue: 'rev 2',
    originator: { initials: 'MT', date: '2026-11-16' },
    checker: { initials: 'JO', date: '2026-11-18' },
    mode: 'review',
    digest: '5e1f 90c7',
  },
  jobTitle: 'Quayside Ferry Shelter',
  size: 'A4',
  language: 'en-GB',
  date: new Date('2026-11-18T09:00:00Z'),
};

describe('a printed sheet', () => {
  let bytes: Uint8Array;
  let labels: string[];
  beforeAll(async () => {
    ({ bytes, labels } = await renderSheet(print));
  });

  it('is a sound file', () => {
    expect(checkFile(bytes)).toContain('No syntax or stream encoding errors');
  });

  it('embeds every font it uses, each face once', () => {
    const fonts = fontsOf(bytes);
    expect(fonts.length).toBeGreaterThan(3);
    for (const font of fonts) expect(font.embedded, font.name).toBe(true);
    expect(new Set(fonts.map(({ name }) => name.replace(/^[A-Z]+\+/, ''))).size).toBe(fonts.length);
  });

  it('can be read as text: words, formulas in a line, numbers of a table', () => {
    const text = textOf(bytes);
    expect(text).toContain('Forces, base reactions and two deflections of the portal frame on grid 2');
    expect(text).toContain('EI_0 f_11 = 4.20 × 1 + 7.20/(3 × 2)');
    expect(text).toContain('33.502');
    expect(text).toContain('EN 1991-1-3, 6.2');
  });

  it('bears office, job, revision, people, digest, sheet and page on every page', () => {
    labels.forEach((label, index) => {
      const text = textOf(bytes, index + 1);
      const foot = [
        'Tern & Alder Structures',
        '26-041',
        'rev 2',
        'originator MT 16 Nov 2026',
        'checker JO 18 Nov 2026',
      ];
      for (const words of [
        ...foot,
        'review copy, unsigned',
        '5e1f 90c7',
        label,
        `${index + 1} of ${labels.length}`,
      ]) {
        expect(text).toContain(words);
      }
    });
  });

  it('names its pages S-03.1, S-03.2 … in the page list of a reader', async () => {
    const file = await PDFDocument.load(bytes, { updateMetadata: false });
    const numbers = file.catalog
      .lookup(PDFName.of('PageLabels'), PDFDict)
      .lookup(PDFName.of('Nums'), PDFArray);
    const names = file
      .getPages()
      .map((_, index) => numbers.lookup(2 * index + 1, PDFDict).lookup(PDFName.of('P')));
    expect(names.map((name) => (name as unknown as { decodeText(): string }).decodeText())).toEqual(labels);
  });

  it('tells title, author, language and page size', () => {
    const info = infoOf(bytes);
    expect(info).toMatch(/Title: +26-041 S-03 Portal frame, grid 2/);
    expect(info).toMatch(/Author: +Tern & Alder Structures/);
    expect(info).toContain('(A4)');
    expect(Buffer.from(bytes).toString('latin1')).toContain('Tern &amp; Alder Structures');
  });

  it('comes out the same, byte for byte, for the same date', async () => {
    const again = await renderSheet(print);
    expect(Buffer.compare(Buffer.from(bytes), Buffer.from(again.bytes))).toBe(0);
  });
});
