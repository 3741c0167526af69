import { type Analysis, type AnalysisInput, analysis } from '@/lib/model/analysis';

const held = {
  fixed: { x: 'held', y: 'held', turn: 'held' },
  pinned: { x: 'held', y: 'held', turn: 'free' },
  roller: { x: 'free', y: 'held', turn: 'free' },
  spring: { x: 'free', y: { spring: 4_000 }, turn: 'free' },
} as const;

const joint = (id: string, x: number, y: number, support?: keyof typeof held, angle = 0) => ({
  id,
  x,
  y,
  support: support && { angle, ...held[support] },
});

const bar = (start: string, end: string, extra: object = {}) => ({
  id: `${start}-${end}`,
  start,
  end,
  EI: 1,
  ...extra,
});

const form = (input: Omit<AnalysisInput, 'form' | 'basis'> & Partial<AnalysisInput>): Analysis =>
  analysis.parse({ form: 'fairhand.analysis/1', basis: { kind: 'relative', EI0: 20_000 }, ...input });

const down = (member: string, w1: number, w2 = w1, extra: object = {}) =>
  ({ kind: 'distributed', member, direction: 'y', w1: -w1, w2: -w2, ...extra }) as const;

const spans = (n: number, extra: object = {}) => ({
  joints: Array.from({ length: n + 1 }, (_, i) =>
    joint(`${i + 1}`, 5.5 * i, 0, i === 0 ? 'pinned' : 'roller'),
  ),
  members: Array.from({ length: n }, (_, i) => bar(`${i + 1}`, `${i + 2}`, extra)),
});

const dead = (loads: NonNullable<AnalysisInput['cases'][number]>['loads']) => [
  { id: 'G', title: 'Permanent', nature: 'dead', loads } as const,
];

