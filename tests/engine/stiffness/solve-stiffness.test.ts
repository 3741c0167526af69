import { expect, test } from 'vitest';
import { type StiffnessCase, solveStiffness } from '@/lib/engine/stiffness/solve-stiffness';
import { type AnalysisInput, analysis } from '@/lib/model/analysis';

const fixed = { x: 'held', y: 'held', turn: 'held' } as const;
const pinned = { x: 'held', y: 'held', turn: 'free' } as const;
const roller = { x: 'free', y: 'held', turn: 'free' } as const;
type Parts = Pick<AnalysisInput, 'joints' | 'members'> & { loads: AnalysisInput['cases'][number]['loads'] };

function run({ joints, members, loads }: Parts): StiffnessCase | undefined {
  const input = {
    form: 'fairhand.analysis/1',
    units: 'SI',
    basis: { kind: 'absolute' },
    joints,
    members,
    cases: [{ id: 'D', title: 'Dead', nature: 'dead', loads }],
  };
  return solveStiffness(analysis.parse(input))?.get('D');
}

function solved(parts: Parts): StiffnessCase {
  const result = run(parts);
  if (!result) throw new Error('the structure was found unstable');
  return result;
}

const propped = (member: object = {}): Pick<Parts, 'joints' | 'members'> => ({
  joints: [
    { id: 'A', x: 0, y: 0, support: fixed },
    { id: 'B', x: 8, y: 0, support: roller },
  ],
  members: [{ id: 'AB', start: 'A', end: 'B', EI: 16_000, ...member }],
});
const uniform = { kind: 'distributed', member: 'AB', direction: 'y', w1: -12, w2: -12 } as const;

/** Prop 3wL/8, fixing moment wL²/8. AISC Manual Table 3-23, from memory. */
test('a propped cantilever carries three eighths of its load at the prop', () => {
  const r = solved({ ...propped(), loads: [uniform] });
  expect(r.reactions.get('B:y')).toBeCloseTo(36, 10);
  expect(r.members[0]?.M0).toBeCloseTo(-96, 10);
  expect(r.members[0]?.M1).toBeCloseTo(0, 12);
});

/** Prop of a Timoshenko cantilever by δ0/f11 with δ0 = wL⁴/8EI + wL²/2GAs, f11 = L³/3EI + L/GAs. */
test('shear flexibility moves force to the wall', () => {
  const r = solved({ ...propped({ GAs: 2_000 }), loads: [uniform] });
  const moved = (12 * 8 ** 4) / (8 * 16_000) + (12 * 64) / 4_000;
  expect(r.reactions.get('B:y')).toBeCloseTo(moved / (8 ** 3 / 48_000 + 8 / 2_000), 10);
});

/** Guided end: fixed beam with a sliding end under uniform load, M = wL²/3 at the wall, wL²/6 at the guide. Roark, from memory. */
test('a shear release at the end makes it a guided end', () => {
  const r = solved({
    joints: [
      { id: 'A', x: 0, y: 0, support: fixed },
      { id: 'B', x: 6, y: 0, support: fixed },
    ],
    members: [{ id: 'AB', start: 'A', end: 'B', EI: 1, releases: { end: ['shear', 'axial'] } }],
    loads: [uniform],
  });
  expect(r.members[0]?.M0).toBeCloseTo((-12 * 36) / 3, 10);
  expect(r.members[0]?.M1).toBeCloseTo((12 * 36) / 6, 10);
  expect(r.reactions.get('B:y')).toBeCloseTo(0, 10);
});

test('a beam held lengthwise at both ends leaves its axial force open and says so', () => {
  const r = solved({
    joints: [
      { id: 'A', x: 0, y: 0, support: pinned },
      { id: 'B', x: 8, y: 0, support: pinned },
    ],
    members: [{ id: 'AB', start: 'A', end: 'B', EI: 1 }],
    loads: [uniform],
  });
  expect([...r.open].sort()).toEqual(['A:x', 'AB', 'B:x']);
  expect(r.reactions.get('A:y')).toBeCloseTo(48, 12);
});

