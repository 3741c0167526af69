import { describe, expect, it } from 'vitest';
import { solve } from '@/lib/engine/solve';
import type { Draft } from '@/lib/model/draft';
import { readDraft } from '@/lib/model/read-draft';
import { startSheet } from '@/lib/model/start-sheet';
import type { StartingChoice } from '@/lib/model/starting-choice';

function start(choice: StartingChoice, units: Draft['units'] = 'SI'): Draft {
  const started = startSheet(choice, units, 'Sheet');
  if (!started.ok) throw new Error(started.errors.map((e) => e.message).join(' '));
  return started.draft;
}

function degreeOf(draft: Draft): number {
  const read = readDraft(draft);
  if (!read.ok) throw new Error(read.errors.map((e) => `${e.path}: ${e.message}`).join(' '));
  const solved = solve(read.analysis);
  if (!solved.ok) throw new Error(solved.refusal.message);
  return solved.value.determinacy.degree;
}

/** A joint of the finished frame in coherent units. */
function placeOf(draft: Draft, id: string): { x: number; y: number } | undefined {
  const read = readDraft(draft);
  if (!read.ok) throw new Error('it cannot be read');
  const joint = read.analysis.joints.find((j) => j.id === id);
  return joint && { x: joint.x, y: joint.y };
}

describe('a starting sheet solves as it stands, with the degree that counting gives', () => {
  const bases = 'fixed' as const;
  it.each<[string, StartingChoice, number]>([
    ['gable, fixed', { start: 'gable', span: '12 m', eaves: '4 m', ridge: '6 m', bases }, 3],
    ['gable, pinned', { start: 'gable', span: '12 m', eaves: '4 m', ridge: '6 m', bases: 'pinned' }, 1],
    ['knee, fixed and roller', { start: 'knee', height: '4 m', span: '6 m', bases, far: 'roller' }, 1],
    [
      'knee, pinned and pinned',
      { start: 'knee', height: '4 m', span: '6 m', bases: 'pinned', far: 'pinned' },
      1,
    ],
    ['knee, fixed and fixed', { start: 'knee', height: '4 m', span: '6 m', bases, far: 'fixed' }, 3],
    ['two bays, three storeys', { start: 'storeys', bays: '2 @ 6 m', heights: '4 m; 2 @ 3.5 m', bases }, 18],
  ])('%s', (_, choice, degree) => {
    expect(degreeOf(start(choice))).toBe(degree);
  });

  it.each([
    ['simple', 0],
    ['propped', 1],
    ['fixed', 3],
    ['overhang', 1],
  ] as const)('a single span, %s', (ends, degree) => {
    const draft = start({ start: 'single', ends });
    if (draft.geometry.shape !== 'beam') throw new Error('not a beam');
    for (const span of draft.geometry.spans) span.length = '5 m';
    expect(degreeOf(draft)).toBe(degree);
  });
});

describe('sizes of bays and storeys', () => {
  it('are places one after the other, written with what was typed', () => {
    const draft = start(
      { start: 'storeys', bays: '2 @ 24\'-0"; 18\'-6"', heights: '14 ft; 12 ft', bases: 'pinned' },
      'US',
    );
    if (draft.geometry.shape !== 'frame') throw new Error('not a frame');
    expect(draft.geometry.joints.at(-1)?.x).toBe('2*(24\'-0") + (18\'-6")');
    expect(placeOf(draft, '12')).toEqual({ x: 66.5, y: 26 });
    expect(draft.geometry.members).toHaveLength(8 + 6);
  });

  it.each([
    [{ bays: '', heights: '4 m' }, 'bays', /missing/],
    [{ bays: '6 kN', heights: '4 m' }, 'bays', /length/],
    [{ bays: '6 m', heights: '0 m' }, 'heights', /greater than zero/],
    [{ bays: '500 @ 6 m', heights: '4 m' }, 'bays', /At most 30/],
  ])('get a sentence at their field when they cannot be used: %j', (sizes, path, sentence) => {
    const started = startSheet({ start: 'storeys', bases: 'fixed', ...sizes }, 'SI', 'Sheet');
    expect(!started.ok && started.errors[0]).toMatchObject({
      path,
      message: expect.stringMatching(sentence),
    });
  });

  it('refuse a ridge that does not rise', () => {
    const low = { start: 'gable', span: '12 m', eaves: '4 m', ridge: '4 m', bases: 'pinned' } as const;
    const started = startSheet(low, 'SI', 'Sheet');
    expect(!started.ok && started.errors[0]?.path).toBe('ridge');
  });
});
