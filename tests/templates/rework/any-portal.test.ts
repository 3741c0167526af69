import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { solve } from '@/lib/engine/solve';
import { type AnalysisInput, analysis } from '@/lib/model/analysis';
import { compose } from '@/templates/compose';
import { fullValues } from './full-values';
import { rework } from './rework';

type LoadInput = NonNullable<AnalysisInput['cases'][number]>['loads'][number];

const bases = {
  fixed: { angle: 0, x: 'held', y: 'held', turn: 'held' },
  pinned: { angle: 0, x: 'held', y: 'held', turn: 'free' },
} as const;

const length = fc.integer({ min: 200, max: 1500 }).map((v) => v / 100);
const size = fc
  .integer({ min: -4000, max: 4000 })
  .filter((v) => v !== 0)
  .map((v) => v / 100);
const multiple = fc.constantFrom(1, 1.5, 2, 0.75, 3.33);
const direction = fc.constantFrom('x' as const, 'y' as const, 'across' as const, 'along' as const);

function loads(lengthOf: (member: string) => number): fc.Arbitrary<LoadInput> {
  const member = fc.constantFrom('AB', 'BC', 'CD');
  const place = fc.integer({ min: 1, max: 9 });
  const at = (m: string, tenth: number) => Math.round(lengthOf(m) * tenth * 10) / 100;
  return fc.oneof(
    fc
      .record({
        m: member,
        d: direction,
        w1: size,
        w2: fc.option(size),
        per: fc.constantFrom('length' as const, 'projection' as const),
      })
      .map(
        ({ m, d, w1, w2, per }): LoadInput => ({
          kind: 'distributed',
          member: m,
          direction: d,
          w1,
          w2: w2 ?? w1,
          per,
        }),
      ),
    fc
      .record({ m: member, d: direction, v: size, p: place })
      .map(
        ({ m, d, v, p }): LoadInput => ({ kind: 'point', member: m, at: at(m, p), direction: d, value: v }),
      ),
    fc
      .record({ m: member, v: size, p: place })
      .map(({ m, v, p }): LoadInput => ({ kind: 'couple', member: m, at: at(m, p), value: v })),
    fc
      .record({ x: size, y: size, couple: fc.option(size) })
      .map(({ x, y, couple }): LoadInput => ({ kind: 'joint', joint: 'B', x, y, couple: couple ?? 0 })),
  );
}

const portal = fc
  .record({
    h1: length,
    h2: length,
    l: length,
    left: fc.constantFrom('fixed' as const, 'pinned' as const),
    right: fc.constantFrom('fixed' as const, 'pinned' as const),
    k1: multiple,
    k2: multiple,
    units: fc.constantFrom('US' as const, 'SI' as const),
  })
  .chain((g) => {
    const own = loads((m) => (m === 'AB' ? g.h1 : m === 'CD' ? g.h2 : Math.hypot(g.l, g.h2 - g.h1)));
    return fc
      .tuple(fc.array(own, { minLength: 1, maxLength: 4 }), fc.array(own, { minLength: 1, maxLength: 2 }))
      .map(
        ([G, W]): AnalysisInput => ({
          form: 'fairhand.analysis/1',
          units: g.units,
          basis: { kind: 'relative', EI0: 25_000 },
          joints: [
            { id: 'A', x: 0, y: 0, support: bases[g.left] },
            { id: 'B', x: 0, y: g.h1 },
            { id: 'C', x: g.l, y: g.h2 },
            { id: 'D', x: g.l, y: 0, support: bases[g.right] },
          ],
          members: [
            { id: 'AB', start: 'A', end: 'B', EI: g.k1 },
            { id: 'BC', start: 'B', end: 'C', EI: g.k2 },
            { id: 'CD', start: 'C', end: 'D', EI: 1 },
          ],
          cases: [
            { id: 'G', title: 'Permanent', nature: 'dead', loads: G },
            { id: 'W', title: 'Wind', nature: 'wind', loads: W },
          ],
          combinations: [{ id: 'u', purpose: 'strength', factors: { G: 1.35, W: 1.5 } }],
          displacements: [{ member: 'BC', at: g.l / 2, direction: 'y' }],
        }),
      );
  });

describe('the written calculation of any portal', () => {
  it('can be worked again with its printed figures', () => {
    fc.assert(
      fc.property(portal, (input) => {
        const solved = solve(analysis.parse(input));
        if (!solved.ok) throw new Error(solved.refusal.message);
        const { values, twice } = fullValues(solved.value);
        const report = rework(compose(solved.value, { figures: false }), values, solved.value);
        expect([...report.failures, ...report.unparsed, ...twice]).toEqual([]);
      }),
      { seed: 20_251, numRuns: 40 },
    );
  });
});
