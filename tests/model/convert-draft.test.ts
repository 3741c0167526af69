import { describe, expect, it } from 'vitest';
import { convertDraft } from '@/lib/model/convert-draft';
import type { Draft } from '@/lib/model/draft';
import { readDraft } from '@/lib/model/read-draft';
import { blankStiffness, blankSupport, startingDraft } from '@/lib/model/starting-draft';
import { supportRows, writeSupports } from '@/lib/model/support-rows';
import { toFrame } from '@/lib/model/to-frame';

function beam(): Draft {
  const draft = startingDraft('beam', 'US', 'Roof beam');
  draft.geometry = {
    shape: 'beam',
    spans: [
      { length: `12'-6"`, stiffness: { ...blankStiffness(), I: '510', depth: '18', A: '10.3' } },
      { length: '20', stiffness: blankStiffness() },
    ],
    supports: [
      blankSupport('fixed'),
      { ...blankSupport('spring'), springY: '120 kip/ft' },
      blankSupport('roller'),
    ],
  };
  draft.stiffness.EI0 = '41000';
  draft.stiffness.E = '29000';
  draft.cases[0]?.loads.push(
    {
      kind: 'uniform',
      on: '1-2',
      direction: 'down',
      per: 'length',
      first: '2.4',
      second: '',
      from: '',
      to: 'L/2',
      source: '',
    },
    {
      kind: 'temperature',
      on: '2-3',
      direction: 'down',
      per: 'length',
      first: '',
      second: '40',
      from: '',
      to: '',
      source: '',
    },
  );
  draft.stiffness.alpha = '6.5e-6';
  return draft;
}

const analysisOf = (draft: Draft) => {
  const read = readDraft(draft);
  if (!read.ok) throw new Error(JSON.stringify(read.errors));
  return read.analysis;
};

describe('a sheet in the other unit set', () => {
  it('is the same structure: a length in metres is 0.3048 times that in feet', () => {
    const us = analysisOf(beam());
    const si = analysisOf(convertDraft(beam(), 'SI'));
    for (const [i, j] of us.joints.entries()) expect(si.joints[i]?.x).toBeCloseTo(j.x * 0.3048, 8);
    expect(si.cases[0]?.loads[0]).toMatchObject({ w1: expect.closeTo(-2.4 * 14.59390293720636, 6) });
    expect(si.cases[0]?.loads[1]).toMatchObject({ difference: expect.closeTo(40 / 1.8, 8) });
  });

  it('comes back with every value it had, to nine figures', () => {
    const back = analysisOf(convertDraft(convertDraft(beam(), 'SI'), 'US'));
    const before = analysisOf(beam());
    const numbers = (value: unknown): number[] =>
      typeof value === 'number'
        ? [value]
        : typeof value === 'object' && value !== null
          ? Object.values(value).flatMap(numbers)
          : [];
    const a = numbers(before);
    const b = numbers(back);
    expect(b).toHaveLength(a.length);
    for (const [i, x] of a.entries()) {
      expect(Math.abs((b[i] ?? Number.NaN) - x)).toBeLessThanOrEqual(1e-9 * Math.abs(x));
    }
  });

  it('leaves parts of a span, blanks and what cannot be read as they were typed', () => {
    const draft = beam();
    if (draft.geometry.shape === 'beam' && draft.geometry.spans[1]) draft.geometry.spans[1].length = 'twenty';
    const si = convertDraft(draft, 'SI');
    expect(si.cases[0]?.loads[0]?.to).toBe('L/2');
    expect(si.cases[0]?.loads[0]?.second).toBe('');
    expect(si.geometry.shape === 'beam' && si.geometry.spans[1]?.length).toBe('twenty');
  });
});

describe('a starting sheet turned into joints and members', () => {
  it.each(['beam', 'portal'] as const)('says of a %s the same as before', (shape) => {
    const draft = shape === 'beam' ? beam() : startingDraft('portal', 'SI', 'Shelter');
    if (draft.geometry.shape === 'portal') {
      Object.assign(draft.geometry, { span: '9', leftHeight: '4.2', rightHeight: '5.1' });
    }
    expect(analysisOf(toFrame(draft))).toEqual(analysisOf(draft));
  });
});

describe('supports as rows', () => {
  it('are written back to where the shape keeps them', () => {
    for (const draft of [beam(), startingDraft('portal', 'SI', ''), toFrame(beam())]) {
      const rows = supportRows(draft);
      const fixed = rows.map(() => blankSupport('fixed'));
      expect(supportRows(writeSupports(draft, fixed)).map((r) => r.support.kind)).toEqual(
        rows.map(() => 'fixed'),
      );
      expect(
        writeSupports(
          draft,
          rows.map((r) => r.support),
        ),
      ).toEqual(draft);
    }
  });
});
