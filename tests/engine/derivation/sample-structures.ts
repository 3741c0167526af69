import { type Analysis, type AnalysisInput, analysis } from '@/lib/model/analysis';

const held = {
  fixed: { x: 'held', y: 'held', turn: 'held' },
  pinned: { x: 'held', y: 'held', turn: 'free' },
  roller: { x: 'free', y: 'held', turn: 'free' },
} as const;

const joint = (id: string, x: number, y: number, support?: keyof typeof held) => ({
  id,
  x,
  y,
  support: support && { angle: 0, ...held[support] },
});

const bar = (start: string, end: string, EI = 1, extra: object = {}) => ({
  id: `${start}-${end}`,
  start,
  end,
  EI,
  ...extra,
});

const form = (input: Omit<AnalysisInput, 'form'>): Analysis =>
  analysis.parse({ form: 'fairhand.analysis/1', ...input });

const uniform = (member: string, w: number, direction: 'y' | 'x' | 'across' = 'y') =>
  ({ kind: 'distributed', member, direction, w1: w, w2: w }) as const;

/** Invented structures, one of every kind that an office meets. */
export const proppedCantilever = form({
  units: 'SI',
  title: 'Propped cantilever',
  basis: { kind: 'relative', EI0: 18_000 },
  joints: [joint('A', 0, 0, 'fixed'), joint('B', 6, 0, 'roller')],
  members: [bar('A', 'B')],
  cases: [
    { id: 'G', title: 'Permanent', nature: 'dead', loads: [uniform('A-B', -12)] },
    {
      id: 'Q',
      title: 'Imposed',
      nature: 'live',
      loads: [{ kind: 'point', member: 'A-B', at: 3.5, direction: 'y', value: -20 }],
    },
  ],
  combinations: [{ id: 'ULS', purpose: 'strength', factors: { G: 1.35, Q: 1.5 }, source: 'EN 1990, (6.10)' }],
  displacements: [
    { member: 'A-B', at: 3.5, direction: 'y', limit: { value: 0.024, source: 'Project limit, L/250' } },
  ],
});

export const threeSpans = form({
  units: 'SI',
  title: 'Floor beam of three spans',
  basis: { kind: 'relative', EI0: 24_000 },
  joints: [
    joint('A', 0, 0, 'pinned'),
    joint('B', 5.4, 0, 'roller'),
    joint('C', 12.6, 0, 'roller'),
    joint('D', 17.1, 0, 'roller'),
  ],
  members: [bar('A', 'B', 1), bar('B', 'C', 1.6), bar('C', 'D', 1)],
  cases: [
    {
      id: 'G',
      title: 'Permanent',
      nature: 'dead',
      loads: [uniform('A-B', -8.4), uniform('B-C', -8.4), uniform('C-D', -8.4)],
    },
    { id: 'Q1', title: 'Imposed on AB', nature: 'live', loads: [uniform('A-B', -15)] },
    { id: 'Q2', title: 'Imposed on BC', nature: 'live', loads: [uniform('B-C', -15)] },
    {
      id: 'Q3',
      title: 'Imposed on CD',
      nature: 'live',
      loads: [{ kind: 'point', member: 'C-D', at: 1.8, direction: 'y', value: -36 }],
    },
  ],
  combinations: [
    { id: 'a', purpose: 'strength', factors: { G: 1.35, Q1: 1.5, Q2: 1.5 }, source: 'EN 1990, (6.10)' },
    { id: 'b', purpose: 'strength', factors: { G: 1.35, Q2: 1.5, Q3: 1.5 }, source: 'EN 1990, (6.10)' },
    { id: 'c', purpose: 'strength', factors: { G: 1.0, Q1: 1.5, Q3: 1.5 }, source: 'EN 1990, (6.10)' },
  ],
  displacements: [
    { member: 'B-C', at: 3.6, direction: 'y', limit: { value: 0.0288, source: 'Project, L/250' } },
  ],
});

