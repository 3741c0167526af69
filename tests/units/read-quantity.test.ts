import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type KindName, kinds, type UnitSetName } from '@/lib/units/kind';
import { readQuantity } from '@/lib/units/read-quantity';
import { convertCoherent, writeQuantity } from '@/lib/units/write-quantity';

const value = (text: string, kind: KindName, set: UnitSetName, variables = {}) => {
  const read = readQuantity(text, kind, set, variables);
  if (!read.ok) throw new Error(`${text}: ${read.message}`);
  return read.value;
};

describe('a quantity field reads', () => {
  it.each([
    [`12'-6"`, 12.5],
    [`12' 6 1/2"`, 12 + 6.5 / 12],
    ['12 ft 6 in', 12.5],
    [`12'`, 12],
    ['6½"', 6.5 / 12],
    ['150 in', 12.5],
    ['12.5', 12.5],
    ['3.81 m', 12.5],
    ['10 + 2.5', 12.5],
  ])('%s as a length in feet', (text, feet) => {
    expect(value(text, 'length', 'US')).toBeCloseTo(feet, 12);
  });

  it.each([
    ['2.4 kip/ft', 'distributed', 'US', 2.4],
    ['2400 plf', 'distributed', 'US', 2.4],
    ['3*2.4 kip/ft', 'distributed', 'US', 7.2],
    ['1.40 kN/m2 * 4.5 m', 'distributed', 'SI', 6.3],
    ['1.40 kN/m² × 4.5 m', 'distributed', 'SI', 6.3],
    ['1,200 lb', 'force', 'US', 1.2],
    ['510 in^4', 'inertia', 'US', 510 / 12 ** 4],
    ['29000', 'modulus', 'US', 29000 * 144],
    ['210 GPa', 'modulus', 'SI', 210e6],
    ['30 deg', 'angle', 'SI', Math.PI / 6],
    ['30', 'angle', 'SI', Math.PI / 6],
    ['12e-6', 'expansion', 'SI', 12e-6],
    ['25 K', 'temperature', 'SI', 25],
    ['−3', 'force', 'SI', -3],
  ] as const)('%s as %s (%s)', (text, kind, set, expected) => {
    expect(value(text, kind, set)).toBeCloseTo(expected, 9);
  });

  it('a part of the span by its letter', () => {
    expect(value('L/3', 'length', 'SI', { L: { value: 7.2, kind: 'length' } })).toBeCloseTo(2.4, 12);
  });
});

describe('a quantity field answers politely', () => {
  it('names what was typed and what was asked for', () => {
    const read = readQuantity('7.2 kN', 'length', 'SI');
    expect(read).toEqual({ ok: false, message: 'That is a force. A length is asked for, such as 7.20 m.' });
  });

  it.each([
    'abc',
    'sqrt(2)',
    'a = 3',
    '1/0',
    '"x"',
    '2 +',
    '[1,2]',
    'import',
    '9^99',
    '1 m + 1 kN',
    '',
    'x'.repeat(300),
  ])('refuses %j without throwing', (text) => {
    const read = readQuantity(text, 'length', 'SI');
    expect(read.ok).toBe(false);
  });

  it('never throws and never answers a number that is not finite, whatever is typed', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 40 }), (text) => {
        const read = readQuantity(text, 'distributed', 'US');
        return !read.ok || Number.isFinite(read.value);
      }),
      { numRuns: 2000 },
    );
  });
});

describe('a quantity that is shown', () => {
  it('reads back to the figures it was shown with, for every kind in both unit sets', () => {
    const names = Object.keys(kinds) as KindName[];
    fc.assert(
      fc.property(
        fc.constantFrom(...names),
        fc.constantFrom<UnitSetName>('US', 'SI'),
        fc.double({ min: 1e-3, max: 1e6, noNaN: true }),
        (kind, set, x) => {
          const back = value(writeQuantity(x, kind, set, 9), kind, set);
          return Math.abs(back - x) <= 1e-8 * x;
        },
      ),
    );
  });

  it('goes to the other unit set and back unchanged', () => {
    const there = convertCoherent(2.4, 'distributed', 'US', 'SI');
    expect(there).toBeCloseTo(35.0254, 4); // 1 kip/ft = 14.5939 kN/m, NIST SP 811 appendix B.8
    expect(convertCoherent(there, 'distributed', 'SI', 'US')).toBeCloseTo(2.4, 12);
  });
});
