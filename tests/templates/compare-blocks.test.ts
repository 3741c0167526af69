import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { solveDraft } from '@/lib/services/solve-draft';
import type { Block } from '@/templates/block';
import { compareBlocks } from '@/templates/compare-blocks';
import { lastChanged } from '@/templates/last-changed';
import { proppedDraft } from '../database/sheet-factory';

function written(load: string): Block[] {
  const draft = proppedDraft();
  const first = draft.cases[0]?.loads[0];
  if (!first) throw new Error('a load is missing');
  first.first = load;
  const solved = solveDraft(draft);
  if (!solved.ok) throw new Error('it does not solve');
  return solved.blocks;
}

const sheet = written('12 kN/m');
const line = (id: string, text: string): Block => ({ kind: 'paragraph', id, text });

describe('a sheet compared with itself', () => {
  it('has every line and none of them changed', () => {
    const pairs = compareBlocks(sheet, structuredClone(sheet));
    expect(pairs).toHaveLength(sheet.length);
    expect(pairs.every((p) => p.same)).toBe(true);
  });
});

describe('a line', () => {
  it('that only got another number is the same line', () => {
    const pairs = compareBlocks(
      [line('1.1', 'a'), line('1.2', 'b')],
      [line('1.1', 'new'), line('1.2', 'a'), line('1.3', 'b')],
    );
    expect(pairs.filter((p) => !p.same)).toEqual([{ after: line('1.1', 'new'), same: false }]);
  });

  it('changed on purpose is found, and it alone', () => {
    const places = sheet.flatMap((b, i) => (b.kind === 'paragraph' ? [i] : []));
    fc.assert(
      fc.property(fc.constantFrom(...places), (at) => {
        const changed = sheet.map((b, i) => (i === at ? { ...b, text: 'something else' } : b)) as Block[];
        const pairs = compareBlocks(sheet, changed).filter((p) => !p.same);
        expect(pairs).toEqual([{ before: sheet[at], after: changed[at], same: false }]);
      }),
    );
  });

  it('taken out is found', () => {
    const pairs = compareBlocks(sheet, sheet.slice(0, -1)).filter((p) => !p.same);
    expect(pairs).toEqual([{ before: sheet.at(-1), same: false }]);
  });
});

describe('a heavier load', () => {
  it('changes lines that carry its figures and leaves the basis alone', () => {
    const pairs = compareBlocks(sheet, written('15 kN/m'));
    const step = (p: (typeof pairs)[number]) => (p.after ?? p.before)?.id.split('.')[0];
    expect(pairs.filter((p) => step(p) === '1').every((p) => p.same)).toBe(true);
    expect(pairs.some((p) => !p.same && JSON.stringify(p.after).includes('15'))).toBe(true);
  });
});

describe('the revision in which a line last changed', () => {
  it('is the newest in which it says something else than before', () => {
    const revisions = [
      { number: 0, blocks: [line('1.1', 'a'), line('1.2', 'b')] },
      { number: 1, blocks: [line('1.1', 'a'), line('1.2', 'c')] },
      { number: 2, blocks: [line('1.1', 'x'), line('1.2', 'a'), line('1.3', 'c')] },
    ];
    expect([...lastChanged(revisions)]).toEqual([
      ['1.1', 2],
      ['1.3', 1],
    ]);
  });
});
