import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { breakRich } from '@/lib/typeset/break-rich';
import type { RichLine, RichStyle } from '@/lib/typeset/rich-line';
import { TypesetError } from '@/lib/typeset/typeset-error';
import { createTypesetter } from '@/lib/typeset/typesetter';
import { faces } from './faces';

const typesetter = createTypesetter(faces);
const style: RichStyle = { size: 10, regular: 'Inter-400', bold: 'Inter-600' };
const lines = (text: string, width: number) => breakRich(text, style, width, typesetter);
const wordsOf = (line: RichLine) =>
  line.items.map((item) => (item.kind === 'words' ? item.shaped.text : `$${item.tex}$`));

describe('breaking rich text into lines', () => {
  it('keeps a mark on the line of the formula it follows', () => {
    for (let width = 60; width < 200; width += 3) {
      for (const line of lines('Dead load of the roof and the glazing $w_D$: see below', width)) {
        expect(wordsOf(line)[0]).not.toBe(':');
      }
    }
  });

  it('sets bold words in the heavier face', () => {
    const [line] = lines('the **relative** stiffness', 300);
    const bold = line?.items.find((item) => item.kind === 'words' && item.shaped.text === 'relative');
    expect(bold?.kind === 'words' && bold.shaped.runs[0]?.face.name).toBe('Inter-600');
  });

  it('sets mathematics larger than the words beside it', () => {
    const [line] = lines('load $w$', 300);
    expect(line?.items.at(-1)?.size).toBeCloseTo(11.3, 6);
  });

  it('breaks a formula wider than the line before a relation', () => {
    const set = lines('$M_{BC}=15.550\\times14.00-24.60\\times2.45=157.43$', 165);
    expect(set.length).toBeGreaterThan(1);
    expect(set.slice(1).every((line) => wordsOf(line)[0]?.includes('='))).toBe(true);
  });

  it('breaks it before a term where a relation is not enough', () => {
    const set = lines('$15.550\\times14.00-24.60\\times2.45$', 80);
    expect(set.length).toBeGreaterThan(1);
    expect(set.every((line) => line.width <= 80.02)).toBe(true);
  });

  it('refuses a formula that fits no line', () => {
    expect(() => lines('$\\frac{aaaaaaaaaaaaaaaaaaaaaaaaa}{b}$', 60)).toThrow(TypesetError);
  });

  it('refuses a character that no face has', () => {
    expect(() => lines('snow 雪', 300)).toThrow('雪');
  });

  it('kerns', () => {
    const apart = ['A', 'V'].reduce((sum, letter) => sum + typesetter.text(letter, 'Inter-400').width, 0);
    expect(typesetter.text('AV', 'Inter-400').width).toBeLessThan(apart);
  });

  it('never sets a line wider than asked, and loses no word', () => {
    const word = fc.stringMatching(/^[a-zA-Z0-9.,;-]{1,12}$/);
    fc.assert(
      fc.property(
        fc.array(word, { minLength: 1, maxLength: 40 }),
        fc.integer({ min: 90, max: 400 }),
        (words, width) => {
          const set = lines(words.join(' '), width);
          for (const line of set) expect(line.width).toBeLessThanOrEqual(width + 0.02);
          expect(set.flatMap(wordsOf).join('')).toBe(words.join(''));
        },
      ),
      { numRuns: 60 },
    );
  });
});
