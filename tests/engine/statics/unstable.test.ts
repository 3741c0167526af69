import { expect, test } from 'vitest';
import { solve } from '@/lib/engine/solve';
import { joints, members, structure } from './build-structure';

/** Each structure with what it is refused for: code, words that must stand in the sentence, and where it moves. */
const unstable: [string, Parameters<typeof structure>, { code: string; says: RegExp[]; moves?: string }][] = [
  [
    'a beam on three parallel rollers',
    [joints('A 0 0 roller', 'B 5 0 roller', 'C 9 0 roller'), members('AB', 'BC')],
    { code: 'parallel', says: [/all vertical/, /sliding sideways/], moves: 'A' },
  ],
  [
    'a beam on four rollers, though it counts as indeterminate',
    [joints('A 0 0 roller', 'B 5 0 roller', 'C 9 0 roller', 'D 12 0 roller'), members('AB', 'BC', 'CD')],
    { code: 'parallel', says: [/all vertical/], moves: 'D' },
  ],
  [
    'a frame whose supports all push sideways',
    [joints('A 0 0 wall', 'B 0 3', 'C 4 3', 'D 4 1 wall'), members('AB', 'BC', 'CD')],
    { code: 'parallel', says: [/all horizontal/, /up and down/], moves: 'B' },
  ],
  [
    'rollers on parallel slopes',
    [joints('A 0 0 roller 30', 'B 4 0 roller 30', 'C 8 0 roller 30'), members('AB', 'BC')],
    { code: 'parallel', says: [/all parallel/, /at a slope/], moves: 'A' },
  ],
  [
    'a guided beam end beside a roller',
    [joints('A 0 0 guided', 'B 6 0 roller'), members('AB')],
    { code: 'parallel', says: [/sliding sideways/], moves: 'B' },
  ],
  [
    'a pin and a roller whose line passes through the pin',
    [joints('A 0 0 pin', 'B 6 0 roller 90'), members('AB')],
    { code: 'concurrent', says: [/RAx, RAy and RBy/, /rotation about A/], moves: 'B' },
  ],
  [
    'three rollers whose lines meet in one point',
    [joints('A 0 0 roller -45', 'B 4 0 roller', 'C 8 0 roller 45'), members('AB', 'BC')],
    { code: 'concurrent', says: [/all pass through the point \(4, 4\)/], moves: 'A' },
  ],
  [
    'a frame on two walls and a roller that meet at its corner',
    [joints('A 0 0 roller', 'B 0 3 wall', 'C 4 3'), members('AB', 'BC')],
    { code: 'concurrent', says: [/rotation about B/], moves: 'C' },
  ],
  [
    'a beam on one pin',
    [joints('A 0 0 pin', 'B 6 0'), members('AB')],
    { code: 'concurrent', says: [/rotation about A/], moves: 'B' },
  ],
  [
    'a beam on one roller',
    [joints('A 0 0 roller', 'B 6 0'), members('AB')],
    { code: 'parallel', says: [/nothing stops/] },
  ],
  [
    'a beam that only a clamp keeps from turning',
    [joints('A 0 0 clamp', 'B 6 0'), members('AB')],
    { code: 'parallel', says: [/nothing stops sliding/] },
  ],
  [
    'a span with two hinges between pins',
    [joints('A 0 0 pin', 'B 3 0', 'C 6 0', 'D 9 0 pin'), members('AB', 'BC moment@start moment@end', 'CD')],
    { code: 'mechanism', says: [/drops/], moves: 'B' },
  ],
  [
    'three hinges in one span',
    [joints('A 0 0 fixed', 'B 3 0', 'C 6 0 fixed'), members('AB moment@start moment@end', 'BC moment@end')],
    { code: 'mechanism', says: [/B drops: member AB turns about A, member BC turns about C/], moves: 'B' },
  ],
  [
    'two hinges in the end span of a beam that is fixed at the other end',
    [
      joints('A 0 0 pin', 'B 2 0', 'C 4 0', 'D 6 0 roller', 'E 10 0 fixed'),
      members('AB', 'BC moment@start', 'CD moment@start', 'DE'),
    ],
    { code: 'mechanism', says: [/AB/, /BC/], moves: 'B' },
  ],
  [
    'an overhang behind a hinge',
    [joints('A 0 0 fixed', 'B 4 0 roller', 'C 6 0'), members('AB', 'BC moment@start')],
    { code: 'mechanism', says: [/Member BC turns about/, /B/], moves: 'C' },
  ],
  [
    'a portal with hinges at all four joints',
    [joints('A 0 0 pin', 'B 0 3', 'C 4 3', 'D 4 0 pin'), members('AB moment@end', 'BC', 'CD moment@start')],
    { code: 'sway', says: [/Nothing stops sway/, /BC slides sideways/, /turns about A/], moves: 'C' },
  ],
  [
    'a storey of hinged columns in a frame that counts as indeterminate',
    [
      joints('A 0 0 fixed', 'B 0 3', 'C 4 3', 'D 4 0 fixed', 'E 0 6', 'F 4 6'),
      members('AB', 'BC', 'CD', 'BE moment@start moment@end', 'EF', 'CF moment@start moment@end'),
    ],
    { code: 'sway', says: [/EF slides sideways/], moves: 'E' },
  ],
  [
    'a roof on rocking columns',
    [
      joints('A 0 0 pin', 'B 0 3', 'C 4 3', 'D 8 3', 'E 8 0 pin', 'F 4 0 pin'),
      members('AB moment@end', 'BC', 'CD', 'DE moment@start', 'FC moment@end'),
    ],
    { code: 'sway', says: [/slides sideways/], moves: 'D' },
  ],
  [
    'a square of bars without a diagonal',
    [
      joints('A 0 0 pin', 'B 3 0 roller', 'C 3 3', 'D 0 3'),
      members(
        'AB moment@start moment@end',
        'BC moment@start moment@end',
        'CD moment@start moment@end',
        'DA moment@start moment@end',
      ),
    ],
    { code: 'sway', says: [/CD slides sideways/], moves: 'C' },
  ],
  [
    'a truss with a panel braced twice and another not at all',
    [
      joints('A 0 0 pin', 'B 3 0', 'C 6 0 roller', 'D 6 3', 'E 3 3', 'F 0 3'),
      members(
        ...['AB', 'BC', 'CD', 'DE', 'EF', 'FA', 'BE', 'AE', 'BF'].map((m) => `${m} moment@start moment@end`),
      ),
    ],
    { code: 'mechanism', says: [/DE turns about the point \(6, 6\)/, /turns about C/], moves: 'D' },
  ],
  [
    'a three-hinged frame whose hinges stand in a line',
    [
      joints('A 0 0 pin', 'B 2 2', 'C 4 4 pin', 'D 0 4', 'E 4 0'),
      members('AD', 'DB', 'BE moment@start', 'EC'),
    ],
    { code: 'mechanism', says: [/turns about A/, /turns about C/], moves: 'B' },
  ],
  [
    'a flat toggle of two bars',
    [joints('A 0 0 pin', 'B 3 0', 'C 6 0 pin'), members('AB moment@end', 'BC')],
    { code: 'mechanism', says: [/B drops/], moves: 'B' },
  ],
  [
    'a piece that is not connected and stands on one pin',
    [joints('A 0 0 fixed', 'B 4 0', 'C 6 0 pin', 'D 9 0'), members('AB', 'CD')],
    { code: 'not-connected', says: [/Member CD is not connected/, /turns about C/], moves: 'D' },
  ],
  [
    'a piece that is not connected and not supported at all',
    [joints('A 0 0 fixed', 'B 4 0', 'C 6 0', 'D 9 0'), members('AB', 'CD')],
    { code: 'not-connected', says: [/Member CD is not connected/] },
  ],
  [
    'a member that slides at a release across itself',
    [joints('A 0 0 fixed', 'B 3 0', 'C 6 0'), members('AB', 'BC shear@start')],
    { code: 'slides', says: [/BC slides up and down/], moves: 'C' },
  ],
  [
    'a member that slides along itself',
    [joints('A 0 0 fixed', 'B 3 0', 'C 6 0'), members('AB', 'BC axial@start')],
    { code: 'slides', says: [/BC slides sideways/], moves: 'C' },
  ],
  [
    'a beam with a sliding joint between a pin and a fixed end',
    [joints('A 0 0 pin', 'B 3 0', 'C 6 0 roller'), members('AB shear@end', 'BC')],
    { code: 'mechanism', says: [/B drops/, /AB turns about A/], moves: 'B' },
  ],
  [
    'a portal hinged at three joints with a roller under a column',
    [joints('A 0 0 pin', 'B 0 3', 'C 4 3', 'D 4 0 roller'), members('AB moment@end', 'BC', 'CD')],
    { code: 'sway', says: [/AB turns about A/, /BC and CD slides sideways/], moves: 'D' },
  ],
  [
    'a ring that a hinge at every corner folds, on a firm base',
    [
      joints('A 0 0 pin', 'B 4 0 roller', 'C 5 3', 'D 1 3'),
      members('AB', 'BC moment@start', 'CD moment@start', 'DA moment@start moment@end'),
    ],
    { code: 'sway', says: [/CD slides/], moves: 'C' },
  ],
  [
    'a strut that stands on a hinge under a beam end',
    [joints('A 0 3 fixed', 'B 4 3', 'C 4 0'), members('AB', 'BC moment@start')],
    { code: 'mechanism', says: [/BC turns about the hinge at B/], moves: 'C' },
  ],
  [
    'a bar between two walls that lets it fall',
    [joints('A 0 0 wall', 'B 5 2 wall'), members('AB')],
    { code: 'parallel', says: [/all horizontal/], moves: 'A' },
  ],
  [
    'a beam hung from two rods that are parallel',
    [joints('A 0 4 pin', 'B 4 4 pin', 'C 0 0', 'D 4 0'), members('AC moment@end', 'CD', 'DB moment@start')],
    { code: 'sway', says: [/CD slides sideways/], moves: 'C' },
  ],
];

