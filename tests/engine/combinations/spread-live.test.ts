import { describe, expect, it } from 'vitest';
import type { Draft, DraftLoad } from '@/lib/model/draft';
import { blankStiffness, blankSupport, startingDraft } from '@/lib/model/starting-draft';
import { solveDraft } from '@/lib/services/solve-draft';

const load = (on: string, first: string): DraftLoad => ({
  kind: 'uniform',
  on,
  direction: 'down',
  per: 'length',
  first,
  second: '',
  from: '',
  to: '',
  source: '',
});

/** Two equal spans of 8 m under 10 kN/m live and nothing dead; the least factored sum is the live load itself. */
function twoSpans(): Draft {
  const draft = startingDraft('beam', 'SI', 'Beam');
  draft.geometry = {
    shape: 'beam',
    spans: [0, 1].map(() => ({ length: '8 m', stiffness: blankStiffness() })),
    supports: [blankSupport('pinned'), blankSupport('roller'), blankSupport('roller')],
  };
  draft.cases = [
    {
      id: 'L',
      title: 'Live',
      nature: 'live',
      category: '',
      reversible: false,
      loads: ['1-2', '2-3'].map((on) => load(on, '10 kN/m')),
    },
  ];
  draft.combinationSet = 'asce-7-16-lrfd';
  return { ...draft, patterns: true };
}

function solved(draft: Draft) {
  const found = solveDraft(draft);
  if (!found.ok) throw new Error(found.errors[0]?.message ?? found.refusal?.message);
  return found;
}

/** Greatest and least moment of the first span over the strength combinations, over wL². */
function extremes(draft: Draft): { most: number; least: number } {
  const envelope = solved(draft).solution.envelopes.find(
    (e) => e.member === '1-2' && e.purpose === 'strength',
  );
  const stations = envelope?.stations ?? [];
  const wL2 = 1.6 * 10 * 8 * 8;
  return {
    most: Math.max(...stations.map((s) => s.M.max)) / wL2,
    least: Math.min(...stations.map((s) => s.M.min)) / wL2,
  };
}

describe('the live load on two equal spans in turn', () => {
  it('gives 49/512 wL² in the span with one span loaded, and wL²/8 over the support with both', () => {
    // Continuous beam of two equal spans, one and both loaded: AISC Manual, table of beam diagrams; from memory.
    const { most, least } = extremes(twoSpans());
    expect(most).toBeCloseTo(49 / 512, 3);
    expect(least).toBeCloseTo(-1 / 8, 9);
  });

  it('gives 9/128 wL² in the span when it always acts on both', () => {
    const { most } = extremes({ ...twoSpans(), patterns: false });
    expect(most).toBeCloseTo(9 / 128, 3);
  });

  it('writes each part as a case of its own, and sums that name it', () => {
    const { solution, blocks } = solved(twoSpans());
    expect(solution.analysis.cases.map((c) => c.id)).toEqual(['L1', 'L2']);
    expect(solution.combinations.map((c) => c.id)).toEqual(
      expect.arrayContaining(['1.6L1+1.6L2', '1.6L1', '1.6L2']),
    );
    expect(JSON.stringify(blocks)).toContain('Live, span 1');
  });

  it('carries the factor of an own sum to every part', () => {
    const draft = twoSpans();
    draft.combinations = [{ id: 'own', purpose: 'strength', sum: '1.5 L', source: 'office' }];
    const own = solved(draft).solution.analysis.combinations.find((c) => c.id === 'own');
    expect(own?.factors).toEqual({ L1: 1.5, L2: 1.5 });
  });
});

describe('what cannot be loaded in turn', () => {
  it('is said at the choice: two live cases, or a name that is taken', () => {
    const [first] = twoSpans().cases;
    if (!first) throw new Error('no case');
    const two = solveDraft({ ...twoSpans(), cases: [first, { ...first, id: 'Q' }] });
    expect(!two.ok && two.errors[0]).toMatchObject({ path: 'patterns', message: /L and Q are both live/ });
    const taken = solveDraft({ ...twoSpans(), cases: [first, { ...first, id: 'L2', nature: 'dead' }] });
    expect(!taken.ok && taken.errors[0]?.message).toMatch(/would be called L2/);
  });
});
