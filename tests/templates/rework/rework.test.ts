import { describe, expect, it } from 'vitest';
import { solve } from '@/lib/engine/solve';
import { compose } from '@/templates/compose';
import { samples } from '../../engine/derivation/sample-structures';
import { fullValues } from './full-values';
import { rework } from './rework';

function written(name: keyof typeof samples) {
  const solved = solve(samples[name]);
  if (!solved.ok) throw new Error(solved.refusal.message);
  return { blocks: compose(solved.value, { figures: false }), ...fullValues(solved.value) };
}

describe.each(Object.keys(samples) as (keyof typeof samples)[])('the written calculation of %s', (name) => {
  const { blocks, values, twice } = written(name);
  const report = rework(blocks, values);

  it('gives its printed results when its printed figures are worked again', () => {
    expect(report.failures).toEqual([]);
  });

  it('can be read but for a few lines, which are listed', () => {
    expect(report.unparsed).toEqual([]);
  });

  it('uses no symbol with two meanings', () => {
    expect(twice).toEqual([]);
  });
});
