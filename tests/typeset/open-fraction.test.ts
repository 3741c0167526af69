import { expect, it } from 'vitest';
import { openFraction } from '@/lib/typeset/open-fraction';

it('opens a fraction that is a whole member, so that its numerator may break between terms', () => {
  expect(openFraction('{=}\\frac{a\\times\\left(b-c\\right)+d-e}{f_{1}}')).toEqual([
    '{=}\\tfrac{1}{f_{1}}\\,[a',
    '\\times\\left(b-c\\right)',
    '+d',
    '-e]',
  ]);
});

it('leaves alone what is more than one fraction, or has one term', () => {
  expect(openFraction('\\frac{a+b}{c}+d')).toBeUndefined();
  expect(openFraction('\\frac{a}{c}')).toBeUndefined();
  expect(openFraction('a+b')).toBeUndefined();
});
