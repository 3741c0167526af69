import { describe, expect, it } from 'vitest';
import type { Mark } from '@/lib/typeset/laid';
import { layOutTex } from '@/lib/typeset/lay-out-tex';
import { TypesetError } from '@/lib/typeset/typeset-error';
import { faces } from './faces';
import { FORMULAS } from './formulas';

const lay = (tex: string, display = true) => layOutTex(tex, display, faces);
const kinds = (tex: string): Mark['kind'][] => lay(tex).marks.map((mark) => mark.kind);

describe('laying out TeX', () => {
  it('gives a figure of KaTeX_Main its own advance of half an em', () => {
    // KaTeX_Main-Regular, table hmtx: every figure advances 500 of 1000 units.
    expect(lay('7').width).toBeCloseTo(0.5, 6);
    expect(lay('4096').width).toBeCloseTo(2, 6);
  });

  it('joins the figures of a number into one run', () => {
    expect(lay('28177').marks).toHaveLength(1);
  });

  it('draws a bar in a fraction, an outline for a root and a frame round a box', () => {
    expect(kinds('\\frac{a}{b}')).toContain('rule');
    expect(kinds('\\sqrt{x}')).toContain('path');
    expect(kinds('\\boxed{x}')).toContain('frame');
  });

  it('stands higher and deeper in display style than in text style', () => {
    const [display, text] = [lay('\\frac{a}{b}'), lay('\\frac{a}{b}', false)];
    expect(display.height).toBeGreaterThan(text.height);
    expect(display.depth).toBeGreaterThan(text.depth);
  });

  it('knows the macros that the screen knows', () => {
    expect(lay('3\\unit{kN}').width).toBeCloseTo(lay('3\\,\\mathrm{kN}').width, 6);
  });

  it.each([
    ['\\tag{1}x', '\\tag'],
    ['\\notacommand', 'notacommand'],
    ['\\frac{1}', 'end of input'],
    ['\\reflectbox{x}', 'reflectbox'],
    ['x\\\\y', 'line break'],
    ['\\text{雪}', '雪'],
  ])('refuses %s and names what it cannot set', (tex, named) => {
    expect(() => lay(tex)).toThrow(TypesetError);
    expect(() => lay(tex)).toThrow(named);
  });

  it.each(FORMULAS)('keeps the glyphs of %s within its width, height and depth', (tex, display) => {
    const laid = lay(tex, display);
    for (const mark of laid.marks) {
      if (mark.kind !== 'glyphs') continue;
      const end = mark.x + mark.advances.reduce((sum, advance) => sum + advance, 0) * mark.size;
      expect(mark.x).toBeGreaterThan(-0.2);
      expect(end).toBeLessThan(laid.width + 0.3);
      expect(mark.y).toBeLessThan(laid.height + 0.01);
      expect(mark.y).toBeGreaterThan(-laid.depth - 0.01 - 3);
    }
  });
});
