import { readFileSync } from 'node:fs';
import { expect, it } from 'vitest';
import { drawSeal } from '@/lib/signing/draw-seal';

const font = (weight: number) => new Uint8Array(readFileSync(`fonts/inter-${weight}.ttf`));

it('writes no exponent, which a PDF does not know, whatever is left of a rounding', () => {
  const text = {
    title: 'Structural Engineer',
    jurisdiction: 'Orrin',
    name: 'A. Name',
    licenceNumber: '1',
    licenceExpires: '1 Jan 2030',
    date: '1 Dec 2026',
  };
  const draw = drawSeal(text, { regular: font(400), medium: font(500), semibold: font(600) });
  expect(draw(113.38582677165356, 113.38582677165354)).not.toMatch(/\de[-+]?\d/);
});
