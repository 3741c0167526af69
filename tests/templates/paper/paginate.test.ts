import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createTypesetter } from '@/lib/typeset/typesetter';
import type { Block } from '@/templates/block';
import type { Ink } from '@/templates/paper/ink';
import { pageGeometry } from '@/templates/paper/page-geometry';
import { type Page, paginate } from '@/templates/paper/paginate';
import { PaperError } from '@/templates/paper/paper-error';
import { faces } from '../../typeset/faces';
import { blocks, longTable } from './sample-sheet';

const typesetter = createTypesetter(faces);
const letter = pageGeometry('Letter');
const pagesOf = (list: readonly Block[], more: object = {}) =>
  paginate(list, { size: 'Letter', ...more }, typesetter);
const paragraph = (id: string, lines = 1): Block => ({
  kind: 'paragraph',
  id,
  text: Array.from({ length: lines * 13 }, () => 'moments').join(' '),
});
const heading = (id: string): Block => ({ kind: 'heading', id, text: 'Reactions' });
const words = (page: Page) =>
  page.ink.flatMap((ink) =>
    ink.kind === 'words' ? [ink.shaped.text] : ink.kind === 'math' ? [ink.tex] : [],
  );
/** Ink in the margin, as [top, bottom] of the words. */
const margin = (page: Page): [number, number][] =>
  page.ink
    .filter((ink): ink is Ink & { kind: 'words' } => ink.kind === 'words' && ink.x < letter.textLeft - 1)
    .map((ink) => [ink.y - 0.73 * ink.size, ink.y + 0.2 * ink.size]);

