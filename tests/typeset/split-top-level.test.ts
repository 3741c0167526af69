import { describe, expect, it } from 'vitest';
import { splitTopLevel } from '@/lib/typeset/split-top-level';
import { FORMULAS } from './formulas';

describe('cutting a formula at its top level', () => {
  it('cuts before relations', () => {
    expect(splitTopLevel('a=b\\le c', 'relations')).toEqual(['a', '=b', '\\le c']);
  });

  it('leaves relations in braces, parentheses, \\left and environments alone', () => {
    const whole = [
      '\\text{a=b}',
      '(a=b)',
      '\\left[a=b\\right]',
      '\\begin{aligned}a&=b\\end{aligned}',
      '\\sum_{i=1}',
    ];
    for (const tex of whole) expect(splitTopLevel(tex, 'relations')).toEqual([tex]);
  });

  it('does not take \\left or \\leftarrow for a relation', () => {
    expect(splitTopLevel('\\left(a\\right)', 'relations')).toHaveLength(1);
  });

  it('cuts before terms, but not at the sign of a number', () => {
    expect(splitTopLevel('-a+b\\times -c', 'terms')).toEqual(['-a', '+b', '\\times -c']);
  });

  it.each(FORMULAS)('loses nothing of %s', (tex) => {
    expect(splitTopLevel(tex, 'relations').join('')).toBe(tex);
    expect(splitTopLevel(tex, 'terms').join('')).toBe(tex);
  });
});
