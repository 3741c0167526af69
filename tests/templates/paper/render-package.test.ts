import { PDFDict, PDFDocument, PDFName } from '@cantoo/pdf-lib';
import { beforeAll, describe, expect, it } from 'vitest';
import type { PackagePrint, PrintedPackage } from '@/templates/paper/package-print';
import { renderPackage } from '@/templates/paper/render-package';
import { attachmentsOf, checkFile, destinationsOf, fontsOf, textOf, wordsOf } from './read-pdf';
import { samplePackage } from './sample-package';

/** A one-page file such as a client sends, with words to find again. */
async function groundReport(): Promise<Uint8Array> {
  const file = await PDFDocument.create();
  const page = file.addPage([842, 1191]);
  page.drawText('Borehole 3, medium dense sand', { x: 100, y: 1000, size: 24 });
  file.addPage([842, 595]);
  return file.save();
}

describe('a printed package', () => {
  let print: PackagePrint;
  let printed: PrintedPackage;
  beforeAll(async () => {
    const attached = {
      kind: 'attached' as const,
      number: 'S-07',
      title: 'Ground report, extract',
      revision: 0,
      originator: { initials: 'MT', date: '2026-10-08' },
      file: await groundReport(),
    };
    print = { ...samplePackage, sheets: [...samplePackage.sheets, attached] };
    printed = await renderPackage(print);
  });
  const page = (label: string) => printed.pages.findIndex((one) => one.label === label) + 1;

  it('is a sound file', () => {
    expect(checkFile(printed.bytes)).toContain('No syntax or stream encoding errors');
  });

  it('puts the office first on the cover, then job, place, authority, purpose and people', () => {
    const text = textOf(printed.bytes, 1);
    const cover = [
      'Quayside Ferry Shelter',
      'Submittal 2, for approval',
      'Strand Quay 4, Port Halden',
      'Halden Ferries',
    ];
    const people = [
      'Port Halden Building Office, plan review',
      'Maren Tveit MT, Hanne Nørby HN',
      'Elin Varga EV',
    ];
    for (const words of [...cover, ...people, 'EN 1990', 'covers S-02 to S-04'])
      expect(text).toContain(words);
    expect(text.trimStart()).toMatch(/^26-041\s+Tern & Alder Structures/);
  });

  it('lists every sheet on cover and index with the page it begins on', () => {
    for (const { number, title } of print.sheets) {
      const row = new RegExp(`${number}\\s+${title}.*\\s${page(`${number}.1`)}\\s*$`, 'm');
      expect(textOf(printed.bytes, 1)).toMatch(row);
      expect(textOf(printed.bytes, 2)).toMatch(row);
    }
  });

  it('numbers its pages through', () => {
    printed.pages.forEach(({ label }, index) => {
      const text = textOf(printed.bytes, index + 1);
      expect(text).toContain(`${index + 1} of ${printed.pages.length}`);
      expect(text).toContain(label);
    });
  });

  it('leads from the index to sheets and sections', async () => {
    const names = destinationsOf(printed.bytes);
    for (const { number } of print.sheets) expect(names).toContain(`"${number}"`);
    const file = await PDFDocument.load(printed.bytes, { updateMetadata: false });
    const links = file.getPage(1).node.Annots()?.size() ?? 0;
    expect(links).toBeGreaterThan(print.sheets.length);
  });

  it('keeps the sheets of a long index above the seal in the margin', async () => {
    const sheets = Array.from({ length: 18 }, (_, i) => ({
      ...samplePackage.sheets[i % 3],
      number: `S-${i + 10}`,
    }));
    const long = await renderPackage({ ...samplePackage, sheets: sheets as PackagePrint['sheets'] });
    const indexes = long.pages.flatMap(({ label }, index) => (label.startsWith('index') ? [index + 1] : []));
    expect(indexes.length).toBeGreaterThan(2);
    // The seal's upper edge: 24.5 mm and 29.6 mm above the foot of a page 279.4 mm high.
    const edge = ((279.4 - 24.5 - 29.6) / 25.4) * 72;
    for (const { text, bottom } of indexes.flatMap((number) => wordsOf(long.bytes, number))) {
      if (/^S-\d+$/.test(text)) expect(bottom).toBeLessThan(edge);
    }
  });

  it('frames an attached document inside the rule, under its own sheet number', () => {
    expect(printed.pages.filter(({ sheet }) => sheet === 'S-07')).toHaveLength(2);
    const text = textOf(printed.bytes, page('S-07.1'));
    expect(text).toContain('Borehole 3, medium dense sand');
    expect(text).toContain('Tern & Alder Structures');
  });

  it('ends with the cautions', () => {
    const text = textOf(printed.bytes, printed.pages.length).replace(/\s+/g, ' ');
    expect(text).toContain('First-order, linear elastic, small-displacement plane analysis.');
    expect(text).toContain('a second run of the same engine is not an independent check');
    expect(text).toContain('A licensed engineer is responsible');
  });

  it.each([
    ['preliminary', 'preliminary, not for construction'],
    ['review', 'review copy, unsigned'],
  ] as const)('says on every page of a %s copy what it is', async (mode, words) => {
    const copy = await renderPackage({ ...samplePackage, mode });
    copy.pages.forEach((_, index) => {
      expect(textOf(copy.bytes, index + 1)).toContain(words);
    });
  });

  it('carries no such words once it is final, and leaves the seal its place', async () => {
    const final = await renderPackage({ ...samplePackage, mode: 'final' });
    expect(textOf(final.bytes)).not.toMatch(/preliminary|unsigned/);
    expect(final.sealPlaces).toHaveLength(final.pages.length);
    // 40 mm on the cover, 29.6 mm in the margin.
    expect(((final.sealPlaces[0]?.size ?? 0) / 72) * 25.4).toBeCloseTo(40, 6);
    expect(((final.sealPlaces[1]?.size ?? 0) / 72) * 25.4).toBeCloseTo(29.6, 6);
  });

  it('attaches inputs and results as associated data', async () => {
    expect(attachmentsOf(printed.bytes)).toContain('26-041-submittal-2.json');
    const plain = await renderPackage(samplePackage);
    const file = await PDFDocument.load(plain.bytes, { updateMetadata: false });
    const kinds = file.context
      .enumerateIndirectObjects()
      .flatMap(([, object]) =>
        object instanceof PDFDict ? [object.get(PDFName.of('AFRelationship'))?.toString()] : [],
      );
    expect(kinds).toContain('/Data');
  });

  it('embeds every font of its own', () => {
    const own = fontsOf(printed.bytes).filter(({ name }) => !name.startsWith('Helvetica'));
    expect(own.every(({ embedded }) => embedded)).toBe(true);
  });

  it('comes out the same, byte for byte, for the same date', async () => {
    const again = await renderPackage(print);
    expect(Buffer.compare(Buffer.from(printed.bytes), Buffer.from(again.bytes))).toBe(0);
  });
});
