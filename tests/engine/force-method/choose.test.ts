import { expect, test } from 'vitest';
import { choose, chooser } from '@/lib/engine/force-method/choose';
import { listChoices, proposedChoices } from '@/lib/engine/force-method/list-choices';
import { solve } from '@/lib/engine/solve';
import { type AnalysisInput, analysis } from '@/lib/model/analysis';
import type { Quantity } from '@/lib/model/quantity';
import { joints, members, structure } from '../statics/build-structure';

const R = (joint: string, component: 'x' | 'y' | 'turn'): Quantity => ({
  kind: 'reaction',
  joint,
  component,
});
const M = (member: string, end: 'start' | 'end'): Quantity => ({ kind: 'moment', member, end });

const portal = structure(joints('1 0 0 pin', '2 0 4', '3 6 4', '4 6 0 pin'), members('12', '23', '34'));
const beam = structure(
  joints('A 0 0 pin', 'B 6 0 roller', 'C 12 0 roller', 'D 14 0'),
  members('AB', 'BC', 'CD'),
);
const fixedBeam = structure(joints('A 0 0 fixed', 'B 6 0 fixed'), members('AB'));

const ask = (input: AnalysisInput, ...set: Quantity[]) => choose(analysis.parse(input), set);

test('takes the thrust of a portal as its redundant, with condition 1', () => {
  expect(ask(portal, R('4', 'x'))).toEqual({ good: true, condition: 1 });
});

const refused: [string, AnalysisInput, Quantity[], string, RegExp[]][] = [
  [
    'a reaction whose removal leaves the others concurrent',
    portal,
    [R('4', 'y')],
    'fixed',
    [
      /^R4y cannot be the redundant/,
      /R1x, R1y and R4x, all pass through 1/,
      /rotation about 1/,
      /Equilibrium alone gives R4y/,
    ],
  ],
  [
    'a hinge at a pin',
    portal,
    [M('12', 'start')],
    'nothing-released',
    [/A hinge at 1 releases nothing/, /already/],
  ],
  ['a reaction that is not there', portal, [R('4', 'turn')], 'nothing-released', [/fixing moment at 4/]],
  ['a joint that does not exist', portal, [R('9', 'x')], 'nothing-released', [/no joint 9/]],
  ['no release at all', portal, [], 'too-few', [/One more release is needed/, /first degree/]],
  [
    'two releases where one is free',
    portal,
    [R('1', 'x'), R('4', 'x')],
    'too-many',
    [/2 are released, one is free: restore one/, /R1x and R4x cannot be released together/],
  ],
  [
    'the moment of an overhang',
    beam,
    [M('CD', 'start')],
    'fixed',
    [/M at C of CD cannot be the redundant/, /Member CD turns about the hinge at C/],
  ],
  ['the moment at a free end', beam, [M('CD', 'end')], 'nothing-released', [/the end is free to turn/]],
  [
    'a support and the hinge over it',
    structure(joints('A 0 0 fixed', 'B 6 0 roller', 'C 12 0 roller'), members('AB', 'BC')),
    [R('A', 'turn'), M('AB', 'start')],
    'same-force',
    [/are one moment. Release one of them/],
  ],
  [
    'the same moment of two members',
    structure(joints('A 0 0 fixed', 'B 6 0 roller', 'C 12 0 roller'), members('AB', 'BC')),
    [M('AB', 'end'), M('BC', 'start')],
    'same-force',
    [/M at B of AB and M at B of BC are one moment. Release one of them/],
  ],
  [
    'three moments that keep one joint in equilibrium',
    structure(
      joints('A 0 0 fixed', 'B 6 0 roller', 'C 12 0 fixed', 'D 6 4 fixed'),
      members('AB', 'BC', 'BD'),
    ),
    [M('AB', 'end'), M('BC', 'start'), M('BD', 'start'), R('A', 'turn'), R('C', 'turn')],
    'same-force',
    [/keep joint B in equilibrium/],
  ],
  [
    'the same quantity twice',
    structure(joints('A 0 0 fixed', 'B 6 0 roller', 'C 12 0 roller'), members('AB', 'BC')),
    [M('AB', 'end'), M('AB', 'end')],
    'same-force',
    [/twice/],
  ],
  [
    'all that would keep a beam from sliding',
    structure(joints('A 0 0 pin', 'B 6 0 roller', 'C 12 0 roller'), members('AB', 'BC')),
    [R('A', 'x')],
    'fixed',
    [/all vertical: nothing stops sliding sideways/],
  ],
  [
    'an end support and the moment next to it',
    structure(joints('A 0 0 fixed', 'B 6 0 roller', 'C 12 0 roller'), members('AB', 'BC')),
    [R('C', 'y'), M('BC', 'start')],
    'mechanism',
    [/RCy and M at B of BC cannot be released together/, /Member BC turns about/],
  ],
  [
    'a force along a beam that is held lengthwise at both ends',
    fixedBeam,
    [R('B', 'x'), R('B', 'turn')],
    'open-axial',
    [/not determined by bending/, /State EA|state EA/],
  ],
];

