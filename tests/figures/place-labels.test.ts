import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { estimateText } from '@/lib/figures/measure-text';
import { type LabelWish, placeLabels } from '@/lib/figures/place-labels';

const coordinate = fc.double({ min: -60, max: 60, noNaN: true });
const point = fc.record({ x: coordinate, y: coordinate });
const ink = fc.record({ a: point, b: point });
const wish = fc.record({
  at: point,
  text: fc.constantFrom('$B$', '$-23.73$', '$5.40\\unit{kN/m}$'),
  own: fc.option(ink),
});

describe('placeLabels', () => {
  it('keeps labels apart and off their own ink, however crowded', () => {
    fc.assert(
      fc.property(fc.array(wish, { maxLength: 25 }), fc.array(ink, { maxLength: 15 }), (wanted, lines) => {
        const wishes = wanted.map(
          ({ at, text, own }): LabelWish => ({
            text,
            size: 9,
            rank: 1,
            own: own ? [own] : [],
            spots: [
              { at, toward: { x: 0, y: -1 } },
              { at, toward: { x: 1, y: 0 } },
            ],
          }),
        );
        const placed = placeLabels(wishes, lines, estimateText);
        expect(placed).toHaveLength(wishes.length);
        placed.forEach(({ box: a }, i) => {
          for (const { box: b } of placed.slice(i + 1)) {
            expect(a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom).toBe(false);
          }
        });
        for (const [i, { own = [] }] of wishes.entries()) {
          const box = placed[i]?.box;
          for (const { a, b } of own) {
            // Points along the own ink stay outside the box.
            for (let t = 0; t <= 1; t += 0.01) {
              const [x, y] = [a.x + (b.x - a.x) * t, a.y + (b.y - a.y) * t];
              const inside = box && x > box.left && x < box.right && y > box.top && y < box.bottom;
              expect(inside).toBe(false);
            }
          }
        }
      }),
      { numRuns: 150 },
    );
  });

  it('takes the first spot when it is free', () => {
    const [label] = placeLabels(
      [{ text: '$B$', size: 10, rank: 1, spots: [{ at: { x: 0, y: 0 }, toward: { x: 1, y: 0 }, gap: 3 }] }],
      [],
      estimateText,
    );
    expect(label?.box.left).toBeCloseTo(3);
    expect(label?.shape.anchor).toBe('start');
    expect(label?.leader).toBeUndefined();
  });

  it('leads a line to what a label names when it has to stand far off', () => {
    const crowd = Array.from(
      { length: 40 },
      (): LabelWish => ({
        text: '$100.00$',
        size: 10,
        rank: 1,
        spots: [{ at: { x: 0, y: 0 }, toward: { x: 0, y: -1 } }],
      }),
    );
    const far = placeLabels(crowd, [], estimateText).filter((l) => l.leader);
    expect(far.length).toBeGreaterThan(10);
    for (const { leader } of far) expect(leader?.[1]).toEqual({ x: 0, y: 0 });
  });
});