test('warming a bar that neither stretches nor can move has no finite answer', () => {
  const parts = (EA?: number): Parts => ({
    joints: [
      { id: 'A', x: 0, y: 0, support: pinned },
      { id: 'B', x: 8, y: 0, support: pinned },
    ],
    members: [{ id: 'AB', start: 'A', end: 'B', EI: 1, EA, alpha: 12e-6 }],
    loads: [{ kind: 'temperature', member: 'AB', rise: 20 }],
  });
  expect(run(parts())).toBeUndefined();
  expect(solved(parts(1.6e6)).members[0]?.N).toBeCloseTo(-384, 10);
});

test.each([
  ['three parallel rollers', [roller, roller, roller], {}],
  ['a pin and nothing else', [pinned, undefined, undefined], {}],
  ['a hinge too many', [pinned, roller, roller], { end: ['moment' as const] }],
  [
    'a slide and a hinge at one end',
    [fixed, fixed, roller],
    { start: ['moment' as const], end: ['moment' as const, 'shear' as const] },
  ],
])('finds a mechanism: %s', (name, supports, releases) => {
  const joints = supports.map((support, i) => ({ id: `${i}`, x: 5 * i, y: 0, support }));
  const hinged =
    name === 'a hinge too many' ? joints.map((j, i) => (i === 1 ? { ...j, support: undefined } : j)) : joints;
  const members = [
    { id: '01', start: '0', end: '1', EI: 1, releases },
    { id: '12', start: '1', end: '2', EI: 1 },
  ];
  expect(run({ joints: hinged, members, loads: [] })).toBeUndefined();
});

test('a structure that moves freely is told at every scale of force and length', () => {
  for (const force of [1e-6, 1, 1e6]) {
    for (const length of [1e-6, 1, 1e6]) {
      const frame = (foot: typeof fixed | typeof roller) => ({
        joints: [
          { id: 'A', x: 0, y: 0, support: foot },
          { id: 'B', x: 0, y: 4 * length },
          { id: 'C', x: 6 * length, y: 4 * length },
          { id: 'D', x: 6 * length, y: 0, support: roller },
        ],
        members: ['AB', 'BC', 'CD'].map((id) => ({
          id,
          start: id[0] as string,
          end: id[1] as string,
          EI: 20_000 * force * length ** 2,
        })),
        loads: [{ kind: 'joint' as const, joint: 'B', x: force, y: 0, couple: 0 }],
      });
      expect(run(frame(roller))).toBeUndefined();
      expect(solved(frame(fixed)).reactions.get('A:x')).toBeCloseTo(-force, 9 - Math.log10(force));
    }
  }
});

/** Two spans, EI and length as stated: three-moment equation, M = (w1 L1³/I1 + w2 L2³/I2) / (8 (L1/I1 + L2/I2)). */
test('keeps its figures where stiffness and length differ by a million', () => {
  for (const [L1, L2, I1, I2] of [
    [1e-3, 1e3, 1e6, 1],
    [1e-3, 1e3, 1, 1e6],
    [1, 1e3, 1e-3, 1e3],
  ] as const) {
    const r = solved({
      joints: [
        { id: 'A', x: 0, y: 0, support: pinned },
        { id: 'B', x: L1, y: 0, support: roller },
        { id: 'C', x: L1 + L2, y: 0, support: roller },
      ],
      members: [
        { id: 'AB', start: 'A', end: 'B', EI: I1 },
        { id: 'BC', start: 'B', end: 'C', EI: I2 },
      ],
      loads: ['AB', 'BC'].map((member) => ({ ...uniform, member, w1: -1, w2: -1 })),
    });
    const L = L1 + L2 - L1;
    const M = (L1 ** 3 / I1 + L ** 3 / I2) / (8 * (L1 / I1 + L / I2));
    expect(Math.abs((r.members[1]?.M0 as number) / -M - 1)).toBeLessThan(1e-12);
  }
});
