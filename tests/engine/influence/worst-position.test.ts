import fc from 'fast-check';
import { expect, test } from 'vitest';
import { valueAt } from '@/lib/engine/diagrams/piecewise';
import { influenceLines } from '@/lib/engine/influence/influence-line';
import { alongPath, worstPosition } from '@/lib/engine/influence/worst-position';
import type { Dislocation } from '@/lib/engine/stiffness/dislocate';
import { type Analysis, analysis } from '@/lib/model/analysis';

const pinned = { x: 'held', y: 'held', turn: 'free' } as const;
const roller = { x: 'free', y: 'held', turn: 'free' } as const;

function beam(spans: readonly number[]): Analysis {
  let x = 0;
  const joints = [{ id: '0', x, y: 0, support: pinned as object }];
  spans.forEach((L, i) => {
    x += L;
    joints.push({ id: `${i + 1}`, x, y: 0, support: roller });
  });
  return analysis.parse({
    form: 'fairhand.analysis/1',
    units: 'SI',
    basis: { kind: 'relative' },
    joints,
    members: spans.map((_, i) => ({ id: `m${i}`, start: `${i}`, end: `${i + 1}`, EI: 1 })),
    cases: [],
  });
}

function lineOf(structure: Analysis, force: Dislocation) {
  const [line] = influenceLines(structure, [force]) ?? [];
  if (!line) throw new Error('no influence line');
  return alongPath(
    line,
    structure.members.map((m) => ({ member: m.id, c: 1, s: 0 })),
  );
}

/** Two equal loads P at a distance a on a simple span: M = P/(2L) (L − a/2)² under the load at (L − a/2)/2. AISC Manual Table 3-23, from memory. */
test('two equal wheels bend a simple beam most as the tables say', () => {
  const [L, P, a] = [12, 50, 3];
  const at = (L - a / 2) / 2;
  const train = [
    { force: P, behind: 0 },
    { force: P, behind: a },
  ];
  const { max } = worstPosition(lineOf(beam([L]), { kind: 'M', member: 'm0', at }), train);
  expect(max.effect).toBeCloseTo((P / (2 * L)) * (L - a / 2) ** 2, 10);
});

/** Reaction under the same two loads: R = P (2 − a/L). AISC Manual Table 3-23, from memory. */
test('two equal wheels press most on a support when one stands over it', () => {
  const train = [
    { force: 50, behind: 0 },
    { force: 50, behind: 3 },
  ];
  const reaction = lineOf(beam([12]), { kind: 'reaction', joint: '0', component: 'y' });
  const { max } = worstPosition(reaction, train);
  expect(max.effect).toBeCloseTo(50 * (2 - 3 / 12), 10);
  expect(max.at).toBeCloseTo(3, 12);
});

test('shear at a section jumps as a wheel passes, and both sides are weighed', () => {
  const shear = lineOf(beam([10]), { kind: 'V', member: 'm0', at: 4 });
  const { max, min } = worstPosition(shear, [{ force: 10, behind: 0 }]);
  expect(max.effect).toBeCloseTo(6, 12);
  expect(min.effect).toBeCloseTo(-4, 12);
});

test('no sampled position of a train beats the one found', () => {
  const spans = fc.array(fc.integer({ min: 4, max: 12 }), { minLength: 1, maxLength: 4 });
  const train = fc.array(
    fc.record({ force: fc.integer({ min: -5, max: 30 }), gap: fc.integer({ min: 1, max: 6 }) }),
    {
      minLength: 1,
      maxLength: 4,
    },
  );
  fc.assert(
    fc.property(spans, train, fc.double({ min: 0.05, max: 0.95, noNaN: true }), (lengths, loads, part) => {
      const structure = beam(lengths);
      const line = lineOf(structure, { kind: 'M', member: 'm0', at: part * (lengths[0] as number) });
      let behind = 0;
      const moving = loads.map(({ force, gap }, i) => {
        behind += i === 0 ? 0 : gap;
        return { force, behind };
      });
      const { max, min } = worstPosition(line, moving);
      const end = line.at(-1)?.to as number;
      for (let k = 0; k <= 300; k++) {
        const at = ((end + behind) * k) / 300;
        const effect = moving.reduce((t, l) => {
          const s = at - l.behind;
          return s < 0 || s > end ? t : t + l.force * valueAt(line, s);
        }, 0);
        expect(effect).toBeLessThanOrEqual(max.effect + 1e-9);
        expect(effect).toBeGreaterThanOrEqual(min.effect - 1e-9);
      }
    }),
    { numRuns: 60 },
  );
});