test.each(refused)('refuses %s', (_, input, set, code, says) => {
  const choice = ask(input, ...set);
  if (choice.good) throw new Error('it was taken');
  expect(choice.code).toBe(code);
  for (const words of says) expect(choice.message).toMatch(words);
});

test('draws the motion that a bad choice allows', () => {
  const choice = ask(portal, R('4', 'y'));
  if (choice.good) throw new Error('it was taken');
  const [piece] = choice.mechanism?.pieces ?? [];
  expect(piece?.members).toEqual(['12', '23', '34']);
  expect(piece?.centre?.joint).toBe('1');
  // Turning about 1 moves 4 straight up or down.
  expect(choice.mechanism?.joints['4']?.x).toBeCloseTo(0, 12);
});

test('solve refuses a bad choice with the same words', () => {
  const result = solve({ ...portal, redundants: [R('4', 'y')] });
  const choice = ask(portal, R('4', 'y'));
  if (result.ok || choice.good) throw new Error('it was taken');
  expect(result.refusal.message).toBe(choice.message);
  expect(result.refusal.place.path).toBe('redundants');
});

test('lists good sets best first, and each of them solves', () => {
  const sets = listChoices(analysis.parse(portal));
  expect(sets.length).toBeGreaterThanOrEqual(2);
  const two = structure(joints('A 0 0 fixed', 'B 6 0 roller', 'C 12 0 roller'), members('AB', 'BC'));
  const listed = listChoices(analysis.parse(two));
  expect(listed.length).toBeGreaterThan(3);
  listed.forEach((set, i) => {
    expect(set.condition).toBeGreaterThanOrEqual(listed[i - 1]?.condition ?? 1);
    expect(solve({ ...two, redundants: set.quantities }).ok).toBe(true);
  });
});

test('exchanges one redundant at a time where there are too many sets to try', () => {
  const n = 9;
  const long = structure(
    joints(...Array.from({ length: n }, (_, i) => `${i} ${6 * i} 0 ${i === 0 ? 'fixed' : 'roller'}`)),
    members(...Array.from({ length: n - 1 }, (_, i) => `${i}-${i + 1}`)),
  );
  const listed = listChoices(analysis.parse(long));
  const answer = chooser(analysis.parse(long));
  expect(listed.length).toBeGreaterThan(10);
  for (const set of listed) expect(answer(set.quantities).good).toBe(true);
});

test('offers every force that may be a redundant once, the chosen ones first', () => {
  const result = solve(
    structure(joints('A 0 0 fixed', 'B 6 0 roller', 'C 12 0 roller'), members('AB', 'BC')),
  );
  if (!result.ok) throw new Error(result.refusal.message);
  const offered = proposedChoices(result.value);
  expect(offered.slice(0, 2)).toEqual(result.value.redundants);
  const keys = offered.map((q) => JSON.stringify(q));
  expect(new Set(keys).size).toBe(keys.length);
  // M over B stands for both members; RAx is fixed.
  expect(
    offered.filter((q) => q.kind === 'moment' && q.end === (q.member === 'AB' ? 'end' : 'start')),
  ).toHaveLength(1);
  expect(keys.some((k) => k.includes('"x"'))).toBe(false);
});

test('proposes support moments for a continuous beam, so that only neighbours meet in the flexibility matrix', () => {
  const spans = 6;
  const result = solve(
    structure(
      joints(...Array.from({ length: spans + 1 }, (_, i) => `${i} ${5 * i} 0 ${i === 0 ? 'pin' : 'roller'}`)),
      members(...Array.from({ length: spans }, (_, i) => `${i}-${i + 1}`)),
    ),
  );
  if (!result.ok) throw new Error(result.refusal.message);
  expect(result.value.redundants.every((q) => q.kind === 'moment')).toBe(true);
  expect(result.value.redundants).toHaveLength(spans - 1);
  // Three-moment equation (Clapeyron 1857, from memory): 2 (l + l)/6 on the diagonal, l/6 beside it, over EI.
  for (const { i, j, total } of result.value.work.flexibility) {
    expect(Math.abs(i - j)).toBeLessThanOrEqual(1);
    expect(Math.abs(total)).toBeCloseTo(i === j ? 10 / 3 : 5 / 6, 12);
  }
});
