import { type Analysis, type AnalysisInput, analysis } from '@/lib/model/analysis';

type Held = 'fixed' | 'pinned' | 'roller' | 'guided' | 'spring';

const supports = {
  fixed: { x: 'held', y: 'held', turn: 'held' },
  pinned: { x: 'held', y: 'held', turn: 'free' },
  roller: { x: 'free', y: 'held', turn: 'free' },
  guided: { x: 'free', y: 'held', turn: 'held' },
  spring: { x: 'held', y: { spring: 5000 }, turn: 'free' },
} as const;

export const joint = (id: string, x: number, y: number, held?: Held, angle = 0) => ({
  id,
  x,
  y,
  support: held && { angle, ...supports[held] },
});

export const member = (start: string, end: string, extra: object = {}) => ({
  id: `${start}-${end}`,
  start,
  end,
  EI: 1,
  ...extra,
});

export function frame(
  input: Pick<AnalysisInput, 'units' | 'joints' | 'members'> & Partial<AnalysisInput>,
): Analysis {
  return analysis.parse({ form: 'fairhand.analysis/1', basis: { kind: 'relative' }, cases: [], ...input });
}

const across = (name: string, w1: number, w2 = w1, extra: object = {}) =>
  ({ kind: 'distributed', member: name, direction: 'across', w1, w2, ...extra }) as const;

/** Invented structures of every kind the drawings have to cope with. */
export const portalWithCanopy = frame({
  units: 'SI',
  joints: [
    joint('A', 0, 0, 'fixed'),
    joint('B', 0, 4.2),
    joint('C', 7.2, 4.2),
    joint('D', 7.2, 0, 'pinned'),
    joint('E', 9, 4.2),
  ],
  members: [member('A', 'B'), member('B', 'C'), member('C', 'D'), member('C', 'E')],
  cases: [
    {
      id: 'D',
      title: 'Dead',
      nature: 'dead',
      loads: [across('B-C', -5.4), across('C-E', -5.4), { kind: 'joint', joint: 'E', y: -3 }],
    },
    { id: 'W', title: 'Wind', nature: 'wind', loads: [across('A-B', -3.15), across('C-E', 2.7)] },
  ],
});

export const slopedPortal = frame({
  units: 'US',
  joints: [joint('1', 0, 0, 'pinned'), joint('2', 0, 12), joint('3', 40, 21), joint('4', 40, 0, 'pinned')],
  members: [member('1', '2'), member('2', '3'), member('3', '4')],
  cases: [
    {
      id: 'D',
      title: 'Dead',
      nature: 'dead',
      loads: [
        { kind: 'distributed', member: '2-3', direction: 'y', w1: -0.6, w2: -0.6 },
        { kind: 'point', member: '2-3', at: 14.35, direction: 'y', value: -5 },
      ],
    },
    { id: 'W', title: 'Wind', nature: 'wind', loads: [{ kind: 'joint', joint: '2', x: 4 }] },
    {
      id: 'T',
      title: 'Movements',
      nature: 'temperature',
      loads: [
        { kind: 'temperature', member: '2-3', rise: 40, difference: 25 },
        { kind: 'settlement', joint: '4', component: 'y', value: -0.02 },
        { kind: 'settlement', joint: '1', component: 'x', value: 0.01 },
        { kind: 'misfit', member: '3-4', value: 0.01 },
        { kind: 'distributed', member: '2-3', direction: 'y', per: 'projection', w1: -0.8, w2: -0.4 },
      ],
    },
  ],
});

export const longBeam = frame({
  units: 'SI',
  joints: [
    joint('A', 0, 0, 'spring'),
    joint('B', 6, 0, 'roller'),
    joint('C', 13.5, 0, 'roller'),
    joint('D', 22.5, 0, 'roller'),
    joint('E', 28.5, 0, 'roller'),
    joint('F', 30.5, 0),
  ],
  members: ['AB', 'BC', 'CD', 'DE', 'EF'].map(([a = '', b = '']) => member(a, b, { weight: 1.2 })),
  cases: [
    {
      id: 'Q',
      title: 'Live',
      nature: 'live',
      loads: [
        across('A-B', -12, -12, { from: 1, to: 4 }),
        { kind: 'point', member: 'B-C', at: 2.5, direction: 'across', value: -20 },
        { kind: 'point', member: 'B-C', at: 3.4, direction: 'across', value: -20 },
        across('C-D', 0, -15),
        across('C-D', -4),
        { kind: 'couple', member: 'D-E', at: 3, value: 25 },
        { kind: 'self-weight' },
      ],
    },
  ],
});

export const manySpans = frame({
  units: 'SI',
  joints: Array.from({ length: 13 }, (_, i) => joint(`${i + 1}`, 3 * i, 0, i === 0 ? 'pinned' : 'roller')),
  members: Array.from({ length: 12 }, (_, i) => member(`${i + 1}`, `${i + 2}`)),
  cases: [
    {
      id: 'G',
      title: 'Dead',
      nature: 'dead',
      loads: Array.from({ length: 12 }, (_, i) => across(`${i + 1}-${i + 2}`, -10 - i)),
    },
  ],
});

export const storeys = frame({
  units: 'SI',
  joints: [
    joint('A', 0, 0, 'fixed'),
    joint('B', 6, 0, 'fixed'),
    joint('C', 0, 3.5),
    joint('D', 6, 3.5),
    joint('E', 0, 7),
    joint('F', 6, 7),
    joint('G', 12, 0, 'pinned'),
    joint('H', 12, 3.5),
  ],
  members: [
    member('A', 'C'),
    member('B', 'D'),
    member('C', 'D'),
    member('C', 'E'),
    member('D', 'F'),
    member('E', 'F', { releases: { start: ['moment'], end: [] } }),
    member('G', 'H'),
    member('D', 'H', { releases: { start: ['moment'], end: ['moment'] } }),
  ],
  cases: [
    {
      id: 'W',
      title: 'Wind',
      nature: 'wind',
      loads: [
        { kind: 'joint', joint: 'E', x: 10 },
        { kind: 'joint', joint: 'C', x: 20 },
        across('C-D', -20),
        across('E-F', -15),
        across('D-H', -10),
      ],
    },
  ],
});

export const skewSupports = frame({
  units: 'SI',
  joints: [
    joint('A', 0, 0, 'guided'),
    joint('B', 4, 0),
    joint('C', 8, 0, 'roller', 30),
    joint('D', 4, -3, 'pinned'),
    joint('E', 12, 2, 'pinned'),
    joint('F', 15, 0),
  ],
  members: [member('A', 'B'), member('B', 'C'), member('D', 'B'), member('C', 'E'), member('E', 'F')],
  cases: [
    {
      id: 'P',
      title: 'Plant',
      nature: 'live',
      loads: [
        { kind: 'point', member: 'A-B', at: 2, direction: 'along', value: 8 },
        { kind: 'point', member: 'D-B', at: 1.5, direction: 'across', value: 8 },
        { kind: 'joint', joint: 'F', x: 4, y: -6, couple: 3 },
        { kind: 'distributed', member: 'C-E', direction: 'x', w1: 3, w2: 3 },
        { kind: 'distributed', member: 'C-E', direction: 'along', w1: 2, w2: 2 },
        across('B-C', -6, 6),
      ],
    },
  ],
});

export const corpus = { portalWithCanopy, slopedPortal, longBeam, manySpans, storeys, skewSupports };
