import type { Draft, DraftLoad } from '@/lib/model/draft';
import { blankStiffness, blankSupport, startingDraft } from '@/lib/model/starting-draft';

const load = (row: Partial<DraftLoad>): DraftLoad => ({
  kind: 'uniform',
  on: '',
  direction: 'down',
  per: 'length',
  first: '',
  second: '',
  from: '',
  to: '',
  source: 'invented for the demo',
  ...row,
});

const times = (k: string) => ({ ...blankStiffness(), k });

/** A roof beam over three spans with dead and live load. */
export function threeSpanBeam(): Draft {
  const draft = startingDraft('beam', 'US', 'Deck beam on grid B, three spans');
  draft.basis = 'Drawing A-201 (invented). Members are designed on another sheet.';
  draft.stiffness = { ...draft.stiffness, kind: 'relative', EI0: '36000 kip*ft^2' };
  draft.geometry = {
    shape: 'beam',
    spans: ['18\'-0"', '22\'-0"', '16\'-0"'].map((length) => ({ length, stiffness: blankStiffness() })),
    supports: [
      blankSupport('pinned'),
      blankSupport('roller'),
      blankSupport('roller'),
      blankSupport('roller'),
    ],
  };
  const spans = ['1-2', '2-3', '3-4'];
  draft.cases = [
    {
      id: 'D',
      title: 'Dead',
      nature: 'dead',
      category: '',
      reversible: false,
      loads: spans.map((on) => load({ on, first: '0.85 kip/ft' })),
    },
    {
      id: 'L',
      title: 'Live',
      nature: 'live',
      category: '',
      reversible: false,
      loads: [
        ...spans.map((on) => load({ on, first: '1.2 kip/ft' })),
        load({ kind: 'point', on: '2-3', first: '6 kip', from: 'L/2' }),
      ],
    },
  ];
  draft.combinationSet = 'asce-7-16-lrfd';
  draft.displacements = [
    {
      member: '2-3',
      at: 'L/2',
      direction: 'across',
      limit: 'L/360',
      source: 'IBC Table 1604.3, floor, live load',
    },
  ];
  return draft;
}

/** A pinned portal with one redundant, under dead load and wind. */
export function pinnedPortal(): Draft {
  const draft = startingDraft('portal', 'US', 'Portal on grid 3, pinned bases');
  draft.stiffness = { ...draft.stiffness, kind: 'relative', EI0: '24000 kip*ft^2' };
  draft.geometry = {
    shape: 'portal',
    span: '28\'-0"',
    leftHeight: '11\'-0"',
    rightHeight: '14\'-6"',
    leftBase: blankSupport('pinned'),
    rightBase: blankSupport('pinned'),
    leftColumn: times('1'),
    beam: times('2'),
    rightColumn: times('1'),
  };
  draft.cases = [
    {
      id: 'D',
      title: 'Dead',
      nature: 'dead',
      category: '',
      reversible: false,
      loads: [load({ on: '2-3', first: '0.6 kip/ft' })],
    },
    {
      id: 'S',
      title: 'Snow',
      nature: 'snow',
      category: '',
      reversible: false,
      loads: [load({ on: '2-3', first: '0.75 kip/ft', per: 'projection' })],
    },
    {
      id: 'W',
      title: 'Wind',
      nature: 'wind',
      category: '',
      reversible: false,
      loads: [load({ kind: 'joint', on: '2', direction: 'right', first: '3.5 kip' })],
    },
  ];
  draft.combinationSet = 'asce-7-16-lrfd';
  return draft;
}

/** A frame of two storeys and one bay on fixed bases. */
export function twoStoreyFrame(): Draft {
  const draft = startingDraft('frame', 'US', 'Two-storey frame on grid 5');
  const joint = (id: string, x: string, y: string, kind: 'fixed' | 'free') => ({
    id,
    x,
    y,
    support: blankSupport(kind),
  });
  const member = (start: string, end: string, k: string) => ({
    start,
    end,
    startHinge: false,
    endHinge: false,
    stiffness: times(k),
  });
  draft.geometry = {
    shape: 'frame',
    joints: [
      joint('1', '0', '0', 'fixed'),
      joint('2', '0', '12\'-0"', 'free'),
      joint('3', '0', '22\'-0"', 'free'),
      joint('4', '20\'-0"', '22\'-0"', 'free'),
      joint('5', '20\'-0"', '12\'-0"', 'free'),
      joint('6', '20\'-0"', '0', 'fixed'),
    ],
    members: [
      member('1', '2', '1.5'),
      member('2', '3', '1'),
      member('3', '4', '2'),
      member('4', '5', '1'),
      member('5', '6', '1.5'),
      member('2', '5', '2.5'),
    ],
  };
  draft.cases = [
    {
      id: 'D',
      title: 'Dead',
      nature: 'dead',
      category: '',
      reversible: false,
      loads: [load({ on: '2-5', first: '1.1 kip/ft' }), load({ on: '3-4', first: '0.7 kip/ft' })],
    },
    {
      id: 'W',
      title: 'Wind',
      nature: 'wind',
      category: '',
      reversible: true,
      loads: [
        load({ kind: 'joint', on: '2', direction: 'right', first: '4 kip' }),
        load({ kind: 'joint', on: '3', direction: 'right', first: '2.5 kip' }),
      ],
    },
  ];
  draft.combinationSet = 'asce-7-16-lrfd';
  return draft;
}
