import fc from 'fast-check';
import { expect, test } from 'vitest';
import { solve } from '@/lib/engine/solve';
import type { AnalysisInput } from '@/lib/model/analysis';
import { joints, members, structure } from './statics/build-structure';

const sound: AnalysisInput = {
  ...structure(
    joints('A 0 0 fixed', 'B 6 0 roller', 'C 10 0 roller'),
    members('AB', 'BC').map((m) => ({ ...m, alpha: 1e-5, depth: 0.3, weight: 1 })),
    [
      {
        id: 'D',
        title: 'own weight',
        nature: 'dead',
        loads: [
          { kind: 'self-weight' },
          { kind: 'distributed', member: 'AB', direction: 'y', w1: -5, w2: -5 },
          { kind: 'point', member: 'BC', at: 2, direction: 'y', value: -8 },
        ],
      },
    ],
  ),
  combinations: [{ id: '1', purpose: 'strength', factors: { D: 1.4 } }],
  displacements: [{ member: 'AB', at: 3, direction: 'y' }],
};

type Change = (a: AnalysisInput) => AnalysisInput;
const withLoad =
  (load: AnalysisInput['cases'][number]['loads'][number]): Change =>
  (a) => ({ ...a, cases: a.cases.map((c) => ({ ...c, loads: [load] })) });
const withMember =
  (change: Partial<AnalysisInput['members'][number]>): Change =>
  (a) => ({ ...a, members: a.members.map((m, i) => (i === 0 ? { ...m, ...change } : m)) });

const faults: [string, string, string, Change][] = [
  [
    'two joints of one name',
    'duplicate-joint',
    'joints.3',
    (a) => ({ ...a, joints: [...a.joints, { id: 'A', x: 1, y: 1 }] }),
  ],
  [
    'two joints at one place',
    'joints-coincide',
    'joints.3',
    (a) => ({ ...a, joints: [...a.joints, { id: 'E', x: 6, y: 1e-12 }] }),
  ],
  [
    'no supports',
    'no-supports',
    'joints',
    (a) => ({ ...a, joints: a.joints.map(({ id, x, y }) => ({ id, x, y })) }),
  ],
  [
    'a joint without a member',
    'loose-joint',
    'joints.3',
    (a) => ({ ...a, joints: [...a.joints, { id: 'E', x: 20, y: 1 }] }),
  ],
  [
    'two members of one name',
    'duplicate-member',
    'members.1',
    (a) => ({ ...a, members: a.members.map((m) => ({ ...m, id: 'AB' })) }),
  ],
  ['a member to nowhere', 'unknown-joint', 'members.0', withMember({ end: 'Z' })],
  ['a member without length', 'zero-length', 'members.0', withMember({ end: 'A' })],
  [
    'steps that fall',
    'steps-out-of-order',
    'members.0',
    withMember({
      steps: [
        { from: 3, EI: 1 },
        { from: 2, EI: 1 },
      ],
    }),
  ],
  ['a step off the member', 'steps-out-of-order', 'members.0', withMember({ steps: [{ from: 6, EI: 1 }] })],
  [
    'a member that slides at both ends',
    'released-twice',
    'members.0',
    withMember({ releases: { start: ['axial'], end: ['axial'] } }),
  ],
  [
    'a member that nothing keeps from turning',
    'released-twice',
    'members.0',
    withMember({ releases: { start: ['moment', 'shear'], end: ['moment'] } }),
  ],
  [
    'a load on no member',
    'unknown-member',
    'cases.0.loads.0',
    withLoad({ kind: 'point', member: 'Z', at: 0, direction: 'y', value: 1 }),
  ],
  ['a load on no joint', 'unknown-joint', 'cases.0.loads.0', withLoad({ kind: 'joint', joint: 'Z', x: 1 })],
  [
    'a point load off its member',
    'load-off-member',
    'cases.0.loads.0',
    withLoad({ kind: 'point', member: 'AB', at: 6.01, direction: 'y', value: 1 }),
  ],
  [
    'a load that ends before it begins',
    'load-off-member',
    'cases.0.loads.0',
    withLoad({ kind: 'distributed', member: 'AB', from: 3, to: 2, direction: 'y', w1: 1, w2: 1 }),
  ],
  [
    'a support that moves where none is',
    'settlement-of-free',
    'cases.0.loads.0',
    withLoad({ kind: 'settlement', joint: 'B', component: 'x', value: 1 }),
  ],
  [
    'warmth without a coefficient',
    'no-alpha',
    'cases.0.loads.0',
    (a) => withLoad({ kind: 'temperature', member: 'AB', rise: 5 })(withMember({ alpha: undefined })(a)),
  ],
  [
    'a gradient without a depth',
    'no-depth',
    'cases.0.loads.0',
    (a) =>
      withLoad({ kind: 'temperature', member: 'AB', difference: 5 })(withMember({ depth: undefined })(a)),
  ],
  [
    'own weight of what weighs nothing',
    'no-weight',
    'cases.0.loads.0',
    (a) => ({ ...a, members: a.members.map(({ weight, ...m }) => m) }),
  ],
  ['two cases of one name', 'duplicate-case', 'cases.1', (a) => ({ ...a, cases: [...a.cases, ...a.cases] })],
  [
    'a combination of unknown cases',
    'unknown-case',
    'combinations.0',
    (a) => ({ ...a, combinations: [{ id: '1', purpose: 'strength', factors: { L: 1 } }] }),
  ],
  [
    'two combinations of one name',
    'duplicate-combination',
    'combinations.1',
    (a) => ({ ...a, combinations: [...(a.combinations ?? []), ...(a.combinations ?? [])] }),
  ],
  [
    'a deflection off the member',
    'ask-off-member',
    'displacements.0',
    (a) => ({ ...a, displacements: [{ member: 'AB', at: 7, direction: 'y' }] }),
  ],
  [
    'a support movement while EI0 has no value',
    'needs-EI0',
    'basis.EI0',
    (a) =>
      withLoad({ kind: 'settlement', joint: 'B', component: 'y', value: 1 })({
        ...a,
        basis: { kind: 'relative' },
      }),
  ],
  [
    'EA while EI0 has no value',
    'needs-EI0',
    'basis.EI0',
    (a) => withMember({ EA: 5 })({ ...a, basis: { kind: 'relative' } }),
  ],
  [
    'a couple on a hinge',
    'couple-on-hinge',
    'cases.0.loads.0',
    (a) =>
      withLoad({ kind: 'joint', joint: 'B', couple: 4 })({
        ...a,
        members: members('AB moment@end', 'BC moment@start'),
      }),
  ],
  ['a number too large to reckon with', 'out-of-range', 'members.0.EI', withMember({ EI: 1e200 })],
  ['another form', 'form', 'form', (a) => ({ ...a, form: 'other/1' as never })],
  ['a stiffness that is not positive', 'form', 'members.0.EI', withMember({ EI: 0 })],
];

