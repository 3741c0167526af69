import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { drawLoads } from '@/lib/figures/draw-loads';
import { drawPrimary } from '@/lib/figures/draw-primary';
import { drawingSchema } from '@/lib/figures/drawing';
import { frame, joint, member } from './sample-frames';

const place = fc.integer({ min: -8, max: 8 });
const value = fc.constantFrom(-20, -3.5, 0, 0.01, 7, 1250);
const held = fc.constantFrom(undefined, 'fixed', 'pinned', 'roller', 'guided', 'spring');
const direction = fc.constantFrom('x', 'y', 'along', 'across');

/** Frames as they stand while somebody types: joints on one spot, members upon members, loads of nought. */
const anyFrame = fc
  .record({
    joints: fc.array(fc.record({ x: place, y: place, held, angle: fc.constantFrom(0, 30, 90) }), {
      minLength: 2,
      maxLength: 7,
    }),
    ends: fc.array(fc.tuple(fc.nat(6), fc.nat(6), fc.boolean()), { minLength: 1, maxLength: 9 }),
    loads: fc.array(
      fc.record({ on: fc.nat(8), direction, w1: value, w2: value, at: fc.constantFrom(0, 0.4, 1) }),
      { maxLength: 6 },
    ),
  })
  .map(({ joints, ends, loads }) => {
    const made = joints.map(({ x, y, held: how, angle }, i) => joint(`${i}`, x, y, how, angle));
    const pairs = new Map(
      ends
        .map(([a, b, hinge]) => [`${a % made.length}`, `${b % made.length}`, hinge] as const)
        .filter(([a, b]) => a !== b)
        .map(([a, b, hinge]) => [
          `${a}-${b}`,
          member(a, b, hinge ? { releases: { start: ['moment'], end: [] } } : {}),
        ]),
    );
    const members = [...(pairs.size > 0 ? pairs.values() : [member('0', '1')])];
    const of = (i: number) => members[i % members.length]?.id ?? '0-1';
    return frame({
      units: 'SI',
      joints: made,
      members,
      cases: [
        {
          id: 'L',
          title: '',
          nature: 'live',
          loads: loads.flatMap(({ on, direction: d, w1, w2, at }) => [
            { kind: 'distributed' as const, member: of(on), direction: d, w1, w2 },
            { kind: 'point' as const, member: of(on), direction: d, at, value: w1 },
            { kind: 'joint' as const, joint: made[on % made.length]?.id ?? '0', x: w1, y: w2, couple: w1 },
            { kind: 'couple' as const, member: of(on), at, value: w2 },
          ]),
        },
      ],
    });
  });

describe('drawing what is being typed', () => {
  it('gives a whole drawing, with finite numbers, of any frame', () => {
    fc.assert(
      fc.property(anyFrame, fc.constantFrom(426, 232, 60), (analysis, width) => {
        const [first] = analysis.cases;
        if (!first) throw new Error('no case');
        const drawings = [
          drawLoads(analysis, first, { width }),
          drawPrimary(analysis, [{ kind: 'axial', member: analysis.members[0]?.id ?? '' }], { width }),
        ];
        for (const drawing of drawings) {
          expect(() => drawingSchema.parse(drawing)).not.toThrow();
          expect(JSON.stringify(drawing)).not.toMatch(/null|NaN|Infinity/);
        }
      }),
      { numRuns: 60 },
    );
  });
});