const portal = (bases: 'pinned' | 'fixed', units: 'US' | 'SI') =>
  form({
    units,
    title: bases === 'pinned' ? 'Portal with hinged feet' : 'Portal with fixed feet',
    basis: { kind: 'relative', EI0: units === 'US' ? 30_000 : 20_000 },
    joints: [
      joint('1', 0, 0, bases),
      joint('2', 0, units === 'US' ? 14 : 4.2),
      joint('3', units === 'US' ? 30 : 9, units === 'US' ? 14 : 4.2),
      joint('4', units === 'US' ? 30 : 9, 0, bases),
    ],
    members: [bar('1', '2'), bar('2', '3', 2.2), bar('3', '4')],
    cases: [
      {
        id: 'D',
        title: 'Dead',
        nature: 'dead',
        loads: [
          uniform('2-3', units === 'US' ? -0.85 : -12.5),
          {
            kind: 'point',
            member: '2-3',
            at: units === 'US' ? 11 : 3.3,
            direction: 'y',
            value: units === 'US' ? -6 : -27,
          },
        ],
      },
      {
        id: 'W',
        title: 'Wind',
        nature: 'wind',
        loads: [
          uniform('1-2', units === 'US' ? 0.24 : 3.6, 'x'),
          { kind: 'joint', joint: '2', x: units === 'US' ? 2.5 : 11 },
        ],
      },
    ],
    combinations: [
      { id: '1', purpose: 'strength', factors: { D: 1.4 }, source: 'ASCE/SEI 7-16, 2.3.1' },
      { id: '4', purpose: 'strength', factors: { D: 1.2, W: 1 }, source: 'ASCE/SEI 7-16, 2.3.1' },
      { id: '5', purpose: 'strength', factors: { D: 0.9, W: 1 }, source: 'ASCE/SEI 7-16, 2.3.1' },
    ],
    displacements: [
      {
        member: '1-2',
        at: units === 'US' ? 14 : 4.2,
        direction: 'x',
        limit: { value: units === 'US' ? 0.14 : 0.042, source: 'Project limit, h/100' },
      },
    ],
  });

export const hingedPortal = portal('pinned', 'US');
export const fixedPortal = portal('fixed', 'SI');

export const slopingRoof = form({
  units: 'US',
  title: 'Frame with a sloping roof',
  basis: { kind: 'relative', EI0: 38_000 },
  joints: [joint('A', 0, 0, 'pinned'), joint('B', 0, 13), joint('C', 36, 20.5), joint('E', 36, 0, 'pinned')],
  members: [bar('A', 'B'), bar('B', 'C', 2.4), bar('C', 'E', 1.3)],
  cases: [
    { id: 'D', title: 'Dead', nature: 'dead', loads: [uniform('B-C', -0.55)] },
    {
      id: 'S',
      title: 'Snow',
      nature: 'snow',
      loads: [{ kind: 'distributed', member: 'B-C', direction: 'y', per: 'projection', w1: -0.9, w2: -0.9 }],
    },
    {
      id: 'W',
      title: 'Wind',
      nature: 'wind',
      loads: [uniform('A-B', 0.3, 'x'), uniform('B-C', 0.12, 'across')],
    },
  ],
  combinations: [
    { id: '3', purpose: 'strength', factors: { D: 1.2, S: 1.6, W: 0.5 }, source: 'ASCE/SEI 7-16, 2.3.1' },
    { id: '5', purpose: 'strength', factors: { D: 0.9, W: 1 }, source: 'ASCE/SEI 7-16, 2.3.1' },
  ],
  displacements: [{ member: 'A-B', at: 13, direction: 'x' }],
});

export const twoStoreys = form({
  units: 'SI',
  title: 'Frame of two storeys',
  basis: { kind: 'relative', EI0: 21_000 },
  joints: [
    joint('A', 0, 0, 'fixed'),
    joint('B', 6.6, 0, 'fixed'),
    joint('C', 0, 3.6),
    joint('D', 6.6, 3.6),
    joint('E', 0, 6.9),
    joint('F', 6.6, 6.9),
  ],
  members: [bar('A', 'C'), bar('B', 'D'), bar('C', 'D', 2), bar('C', 'E'), bar('D', 'F'), bar('E', 'F', 1.5)],
  cases: [
    { id: 'G', title: 'Permanent', nature: 'dead', loads: [uniform('C-D', -18), uniform('E-F', -12)] },
    {
      id: 'W',
      title: 'Wind',
      nature: 'wind',
      loads: [
        { kind: 'joint', joint: 'C', x: 14 },
        { kind: 'joint', joint: 'E', x: 9 },
      ],
    },
  ],
  combinations: [
    { id: 'a', purpose: 'strength', factors: { G: 1.35, W: 0.9 }, source: 'EN 1990, (6.10)' },
    { id: 'b', purpose: 'strength', factors: { G: 1, W: 1.5 }, source: 'EN 1990, (6.10)' },
  ],
});

export const simpleBeam = form({
  units: 'US',
  title: 'Simple beam',
  basis: { kind: 'relative', EI0: 12_000 },
  joints: [joint('A', 0, 0, 'pinned'), joint('B', 22, 0, 'roller')],
  members: [bar('A', 'B')],
  cases: [{ id: 'D', title: 'Dead', nature: 'dead', loads: [uniform('A-B', -1.1)] }],
});

export const samples = {
  proppedCantilever,
  threeSpans,
  hingedPortal,
  fixedPortal,
  slopingRoof,
  twoStoreys,
  simpleBeam,
};
