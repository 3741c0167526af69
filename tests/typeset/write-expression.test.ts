import { describe, expect, it } from 'vitest';
import { dimensions } from '@/lib/engine/derivation/dimensions';
import {
  negative,
  number,
  power,
  product,
  quotient,
  root,
  sum,
  type Value,
} from '@/lib/engine/derivation/expression';
import { fractionTex, powerTex } from '@/lib/typeset/number';
import { quantityTex } from '@/lib/typeset/quantity-tex';
import { formulaTex, substitutionTex } from '@/lib/typeset/write-expression';
import { symbolTex } from '@/lib/typeset/write-symbol';
import { unitTex } from '@/lib/typeset/write-unit';

const value = (letter: string, v: number, dimension: Value['dimension'], decimals = 2): Value => ({
  kind: 'value',
  symbol: { letter },
  value: v,
  dimension,
  decimals,
});
const P = value('P', 5, dimensions.force);
const a = value('a', -14, dimensions.length);

describe('quantities in TeX', () => {
  it('group thousands as their country does', () => {
    const q = { value: 28_177.456, dimension: dimensions.moment, decimals: 2 };
    expect(quantityTex(q, 'US')).toBe('28{,}177.46\\unit{kip\\per ft}');
    expect(quantityTex(q, 'SI')).toBe('28\\,177.46\\unit{kN\\per m}');
    expect(quantityTex({ ...q, value: 5000, decimals: 0 }, 'SI')).toBe('5000\\unit{kN\\per m}');
  });

  it('print small lengths in inches or millimetres', () => {
    expect(quantityTex({ value: 0.0759, dimension: dimensions.length, decimals: 3, scale: 12 }, 'US')).toBe(
      '0.911\\unit{in}',
    );
    expect(quantityTex({ value: 0.0159, dimension: dimensions.length, decimals: 1, scale: 1000 }, 'SI')).toBe(
      '15.9\\unit{mm}',
    );
  });

  it('print no negative zero and no unit for pure numbers', () => {
    expect(quantityTex({ value: -0.0001, dimension: dimensions.pure, decimals: 2 }, 'SI')).toBe('0.00');
  });

  it('name the units of any dimension', () => {
    expect(unitTex({ force: 1, length: 3, temperature: 0 }, 'US')).toBe('kip\\per ft^3');
    expect(unitTex(dimensions.perLength, 'SI')).toBe('/m');
    expect(unitTex(dimensions.intensity, 'SI')).toBe('kN/m');
    expect(unitTex({ force: -1, length: -1, temperature: 0 }, 'SI')).toBe('/(kN\\per m)');
  });
});

describe('formulas in TeX', () => {
  it('put a negative factor in brackets and fold a negative term into its sign', () => {
    const e = sum(P, product(a, P), product(P, a));
    expect(formulaTex(e, 'SI')).toBe('P+a\\,P+P\\,a');
    expect(substitutionTex(e, 'SI')).toBe(
      '5.00\\unit{kN}-14.00\\unit{m}\\times 5.00\\unit{kN}+5.00\\unit{kN}\\times (-14.00\\unit{m})',
    );
  });

  it('bracket a negative first factor behind a minus sign', () => {
    expect(substitutionTex(sum(P, negative(product(a, P))), 'SI')).toBe(
      '5.00\\unit{kN}-(-14.00\\unit{m})\\times 5.00\\unit{kN}',
    );
  });

  it('bracket sums that are multiplied and quantities that are squared', () => {
    expect(formulaTex(product(P, sum(a, P)), 'SI')).toBe('P\\,(a+P)');
    expect(substitutionTex(quotient(power(a, 2), number(8)), 'SI')).toBe('\\frac{(-14.00\\unit{m})^{2}}{8}');
    expect(formulaTex(root(power(a, 2)), 'SI')).toBe('\\sqrt{a^{2}}');
  });
});

describe('symbols in TeX', () => {
  it('put the place below, the case upright above, a bar on unit states', () => {
    expect(symbolTex({ letter: 'R', sub: ['A', 'y', ',', '0'], super: 'D' })).toBe('R_{Ay,0}^{\\mathrm{D}}');
    expect(symbolTex({ letter: 'm', mark: 'bar', sub: ['A', 'B', ',', '1'] })).toBe('\\bar{m}_{AB,1}');
    expect(symbolTex({ letter: 'δ', sub: ['10'], timesEI0: true })).toBe('EI_0\\,\\delta_{10}');
  });

  it('do not let the number of a combination read as a power', () => {
    expect(symbolTex({ letter: 'M', super: '2' })).toBe('M^{\\mathrm{(2)}}');
  });
});

describe('plain numbers in TeX', () => {
  it('are fractions and powers of ten', () => {
    expect(fractionTex(2, 3)).toBe('\\tfrac{2}{3}');
    expect(fractionTex(4, 1)).toBe('4');
    expect(powerTex(8.7e-14)).toBe('9\\times10^{-14}');
    expect(powerTex(1e-9)).toBe('10^{-9}');
    expect(powerTex(0.5)).toBe('0.5');
  });
});
