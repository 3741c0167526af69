import type { Draft, DraftLoad } from '@/lib/model/draft';
import { blankStiffness, blankSupport, startingDraft } from '@/lib/model/starting-draft';

/** A gallery beam fixed at one end and propped at the other, in SI; the live load as asked. */
export function proppedBeam(live: string): Draft {
  const draft = startingDraft('beam', 'SI', 'Reading gallery beam, propped');
  draft.basis = 'Drawing A-110 (invented). The wall at 1 is taken as holding the end fully.';
  draft.stiffness = { ...draft.stiffness, kind: 'relative', EI0: '52000 kN*m^2' };
  draft.geometry = {
    shape: 'beam',
    spans: [{ length: '7.2 m', stiffness: blankStiffness() }],
    supports: [blankSupport('fixed'), blankSupport('roller')],
  };
  const uniform = (first: string): DraftLoad => ({
    kind: 'uniform',
    on: '1-2',
    direction: 'down',
    per: 'length',
    first,
    second: '',
    from: '',
    to: '',
    source: 'invented for the demo',
  });
  draft.cases = [
    {
      id: 'D',
      title: 'Dead',
      nature: 'dead',
      category: '',
      reversible: false,
      loads: [uniform('6.5 kN/m')],
    },
    { id: 'L', title: 'Live', nature: 'live', category: '', reversible: false, loads: [uniform(live)] },
  ];
  draft.combinationSet = 'asce-7-16-lrfd';
  draft.displacements = [
    { member: '1-2', at: '0.58*L', direction: 'across', limit: 'L/360', source: 'invented for the demo' },
  ];
  return draft;
}
