import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { alignRows } from '@/lib/model/align-rows';
import { compareDrafts } from '@/lib/model/compare-drafts';
import type { Draft, DraftLoad } from '@/lib/model/draft';
import { startingDraft } from '@/lib/model/starting-draft';

const load = (first: string): DraftLoad => ({
  kind: 'uniform',
  on: '1-2',
  direction: 'down',
  per: 'length',
  first,
  second: '',
  from: '',
  to: '',
  source: '',
});

function withLoads(...values: string[]): Draft {
  const draft = startingDraft('beam', 'SI', 'Beam');
  return {
    ...draft,
    cases: draft.cases.slice(0, 1).map((c) => ({ ...c, id: 'D', loads: values.map(load) })),
  };
}

describe('two drafts compared', () => {
  it('differ in nothing when they are the same', () => {
    for (const shape of ['beam', 'portal', 'frame'] as const) {
      const draft = startingDraft(shape, 'US', 'Sheet');
      expect(compareDrafts(draft, structuredClone(draft))).toEqual([]);
    }
  });

  it('name the field that changed, with what was and is written', () => {
    expect(compareDrafts(withLoads('3 kN/m', '4 kN/m'), withLoads('3 kN/m', '5 kN/m'))).toEqual([
      { place: 'case D, load 2, value', before: '4 kN/m', after: '5 kN/m' },
    ]);
    const portal = startingDraft('portal', 'SI', 'Portal');
    if (portal.geometry.shape !== 'portal') throw new Error('not a portal');
    const higher = { ...portal, geometry: { ...portal.geometry, leftHeight: '4 m' } };
    expect(compareDrafts(portal, higher).map((c) => c.place)).toEqual(['left height']);
  });

  it('see a row put in between as one row more, not as every row changed', () => {
    const notes = compareDrafts(withLoads('1 kN/m', '2 kN/m'), withLoads('1 kN/m', '9 kN/m', '2 kN/m'));
    expect(notes).toHaveLength(1);
    expect(notes[0]).toMatchObject({ place: 'case D, load 2' });
    expect(notes[0]?.before).toBeUndefined();
    expect(notes[0]?.after).toContain('9 kN/m');
  });

  it('find each of the values changed on purpose, and no other', () => {
    const values = fc.array(fc.integer({ min: 1, max: 9 }), { minLength: 1, maxLength: 12 });
    fc.assert(
      fc.property(values, fc.nat(), (rows, pick) => {
        const at = pick % rows.length;
        const before = rows.map((v) => `${v} kN/m`);
        const after = before.map((v, i) => (i === at ? '77 kN/m' : v));
        expect(compareDrafts(withLoads(...before), withLoads(...after))).toEqual([
          { place: `case D, load ${at + 1}, value`, before: before[at], after: '77 kN/m' },
        ]);
      }),
    );
  });
});

describe('rows that are paired', () => {
  it('name every row of both lists once, in order', () => {
    const list = fc.array(fc.integer({ min: 0, max: 4 }), { maxLength: 15 });
    fc.assert(
      fc.property(list, list, (a, b) => {
        const pairs = alignRows(a, b, (x, y) => x === y);
        const seen = (side: 'before' | 'after') =>
          pairs.flatMap((p) => (p[side] === undefined ? [] : [p[side]]));
        expect(seen('before')).toEqual(a.map((_, i) => i));
        expect(seen('after')).toEqual(b.map((_, i) => i));
      }),
    );
  });
});
