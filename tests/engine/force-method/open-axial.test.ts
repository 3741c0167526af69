import { expect, test } from 'vitest';
import { solve } from '@/lib/engine/solve';
import type { AnalysisInput } from '@/lib/model/analysis';
import { joints, members, structure } from '../statics/build-structure';

const loaded = (loads: AnalysisInput['cases'][number]['loads']): AnalysisInput['cases'] => [
  { id: 'P', title: 'a load', nature: 'other', loads },
];
const down = { kind: 'distributed', member: 'AB', direction: 'y', w1: -12, w2: -12 } as const;
const beam = (loads: AnalysisInput['cases'][number]['loads'], EA?: number) =>
  structure(
    joints('A 0 0 fixed', 'B 6 0 fixed'),
    members('AB').map((m) => ({ ...m, EA, alpha: 1e-5 })),
    loaded(loads),
  );

test('counts the force along a beam held lengthwise, and takes it as zero', () => {
  const result = solve(beam([down]));
  if (!result.ok) throw new Error(result.refusal.message);
  const { determinacy, redundants, cases, fixed } = result.value;
  expect(determinacy).toMatchObject({ degree: 3, bendingDegree: 2, openAxial: ['AB'] });
  expect(redundants).toHaveLength(2);
  // w l²/12 (fixed-end moment, handbook value from memory).
  expect(cases.P?.members.AB?.M[0]?.c[0]).toBeCloseTo(-36, 10);
  expect(cases.P?.members.AB?.N.every((p) => p.c.every((c) => c === 0))).toBe(true);
  expect(fixed.some((f) => f.quantity.kind === 'axial')).toBe(false);
});

test('finds the same forces when the beam stretches, and then the axial force is a redundant', () => {
  const result = solve(beam([down], 1e5));
  if (!result.ok) throw new Error(result.refusal.message);
  expect(result.value.determinacy).toMatchObject({ degree: 3, bendingDegree: 3, openAxial: [] });
  expect(result.value.cases.P?.members.AB?.M[0]?.c[0]).toBeCloseTo(-36, 10);
});

test.each([
  ['a load along it', [{ kind: 'point', member: 'AB', at: 2, direction: 'x', value: 10 }]],
  ['warmth', [{ kind: 'temperature', member: 'AB', rise: 20 }]],
  ['a lack of fit', [{ kind: 'misfit', member: 'AB', value: 0.002 }]],
  ['a support that moves along it', [{ kind: 'settlement', joint: 'B', component: 'x', value: 0.001 }]],
] as const)('asks for EA when the beam bears %s', (_, loads) => {
  const result = solve(beam(loads.map((l) => ({ ...l }))));
  expect(result.ok ? 'solved' : result.refusal.code).toBe('needs-EA');
  expect(result.ok ? '' : result.refusal.message).toMatch(/AB lengthwise.*State EA/);
  expect(
    solve(
      beam(
        loads.map((l) => ({ ...l })),
        1e5,
      ),
    ).ok,
  ).toBe(true);
});

test('solves warmth that moves nothing against a support', () => {
  const free = structure(
    joints('A 0 0 pin', 'B 6 0 roller', 'C 12 0 roller'),
    members('AB', 'BC').map((m) => ({ ...m, alpha: 1e-5 })),
    loaded([{ kind: 'temperature', member: 'AB', rise: 20 }]),
  );
  const result = solve(free);
  if (!result.ok) throw new Error(result.refusal.message);
  expect(result.value.cases.P?.joints.C?.x).toBeCloseTo(1e-5 * 20 * 6, 15);
});

test('a tie between two held bases carries nothing, whatever its stiffness', () => {
  const tied = (EA?: number) =>
    structure(
      joints('A 0 0 pin', 'B 0 3', 'C 5 3', 'D 5 0 pin'),
      members('AB', 'BC', 'CD', 'AD moment@start moment@end').map((m) => (m.id === 'AD' ? { ...m, EA } : m)),
      loaded([{ ...down, member: 'BC' }]),
    );
  const [open, stretching] = [solve(tied()), solve(tied(1e4))];
  if (!open.ok || !stretching.ok) throw new Error('refused');
  expect(open.value.determinacy.openAxial).toEqual(['AD']);
  expect(open.value.determinacy.bendingDegree).toBe(1);
  const thrust = (s: typeof open.value) =>
    s.cases.P?.reactions.find((r) => r.quantity.kind === 'reaction')?.value;
  expect(thrust(open.value)).toBeCloseTo(thrust(stretching.value) as number, 10);
});

test('asks for EA where bars that do not stretch share a push among them', () => {
  const braced = structure(
    joints('A 0 0 pin', 'B 0 3', 'C 4 3', 'D 4 0 pin'),
    members(...['AB', 'BC', 'CD', 'AC', 'BD'].map((m) => `${m} moment@start moment@end`)),
    loaded([{ kind: 'joint', joint: 'B', x: 10 }]),
  );
  const result = solve(braced);
  expect(result.ok ? 'solved' : result.refusal.code).toBe('needs-EA');
});
