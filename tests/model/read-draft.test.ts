import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { analysis } from '@/lib/model/analysis';
import type { Draft, DraftLoad } from '@/lib/model/draft';
import { readFactors } from '@/lib/model/read-combination';
import { readDraft } from '@/lib/model/read-draft';
import { blankStiffness, blankSupport, startingDraft } from '@/lib/model/starting-draft';

const load = (row: Partial<DraftLoad>): DraftLoad => ({
  kind: 'uniform',
  on: '1-2',
  direction: 'down',
  per: 'length',
  first: '',
  second: '',
  from: '',
  to: '',
  source: '',
  ...row,
});

function twoSpans(change: (d: Draft) => void = () => {}): Draft {
  const draft = startingDraft('beam', 'US', 'Roof beam');
  if (draft.geometry.shape !== 'beam') throw new Error('a beam was asked for');
  draft.geometry.spans = ['20\'-6"', '18 ft'].map((length) => ({ length, stiffness: blankStiffness() }));
  draft.cases = [{ ...draft.cases[0], loads: [load({ first: '2.4 kip/ft' })] } as Draft['cases'][0]];
  change(draft);
  return draft;
}

const errors = (draft: Draft) => {
  const read = readDraft(draft);
  return read.ok ? [] : read.errors;
};

describe('a draft that is complete', () => {
  it('becomes an analysis in kip and ft that the model accepts', () => {
    const read = readDraft(twoSpans());
    if (!read.ok) throw new Error(JSON.stringify(read.errors));
    const parsed = analysis.parse(read.analysis);
    expect(parsed.joints.map((j) => j.x)).toEqual([0, 20.5, 38.5]);
    expect(parsed.members.map((m) => m.id)).toEqual(['1-2', '2-3']);
    expect(parsed.cases[0]?.loads[0]).toMatchObject({
      kind: 'distributed',
      w1: -2.4,
      w2: -2.4,
      direction: 'y',
    });
  });

  it('reads positions in parts of the span', () => {
    const read = readDraft(
      twoSpans((d) => d.cases[0]?.loads.push(load({ kind: 'point', on: '2-3', first: '5', from: 'L/3' }))),
    );
    expect(read.ok && read.analysis.cases[0]?.loads[1]).toMatchObject({ kind: 'point', at: 6, value: -5 });
  });

  it('keeps the heights of a portal apart, so that its beam slopes', () => {
    const draft = startingDraft('portal', 'SI', 'Shelter');
    if (draft.geometry.shape !== 'portal') throw new Error('a portal was asked for');
    Object.assign(draft.geometry, {
      span: '9',
      leftHeight: '4.2',
      rightHeight: '5.1',
      rightBase: blankSupport('fixed'),
    });
    const read = readDraft(draft);
    expect(read.ok && read.analysis.joints.map((j) => [j.x, j.y])).toEqual([
      [0, 0],
      [0, 4.2],
      [9, 5.1],
      [9, 0],
    ]);
  });
});

describe('a draft that is not complete', () => {
  it('says so at each field, with an example', () => {
    expect(errors(startingDraft('beam', 'SI', 'New'))).toEqual([
      { path: 'geometry.spans.0.length', message: 'A length is missing, such as 7.20 m.' },
      { path: 'geometry.spans.1.length', message: 'A length is missing, such as 7.20 m.' },
    ]);
  });

  it.each([
    ['a unit of the wrong kind', { first: '3 kip' }, 'cases.0.loads.0.first'],
    ['text where a number goes', { first: 'heavy' }, 'cases.0.loads.0.first'],
    ['a member that is not there', { on: '7-8', first: '1' }, 'cases.0.loads.0.on'],
    ['a point load without a place', { kind: 'point', first: '3' }, 'cases.0.loads.0.from'],
    [
      'a couple that has no sense of a force',
      { kind: 'point', direction: 'clockwise', first: '3', from: '1' },
      'cases.0.loads.0.direction',
    ],
  ] as const)('names %s and where it stands', (_, row, path) => {
    const found = errors(
      twoSpans((d) => {
        const first = d.cases[0];
        if (first) first.loads = [load(row)];
      }),
    );
    expect(found.map((e) => e.path)).toEqual([path]);
    expect(found[0]?.message).toMatch(/^.{10,}\.$/);
  });

  it('refuses a zero span, and keeps what else can be drawn', () => {
    const read = readDraft(
      twoSpans((d) => {
        if (d.geometry.shape === 'beam' && d.geometry.spans[1]) d.geometry.spans[1].length = '0';
      }),
    );
    expect(read.ok).toBe(false);
    if (!read.ok) expect(read.geometry.joints).toHaveLength(2);
  });

  it('gives sums without a name names of their own, and refuses one name for two', () => {
    const sum = { purpose: 'strength' as const, sum: '1.2D', source: '' };
    const named = (...ids: string[]) =>
      readDraft(
        twoSpans((d) => {
          const [first] = d.cases;
          if (first) first.id = 'D';
          d.combinations = ids.map((id) => ({ ...sum, id }));
        }),
      );
    const read = named('', '', '1.2D (2)');
    expect(read.ok && read.analysis.combinations?.map((c) => c.id)).toEqual(['1.2D', '1.2D (3)', '1.2D (2)']);
    const refused = named('ULS', 'ULS');
    expect(refused.ok).toBe(false);
    if (!refused.ok) expect(refused.errors.map((e) => e.path)).toEqual(['combinations.1.id']);
  });

  it('never throws, whatever is typed into its fields', () => {
    const any = fc.string({ maxLength: 20 });
    fc.assert(
      fc.property(any, any, any, any, (a, b, c, e) => {
        const draft = twoSpans((d) => {
          if (d.geometry.shape === 'beam' && d.geometry.spans[0]) d.geometry.spans[0].length = a;
          d.cases[0]?.loads.push(load({ kind: 'point', first: b, from: c }));
          d.combinations.push({ id: '', purpose: 'strength', sum: e, source: '' });
        });
        readDraft(draft);
      }),
      { numRuns: 500 },
    );
  });
});

describe('a combination written as a sum', () => {
  const cases = new Set(['D', 'L', 'W']);
  it.each([
    ['1.2 D + 1.6 L', { D: 1.2, L: 1.6 }],
    ['0.9D − W', { D: 0.9, W: -1 }],
    ['1.2×D + 0.5·L', { D: 1.2, L: 0.5 }],
  ])('reads %s', (sum, factors) => expect(readFactors(sum, cases)).toEqual(factors));

  it.each(['', '1.2', 'D D', '1.2 D + 1.6 S', 'D + D', '1.2 / D'])('refuses %j in a sentence', (sum) => {
    expect(readFactors(sum, cases)).toMatch(/\.$/);
  });
});