test.each(unstable)('refuses %s', (_, parts, expected) => {
  const result = solve(structure(...parts));
  if (result.ok) throw new Error('it was solved');
  const { code, message, mechanism } = result.refusal;
  expect(code).toBe(`unstable-${expected.code}`);
  for (const words of expected.says) expect(message).toMatch(words);
  if (expected.moves) expect(Object.keys(mechanism?.joints ?? {})).toContain(expected.moves);
  expect(mechanism?.pieces.length).toBeGreaterThan(0);
});

test('counts at least thirty of them', () => {
  expect(unstable.length).toBeGreaterThanOrEqual(30);
});

const powers = [1e-6, 1e-3, 1, 1e3, 1e6];

test.each(powers)('gives the same verdict when lengths are %s times theirs', (scale) => {
  for (const [name, [joint, member], expected] of unstable) {
    const placed = joint.map((j) => ({ ...j, x: j.x * scale, y: j.y * scale }));
    const result = solve(structure(placed, member));
    expect(result.ok ? name : result.refusal.code).toBe(`unstable-${expected.code}`);
  }
});

test.each(powers)('gives the same verdict when stiffnesses are %s times theirs', (scale) => {
  for (const [name, [joint, member], expected] of unstable) {
    const result = solve(
      structure(
        joint,
        member.map((m) => ({ ...m, EI: m.EI * scale })),
      ),
    );
    expect(result.ok ? name : result.refusal.code).toBe(`unstable-${expected.code}`);
  }
});

test('solves what is nearly unstable but stands', () => {
  const toggle = (rise: number) =>
    structure(joints('A 0 0 pin', `B 3 ${rise}`, 'C 6 0 pin'), members('AB moment@end', 'BC'), [
      {
        id: 'P',
        title: 'a load on the crown',
        nature: 'other',
        loads: [{ kind: 'joint', joint: 'B', y: -1 }],
      },
    ]);
  for (const rise of [1, 1e-2, 1e-4, 1e-6]) {
    const result = solve(toggle(rise));
    if (!result.ok) throw new Error(result.refusal.message);
    const thrust = result.value.cases.P?.reactions.find(
      (r) => r.quantity.kind === 'reaction' && r.quantity.component === 'x',
    );
    // Each bar carries half the load at its slope: H = P/2 × 3/rise.
    expect(((thrust?.value as number) * rise) / 1.5).toBeCloseTo(1, 6);
  }
});
