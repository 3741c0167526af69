import { describe, expect, it } from 'vitest';
import { solve } from '@/lib/engine/solve';
import type { Analysis } from '@/lib/model/analysis';
import { compose } from '@/templates/compose';
import { odd } from '../../engine/derivation/odd-structures';
import { samples } from '../../engine/derivation/sample-structures';
import { fullValues } from './full-values';
import { rework } from './rework';
import { pick, slipsOf, withSlip } from './slips';

function written(analysis: Analysis) {
  const solved = solve(analysis);
  if (!solved.ok) throw new Error(solved.refusal.message);
  const solution = solved.value;
  const { values, twice } = fullValues(solution);
  return { solution, blocks: compose(solution, { figures: false }), values, twice };
}

const all: Record<string, Analysis> = { ...samples, ...odd };

describe.each(Object.keys(all))('the written calculation of %s', (name) => {
  const { blocks, values, twice, solution } = written(all[name] as Analysis);
  const report = rework(blocks, values, solution);

  it('gives its printed results when its printed figures are worked again', () => {
    expect(report.failures).toEqual([]);
    expect(report.counts.chains).toBeGreaterThan(4);
  });

  it('leaves nothing unread', () => {
    expect(report.unparsed).toEqual([]);
  });

  it('says only definitions and general formulas without a number', () => {
    expect(report.statements.length).toBeLessThanOrEqual(12 + solution.redundants.length);
  });

  it('uses no symbol with two meanings', () => {
    expect(twice).toEqual([]);
  });
});

const slips = 60;

describe.each(Object.keys(samples) as (keyof typeof samples)[])('a slip in the calculation of %s', (name) => {
  it('is noticed nine times out of ten', () => {
    const { blocks, values, solution } = written(samples[name]);
    const places = pick(slipsOf(blocks), slips);
    const noticed = places.filter((slip) => {
      const report = rework(withSlip(blocks, slip), values, solution);
      return report.failures.length + report.unparsed.length > 0;
    });
    expect(noticed.length).toBeGreaterThanOrEqual(0.9 * slips);
  });
});