/** Structures with everything beside plain bending, and with many redundants. */
export const odd = {
  springAndSettlement: form({
    units: 'SI',
    joints: [
      joint('A', 0, 0, 'spring'),
      joint('B', 6, 0, 'pinned'),
      joint('C', 13.5, 0, 'roller'),
      joint('D', 20, 0, 'roller'),
    ],
    members: [bar('A', 'B'), bar('B', 'C', { EI: 1.5 }), bar('C', 'D')],
    cases: [
      ...dead([down('A-B', 9), down('B-C', 9), down('C-D', 9)]),
      {
        id: 'S',
        title: 'C sinks',
        nature: 'settlement',
        loads: [{ kind: 'settlement', joint: 'C', component: 'y', value: -0.01 }],
      },
    ],
  }),
  spreadBase: form({
    units: 'US',
    joints: [joint('1', 0, 0, 'pinned'), joint('2', 0, 12), joint('3', 32, 12), joint('4', 32, 0, 'pinned')],
    members: [bar('1', '2'), bar('2', '3', { EI: 2, alpha: 6.5e-6, depth: 1.4 }), bar('3', '4')],
    cases: [
      {
        id: 'M',
        title: 'Base 4 spreads',
        nature: 'settlement',
        loads: [{ kind: 'settlement', joint: '4', component: 'x', value: 0.02 }],
      },
      {
        id: 'T',
        title: 'Warm roof',
        nature: 'temperature',
        loads: [{ kind: 'temperature', member: '2-3', rise: 50, difference: 30 }],
      },
      {
        id: 'F',
        title: 'Beam too long',
        nature: 'other',
        loads: [{ kind: 'misfit', member: '2-3', value: 0.03 }],
      },
    ],
  }),
  stretching: form({
    units: 'SI',
    basis: { kind: 'absolute' },
    joints: [joint('A', 0, 0, 'fixed'), joint('B', 0, 4), joint('C', 6, 5.5), joint('D', 6, 0, 'pinned')],
    members: [
      { id: 'col', start: 'A', end: 'B', EI: 18_000, EA: 1.2e6, GAs: 3e5 },
      { id: 'raf', start: 'B', end: 'C', EI: 30_000, EA: 1.5e6, weight: 0.8, section: 'IPE 330' },
      { id: 'post', start: 'C', end: 'D', EI: 18_000, EA: 1.2e6 },
    ],
    cases: dead([
      down('raf', 7),
      { kind: 'self-weight' },
      { kind: 'couple', member: 'raf', at: 2, value: 11 },
    ]),
    displacements: [
      { member: 'raf', at: 3, direction: 'across' },
      { member: 'col', at: 4, direction: 'rotation' },
    ],
  }),
  steppedBeam: form({
    units: 'SI',
    joints: [joint('A', 0, 0, 'fixed'), joint('B', 8, 0, 'roller')],
    members: [bar('A', 'B', { steps: [{ from: 3, EI: 0.6 }] })],
    cases: dead([down('A-B', 6), down('A-B', 0, 9, { from: 2, to: 6 })]),
    displacements: [{ member: 'A-B', at: 5, direction: 'y' }],
  }),
  varyingLoads: form({
    units: 'US',
    joints: [
      joint('A', 0, 0, 'pinned'),
      joint('B', 18, 0, 'roller'),
      joint('C', 30, 0, 'roller'),
      joint('D', 36, 0),
    ],
    members: [bar('A', 'B'), bar('B', 'C'), bar('C', 'D')],
    cases: dead([
      down('A-B', 0, 2.4),
      down('B-C', 0.6, 1.5),
      down('A-B', 1.1, 1.1, { from: 4, to: 11 }),
      { kind: 'couple', member: 'B-C', at: 5, value: -14 },
      { kind: 'joint', joint: 'D', y: -3, couple: 6 },
    ]),
  }),
  hingedBeam: form({
    units: 'SI',
    joints: [
      joint('A', 0, 0, 'fixed'),
      joint('B', 5, 0, 'roller'),
      joint('H', 8, 0),
      joint('C', 12, 0, 'roller'),
      joint('E', 16, 0, 'roller'),
    ],
    members: [
      bar('A', 'B'),
      bar('B', 'H'),
      bar('H', 'C', { releases: { start: ['moment'], end: [] } }),
      bar('C', 'E'),
    ],
    cases: dead([
      down('A-B', 8),
      down('B-H', 8),
      down('H-C', 8),
      { kind: 'point', member: 'C-E', at: 1.5, direction: 'y', value: -13 },
    ]),
  }),
  turnedRoller: form({
    units: 'SI',
    joints: [joint('A', 0, 0, 'fixed'), joint('B', 5, 2), joint('C', 9, 2, 'roller', 30)],
    members: [bar('A', 'B'), bar('B', 'C')],
    cases: dead([down('A-B', 5), down('B-C', 5)]),
  }),
  /** Determinate, its bases not level: two equations of moments give the reactions at A only together. */
  threeHinges: form({
    units: 'SI',
    joints: [
      joint('A', 0, 0, 'pinned'),
      joint('B', 0, 4),
      joint('C', 3.7, 5),
      joint('D', 8, 5),
      joint('E', 8, -1.3, 'pinned'),
    ],
    members: [
      bar('A', 'B'),
      bar('B', 'C'),
      bar('C', 'D', { releases: { start: ['moment'], end: [] } }),
      bar('D', 'E'),
    ],
    cases: dead([
      down('B-C', 7),
      { kind: 'joint', joint: 'B', x: 11 },
      { kind: 'point', member: 'D-E', at: 2.2, direction: 'x', value: -6 },
    ]),
  }),
  /** A closed cell on two supports, opened by three hinges of the engineer's choice: pairs of equations in every state. */
  closedCell: form({
    units: 'US',
    joints: [
      joint('A', 0, 0, 'pinned'),
      joint('B', 0.5, 12),
      joint('C', 16, 15),
      joint('D', 16, 1.5, 'roller'),
    ],
    members: [bar('A', 'B'), bar('B', 'C'), bar('C', 'D'), bar('A', 'D')],
    cases: dead([down('B-C', 1.2), { kind: 'joint', joint: 'B', x: 4 }]),
    redundants: [
      { kind: 'moment', member: 'A-D', end: 'start' },
      { kind: 'moment', member: 'A-D', end: 'end' },
      { kind: 'moment', member: 'A-B', end: 'end' },
    ],
  }),
  noValueOfEI0: form({
    units: 'US',
    basis: { kind: 'relative' },
    ...spans(3),
    cases: dead([down('1-2', 1.2), down('2-3', 1.2)]),
    displacements: [{ member: '1-2', at: 2.5, direction: 'y' }],
  }),
  longNames: form({
    units: 'SI',
    joints: [
      joint('P1', 0, 0, 'fixed'),
      joint('P2', 0, 3.5),
      joint('P3', 6, 3.5),
      joint('P4', 6, 0, 'fixed'),
    ],
    members: [bar('P1', 'P2'), bar('P2', 'P3'), bar('P3', 'P4')],
    cases: dead([down('P2-P3', 10)]),
  }),
  manySpans: form({
    units: 'SI',
    ...spans(20),
    cases: dead(Array.from({ length: 20 }, (_, i) => down(`${i + 1}-${i + 2}`, 8 + i))),
  }),
  loadThatIsACouple: form({ units: 'SI', ...spans(2), cases: dead([down('1-2', 6, -6)]) }),
  loadless: form({ units: 'SI', ...spans(2), cases: [] }),
  emptyCase: form({ units: 'SI', ...spans(2), cases: dead([]) }),
} satisfies Record<string, Analysis>;