describe('breaking a sheet into pages', () => {
  it('leaves no heading alone at a foot', () => {
    for (let count = 20; count < 60; count++) {
      const list = [
        ...Array.from({ length: count }, (_, i) => paragraph(`1.${i}`)),
        heading('2'),
        paragraph('2.1', 3),
      ];
      for (const page of pagesOf(list)) expect(page.anchors.at(-1)?.block).not.toBe('2');
    }
  });

  it('keeps every mark on its page', () => {
    for (const page of pagesOf(blocks)) {
      for (const ink of page.ink) {
        if (ink.kind !== 'words' && ink.kind !== 'math') continue;
        expect(ink.y).toBeGreaterThan(letter.top);
        expect(ink.y).toBeLessThan(letter.bottom);
        expect(ink.x).toBeGreaterThan(0);
        const width = ink.kind === 'words' ? ink.shaped.width : ink.laid.width;
        expect(ink.x + width * ink.size).toBeLessThan(letter.textLeft + letter.textWidth + 0.5);
      }
    }
  });

  it('prints each row of a long table once, under a head on every page', () => {
    const pages = pagesOf([heading('8'), longTable]);
    expect(pages.length).toBeGreaterThan(1);
    for (const page of pages) expect(words(page)).toContain('Combination');
    const rows = pages.flatMap(words).filter((text) => text.includes('W_{'));
    expect(rows).toHaveLength(longTable.rows.length);
    expect(new Set(rows).size).toBe(longTable.rows.length);
  });

  it('says that a section and its table go on', () => {
    const [, second] = pagesOf([heading('8'), longTable]);
    expect(second && words(second).filter((text) => text === 'continued')).toHaveLength(2);
  });

  it('keeps the first row of a group with the next one', () => {
    const pages = pagesOf([
      ...Array.from({ length: 3 }, (_, i) => paragraph(`1.${i}`)),
      heading('8'),
      longTable,
    ]);
    for (const page of pages.slice(0, -1)) {
      const last =
        words(page)
          .filter((text) => /W_\{\d+\}/.test(text))
          .at(-1) ?? '';
      expect(Number(/W_\{(\d+)\}/.exec(last)?.[1]) % 8).not.toBe(0);
    }
  });

  it('breaks a chain that is too wide before an equals sign', () => {
    const chain = Array.from(
      { length: 5 },
      (_, i) => `15.550\\unit{kN}\\times14.00\\unit{m}-${i}.36\\unit{kN\\per m}`,
    );
    const [page] = pagesOf([{ kind: 'equations', id: '7.1', rows: [{ lhs: 'M', chain }] }]);
    const math = (page?.ink ?? []).filter((ink): ink is Ink & { kind: 'math' } => ink.kind === 'math');
    const rows = [...new Set(math.map((ink) => ink.y))];
    expect(rows.length).toBeGreaterThan(1);
    const starts = rows.slice(1).map((y) => math.filter((ink) => ink.y === y).sort((a, b) => a.x - b.x)[0]);
    for (const start of starts) expect(start?.tex).toMatch(/^\{=\}/);
    expect(new Set(starts.map((start) => start?.x.toFixed(3))).size).toBe(1);
  });

  it('stands the equals signs of the whole sheet in one column', () => {
    const row = (lhs: string) => ({ lhs, chain: ['1.00', '2.00'] });
    const list: Block[] = [
      { kind: 'equations', id: '1.1', rows: [row('w'), row('EI_0\\,f_{11}')] },
      { kind: 'equations', id: '1.2', rows: [row('X_1')] },
    ];
    const first = pagesOf(list)[0]?.ink.flatMap((ink) =>
      ink.kind === 'math' && ink.tex.endsWith('1.00') ? [ink.x] : [],
    );
    expect(first).toHaveLength(3);
    expect(Math.max(...(first ?? [])) - Math.min(...(first ?? []))).toBeLessThan(1e-6);
  });

  it('never lets two margin notes run into each other, nor into the seal', () => {
    const source = fc.array(fc.constantFrom('EN', '1991-1-4,', '7.2.2', 'and', 'S-01.3,', 'table', 'annex'), {
      maxLength: 16,
    });
    const lines = fc.array(fc.record({ source, count: fc.integer({ min: 1, max: 4 }) }), {
      minLength: 1,
      maxLength: 30,
    });
    fc.assert(
      fc.property(lines, (list) => {
        const sheet = list.map(
          ({ source, count }, i): Block =>
            ({
              ...paragraph(`${i + 1}`, count),
              ...(source.length > 0 ? { source: source.join(' ') } : {}),
            }) as Block,
        );
        for (const page of pagesOf(sheet, { sealed: true })) {
          const notes = margin(page).sort((a, b) => a[0] - b[0]);
          notes.forEach(([, bottom], i) => {
            const next = notes[i + 1];
            const sameLine = next && Math.abs(next[0] - (notes[i]?.[0] ?? 0)) < 2;
            if (next && !sameLine) expect(next[0]).toBeGreaterThan(bottom - 0.5);
            expect(bottom).toBeLessThan(letter.marginSeal.y);
          });
        }
      }),
      { numRuns: 25 },
    );
  });

  it('loses no block', () => {
    const printed = pagesOf(blocks).flatMap((page) => page.anchors.map(({ block }) => block));
    expect(printed).toEqual(blocks.map(({ id }) => id));
  });

  it('refuses what is taller than a page, and names the line', () => {
    const matrix = Array.from({ length: 70 }, () => '1&0').join('\\\\');
    const tall: Block = {
      kind: 'equations',
      id: '7.3',
      rows: [{ lhs: `\\begin{bmatrix}${matrix}\\end{bmatrix}`, chain: [] }],
    };
    expect(() => pagesOf([tall])).toThrow(PaperError);
    expect(() => pagesOf([tall])).toThrow(/Line 7\.3 .* taller than a page/);
  });

  it('refuses TeX that cannot be set, and names the line', () => {
    const wrong: Block = { kind: 'paragraph', id: '4.2', text: 'The load $\\frac{1}$ acts.' };
    expect(() => pagesOf([wrong])).toThrow(/Line 4\.2/);
  });

  it('gives the same pages for the same blocks', () => {
    expect(pagesOf(blocks).map(words)).toEqual(pagesOf(blocks).map(words));
  });
});