test('solves the sound form that all of these depart from', () => {
  expect(solve(sound).ok).toBe(true);
});

test.each(faults)('refuses %s, and says where', (_, code, path, change) => {
  const result = solve(change(sound));
  if (result.ok) throw new Error('it was solved');
  expect(result.refusal.code).toBe(code);
  expect(result.refusal.place.path).toBe(path);
  expect(result.refusal.message).toMatch(/^[A-Z].*\.$|^[a-z].*: .*\.$/);
});

const large = (n: number) =>
  structure(
    joints(...Array.from({ length: n + 1 }, (_, i) => `${i} ${i} 0 ${i === 0 ? 'pin' : 'roller'}`)),
    members(...Array.from({ length: n }, (_, i) => `${i}-${i + 1}`)),
  );

test.each([
  ['too many members', large(3000), 'too-large'],
  [
    'too many joints, given as nonsense',
    { ...sound, joints: Array.from({ length: 1e6 }, () => null) },
    'too-large',
  ],
  [
    'too many loads',
    { ...sound, cases: sound.cases.map((c) => ({ ...c, loads: Array.from({ length: 1e5 }, () => ({})) })) },
    'too-large',
  ],
  [
    'a mechanism of 1,900 members',
    {
      ...large(1900),
      joints: large(1900).joints.map((j) => ({ ...j, support: { x: 'free', y: 'held', turn: 'free' } })),
    },
    'unstable-parallel',
  ],
])('refuses %s', (_, input, code) => {
  const result = solve(input);
  expect(result.ok ? 'solved' : result.refusal.code).toBe(code);
});

/** Whether any number in an answer is not finite. */
function notFinite(value: unknown, path = ''): string | undefined {
  if (typeof value === 'number') return Number.isFinite(value) ? undefined : path;
  if (typeof value !== 'object' || value === null) return undefined;
  for (const [key, inner] of Object.entries(value)) {
    const found = notFinite(inner, `${path}.${key}`);
    if (found) return found;
  }
  return undefined;
}

const json = fc.jsonValue();
const awkward = fc.oneof(
  json,
  fc.constantFrom(0, -1, 1e-300, 1e300, -0, 1e39, 1e-39, 5e-324, '', 'A', 'AB', null, [], {}),
  fc.double({ noNaN: true }),
);

/** Puts a value somewhere into a copy of the sound form. */
function damage(target: unknown, steps: readonly number[], value: unknown): unknown {
  if (typeof target !== 'object' || target === null || steps.length === 0) return value;
  const keys = Object.keys(target);
  const key = keys[(steps[0] as number) % Math.max(1, keys.length)];
  if (key === undefined) return value;
  const inner = damage(Reflect.get(target, key), steps.slice(1), value);
  return Array.isArray(target)
    ? target.map((v, i) => (`${i}` === key ? inner : v))
    : { ...target, [key]: inner };
}

test('answers anything at all with a result or a refusal, never with an exception or a number that is none', () => {
  const input = fc.oneof(
    { weight: 1, arbitrary: json },
    {
      weight: 9,
      arbitrary: fc
        .array(fc.tuple(fc.array(fc.nat(20), { minLength: 1, maxLength: 5 }), awkward), {
          minLength: 1,
          maxLength: 3,
        })
        .map((list) => list.reduce<unknown>((a, [steps, value]) => damage(a, steps, value), sound)),
    },
  );
  fc.assert(
    fc.property(input, (value) => {
      const result = solve(value);
      if (result.ok) expect(notFinite(result.value)).toBeUndefined();
      else {
        expect(result.refusal.code).not.toBe('');
        expect(result.refusal.message).not.toBe('');
      }
    }),
    { numRuns: 3000 },
  );
});
