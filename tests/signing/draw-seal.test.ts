import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { drawSeal, type SealText } from '@/lib/signing/draw-seal';

const font = (weight: number) => readFileSync(new URL(`../../fonts/inter-${weight}.ttf`, import.meta.url));
const fonts = { regular: font(400), medium: font(500), semibold: font(600) };
const text: SealText = {
  title: 'Structural Engineer',
  jurisdiction: 'Port Halden',
  name: 'Elin Varga',
  licenceNumber: '20417',
  licenceExpires: '30 Jun 2027',
  date: '19 Nov 2026',
};

/** Every point a path goes through, with the scale the drawing starts with. */
function points(drawing: string): [number, number][] {
  const [scale = 1, x = 0, y = 0] = (drawing.match(/^q (\S+) 0 0 \S+ (\S+) (\S+) cm/) ?? [])
    .slice(1)
    .map(Number);
  return [...drawing.matchAll(/(\S+) (\S+) (?=[mlc]\b)/g)].map(([, a, b]) => [
    Number(a) * scale + x,
    Number(b) * scale + y,
  ]);
}

describe('the seal', () => {
  it('is lines and outlines in seal red, without a font, a picture or another resource', () => {
    const words = drawSeal(text, fonts)(144, 144)
      .replace(/-?\d*\.?\d+/g, '')
      .split(/\s+/)
      .filter(Boolean);
    expect([...new Set(words)].sort()).toEqual(
      ['Q', 'RG', 'S', 'c', 'cm', 'f', 'h', 'l', 'm', 'q', 'rg', 'w'].sort(),
    );
    const [, red] = drawSeal(text, fonts)(144, 144).match(/cm (\S+ \S+ \S+) rg/) ?? [];
    expect(red?.split(' ').map((part) => Math.round(Number(part) * 255))).toEqual([0xb4, 0x23, 0x1b]);
  });
  it('stays within its field, whatever the field’s shape, and in its middle', () => {
    for (const [width, height] of [
      [144, 144],
      [200, 90],
      [60, 180],
    ] as const) {
      const all = points(drawSeal(text, fonts)(width, height));
      const xs = all.map(([x]) => x);
      const ys = all.map(([, y]) => y);
      expect(Math.min(...xs, ...ys)).toBeGreaterThanOrEqual(0);
      expect(Math.max(...xs)).toBeLessThanOrEqual(width);
      expect(Math.max(...ys)).toBeLessThanOrEqual(height);
      expect((Math.min(...xs) + Math.max(...xs)) / 2).toBeCloseTo(width / 2, 6);
    }
  });
  it('keeps long names and titles inside their rings', () => {
    const long = {
      ...text,
      name: 'Maximiliana Featherstonehaugh-Østergaard',
      title: 'Licensed Professional Structural Engineer of Record',
      jurisdiction: 'Commonwealth of the Northern Halden Islands',
    };
    const rows = drawSeal(long, fonts)(200, 200).split('\n').slice(4);
    expect(rows).toHaveLength(6);
    for (const [i, row] of rows.entries()) {
      const radii = points(row).map(([x, y]) => Math.hypot(x - 100, y - 100));
      expect(Math.min(...radii) > 66).toBe(i < 2);
      expect(Math.max(...radii)).toBeLessThan(i < 2 ? 92.4 : 66);
    }
    // The words round the top end above the dots, those round the foot below them.
    expect(Math.min(...points(rows[0] as string).map(([, y]) => y))).toBeGreaterThan(102);
    expect(Math.max(...points(rows[1] as string).map(([, y]) => y))).toBeLessThan(98);
  });
  it('refuses a name its font cannot write', () => {
    expect(() => drawSeal({ ...text, name: '耿 Wei' }, fonts)).toThrow('no 耿');
  });
});
