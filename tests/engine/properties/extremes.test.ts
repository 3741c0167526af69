import fc from 'fast-check';
import { expect, test } from 'vitest';
import { valueAt } from '@/lib/engine/diagrams/piecewise';
import { solve } from '@/lib/engine/solve';
import { solveStiffness } from '@/lib/engine/stiffness/solve-stiffness';
import { type AnalysisInput, analysis } from '@/lib/model/analysis';

/** Agreement asked of what is stiff and soft, long and short in one structure. */
const extreme = 1e-6;

/** Beams whose spans run from a thousandth to a thousand, and stiffnesses over six powers of ten. */
const lengths = fc.array(
  fc.record({
    L: fc.integer({ min: -3, max: 3 }),
    EI: fc.integer({ min: 0, max: 6 }),
    w: fc.integer({ min: -9, max: 9 }),
  }),
  { minLength: 2, maxLength: 6 },
);

function beam(spans: readonly { L: number; EI: number; w: number }[], fixed: boolean): AnalysisInput {
  const pinned = { x: 'held', y: 'held', turn: fixed ? 'held' : 'free' } as const;
  const roller = { x: 'free', y: 'held', turn: 'free' } as const;
  const joints: AnalysisInput['joints'] = [{ id: '0', x: 0, y: 0, support: pinned }];
  let x = 0;
  spans.forEach(({ L }, i) => {
    x += 10 ** L;
    joints.push({ id: `${i + 1}`, x, y: 0, support: roller });
  });
  return {
    form: 'fairhand.analysis/1',
    units: 'SI',
    basis: { kind: 'absolute' },
    joints,
    members: spans.map(({ EI }, i) => ({ id: `${i}`, start: `${i}`, end: `${i + 1}`, EI: 10 ** EI })),
    cases: [
      {
        id: 'A',
        title: 'loads',
        nature: 'other',
        loads: spans.map(({ w }, i) => ({
          kind: 'distributed',
          member: `${i}`,
          direction: 'y',
          w1: w,
          w2: w,
        })),
      },
    ],
  };
}

test('keeps six figures where spans and stiffnesses differ by a million, and hardly ever refuses', () => {
  let solved = 0;
  const numRuns = 400;
  fc.assert(
    fc.property(lengths, fc.boolean(), (spans, fixed) => {
      const input = beam(spans, fixed);
      const result = solve(input);
      if (!result.ok) {
        expect(result.refusal.code).toMatch(/check-failed|unstable|joints-coincide/);
        return;
      }
      solved++;
      const second = solveStiffness(analysis.parse(input))?.get('A');
      const moments = spans.map((_, i) => {
        const M = result.value.cases.A?.members[`${i}`]?.M ?? [];
        return [valueAt(M, 0), second?.members[i]?.M0 as number] as const;
      });
      const within = spans.map(({ L, w }) => (Math.abs(w) * 10 ** (2 * L)) / 8);
      const size = Math.max(...moments.flat().map(Math.abs), ...within);
      for (const [a, b] of moments) expect(Math.abs(a - b)).toBeLessThanOrEqual(extreme * size);
    }),
    { numRuns },
  );
  expect(solved).toBeGreaterThanOrEqual(numRuns * 0.99);
});

test('releases the moments over the supports of a beam whatever its lengths, and reports how well that goes', () => {
  fc.assert(
    fc.property(lengths, (spans) => {
      const result = solve(beam(spans, true));
      if (!result.ok) return;
      const { redundants, condition } = result.value;
      const moments = redundants.filter(
        (q) => q.kind === 'moment' || ('component' in q && q.component === 'turn'),
      );
      expect(moments).toHaveLength(spans.length);
      // Every member gives L/6k [2 1; 1 2], whose eigenvalues are 1 and 3 times L/6k; the diagonal has 2.
      expect(condition).toBeLessThan(3 + 1e-6);
    }),
    { numRuns: 200 },
  );
});
