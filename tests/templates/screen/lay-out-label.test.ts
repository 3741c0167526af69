import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { describe, expect, it } from 'vitest';
import { estimateText } from '@/lib/figures/measure-text';
import { openFaces } from '@/lib/typeset/face';
import { layOutTex } from '@/lib/typeset/lay-out-tex';
import { layOutLabel, measureLabel, widestPiece } from '@/templates/screen/lay-out-label';

const resolve = createRequire(import.meta.url).resolve;
const faces = openFaces((name) => readFileSync(resolve(`katex/dist/fonts/${name}.ttf`)));

const labels = [
  'B',
  '-23.73',
  '+1.00',
  'X_{2}=1',
  '5.40\\unit{kN/m}',
  '25.00\\unit{kN\\per m}',
  '\\bar m_1',
  'M_{CD}^{\\mathrm{D}}',
  '12\\times 3.00',
  '\\Delta=0.24\\unit{in}',
  '\\mathrm{A1}',
];

describe('labels on screen', () => {
  it.each(labels)('are as wide as the fonts make them: %s', (tex) => {
    const laid = layOutTex(tex, false, faces);
    const { width, height, depth } = layOutLabel(`$${tex}$`);
    expect(width).toBeCloseTo(laid.width, 2);
    expect(height).toBeGreaterThanOrEqual(laid.height - 0.01);
    expect(depth).toBeGreaterThanOrEqual(laid.depth - 0.01);
  });

  it.each(labels)('put each run where the fonts put it: %s', (tex) => {
    const marks = layOutTex(tex, false, faces).marks.filter((m) => m.kind === 'glyphs');
    const { runs } = layOutLabel(`$${tex}$`);
    for (const run of runs) {
      const near = marks.some((m) => {
        const ends = m.x + m.advances.reduce((sum, a) => sum + a, 0) * m.size;
        return Math.abs(m.y - run.y) < 0.01 && run.x > m.x - 0.01 && run.x < ends + 0.01;
      });
      expect(near).toBe(true);
    }
  });

  it.each(labels)('are no wider than the estimate that drawings fall back on: %s', (tex) => {
    expect(measureLabel(`$${tex}$`, 10).width).toBeLessThanOrEqual(estimateText(`$${tex}$`, 10).width + 0.6);
  });
});

describe('the widest piece of a formula', () => {
  it('is what KaTeX never breaks: a fraction as a whole, a sum term by term', () => {
    const fraction = '\\displaystyle\\frac{24.60\\times20.00+5.00\\times14.00}{40.00}';
    expect(widestPiece(fraction)).toBeCloseTo(layOutTex(fraction, false, faces).width, 1);
    expect(widestPiece('123.45+123.45+123.45')).toBeLessThan(layOutTex('123.45+123.45', false, faces).width);
  });

  it('counts the room of a root', () => {
    expect(widestPiece('\\sqrt{X_1}')).toBeGreaterThan(widestPiece('X_1') + 0.8);
  });
});
