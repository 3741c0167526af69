import { describe, expect, it } from 'vitest';
import { listInputs } from '@/lib/model/list-inputs';
import { blankStiffness, blankSupport, startingDraft } from '@/lib/model/starting-draft';

/** A beam of two spans with one load, typed by hand. */
function beam() {
  const draft = startingDraft('beam', 'SI', 'Beam');
  draft.geometry = {
    shape: 'beam',
    spans: [
      { length: '6 m', stiffness: { ...blankStiffness(), k: '2' } },
      { length: '4 m', stiffness: blankStiffness() },
    ],
    supports: [blankSupport('fixed'), blankSupport('roller'), blankSupport('roller')],
  };
  draft.cases[0]?.loads.push({
    kind: 'uniform',
    on: '1-2',
    direction: 'down',
    per: 'length',
    first: '12 kN/m',
    second: '',
    from: '',
    to: '1.5 m',
    source: 'A-201',
  });
  return draft;
}

describe('the inputs that a checker holds against drawings', () => {
  it('are each span, support and load, by place and in words', () => {
    expect(listInputs(beam())).toEqual([
      { place: 'span 1', value: 'length 6 m, k 2' },
      { place: 'span 2', value: 'length 4 m, k 1' },
      { place: 'support 1', value: 'fixed' },
      { place: 'support 2', value: 'roller' },
      { place: 'support 3', value: 'roller' },
      {
        place: 'case G, load 1',
        value: 'uniform, 1-2, down, measured per length, 12 kN/m, to 1.5 m, source A-201',
      },
    ]);
  });

  it('leave out what is blank, and choices of the method', () => {
    const draft = beam();
    draft.combinations.push({ id: 'own', purpose: 'strength', sum: '1.35 G', source: '' });
    draft.stiffness.EI0 = '';
    expect(listInputs(draft)).toEqual(listInputs(beam()));
  });

  it('have places of their own on a portal and a frame', () => {
    const frame = startingDraft('frame', 'US', 'Frame');
    frame.geometry = {
      shape: 'frame',
      joints: ['A', 'B'].map((id, i) => ({ id, x: `${i} ft`, y: '0 ft', support: blankSupport('fixed') })),
      members: [
        { start: 'A', end: 'B', startHinge: true, endHinge: false, stiffness: blankStiffness() },
        { start: 'B', end: 'A', startHinge: false, endHinge: false, stiffness: blankStiffness() },
      ],
    };
    for (const draft of [frame, startingDraft('portal', 'US', 'Portal')]) {
      const places = listInputs(draft).map((i) => i.place);
      expect(new Set(places).size).toBe(places.length);
    }
    expect(listInputs(frame)[0]).toEqual({ place: 'joint A', value: 'A, x 0 ft, y 0 ft, fixed' });
  });
});
