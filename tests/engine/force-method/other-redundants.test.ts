import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { solve } from '@/lib/engine/solve';
import { type Quantity, quantityKey } from '@/lib/model/quantity';
import { beam, frame } from '../../bench/structures';
import { samples, simpleBeam } from '../derivation/sample-structures';
import { randomStructure } from '../properties/random-structure';

const again = (input: unknown) => solve(input, { otherRedundants: true });
const keys = (list: readonly Quantity[]) => new Set(list.map(quantityKey));

describe('a second solution with other redundants', () => {
  it.each(Object.keys(samples).filter((name) => name !== 'simpleBeam'))(
    'releases none of the first forces of %s, and finds the same ones',
    (name) => {
      const result = again(samples[name as keyof typeof samples]);
      if (!result.ok) throw new Error(result.refusal.message);
      const { redundants, other, checks, analysis } = result.value;
      expect(other?.redundants).toHaveLength(redundants.length);
      const own = keys(redundants);
      expect(other?.redundants.filter((q) => own.has(quantityKey(q)))).toEqual([]);
      const found = checks.filter((c) => c.kind === 'other-redundants');
      expect(found.map((c) => c.case)).toEqual(analysis.cases.map((c) => c.id));
      for (const c of found) expect(c.residual).toBeLessThan(1e-12);
    },
  );

  it('does not take a moment on the other side of a joint for another force', () => {
    const result = again(beam(6));
    if (!result.ok) throw new Error(result.refusal.message);
    // A moment over a support stands at the end of one span and at the start of the next.
    const over = (q: Quantity) =>
      q.kind === 'moment' ? Number(q.member.slice(1)) + (q.end === 'end' ? 1 : 0) : quantityKey(q);
    const own = new Set(result.value.redundants.map(over));
    expect(result.value.other?.redundants.some((q) => !own.has(over(q)))).toBe(true);
  });

  it('is a set that can be chosen, and gives the same answer then', () => {
    const first = again(frame(2, 1));
    if (!first.ok) throw new Error(first.refusal.message);
    const second = solve({ ...frame(2, 1), redundants: first.value.other?.redundants });
    if (!second.ok) throw new Error(second.refusal.message);
    const [a, b] = [first.value.cases.D?.reactions, second.value.cases.D?.reactions];
    a?.forEach((r, i) => {
      expect(b?.[i]?.value).toBeCloseTo(r.value, 8);
    });
    expect(second.value.condition).toBeCloseTo(first.value.other?.condition as number, 6);
  });

  it('refuses nothing that is solved without it, on random structures', () => {
    fc.assert(
      fc.property(randomStructure, (input) => {
        const [first, second] = [solve(input), again(input)];
        expect(second.ok).toBe(first.ok);
      }),
      { numRuns: 150 },
    );
  });

  it('is left out where nothing is redundant, and where it was not asked for', () => {
    const determinate = again(simpleBeam);
    expect(determinate.ok && determinate.value.other).toBe(undefined);
    const plain = solve(samples.fixedPortal);
    expect(plain.ok && plain.value.checks.some((c) => c.kind === 'other-redundants')).toBe(false);
  });
});
