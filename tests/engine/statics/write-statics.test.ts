import { expect, test } from 'vitest';
import type { Solution } from '@/lib/engine/solution';
import { solve } from '@/lib/engine/solve';
import type { StaticsLine } from '@/lib/engine/statics/statics-line';
import type { AnalysisInput } from '@/lib/model/analysis';
import { quantityKey } from '@/lib/model/quantity';
import { joints, members, structure } from './build-structure';

type Loads = AnalysisInput['cases'][number]['loads'];
const cases = (loads: Loads): AnalysisInput['cases'] => [{ id: 'P', title: 'loads', nature: 'other', loads }];
const down = (member: string, w: number): Loads[number] => ({
  kind: 'distributed',
  member,
  direction: 'y',
  w1: -w,
  w2: -w,
});

function solved(input: AnalysisInput): Solution {
  const result = solve(input);
  if (!result.ok) throw new Error(result.refusal.message);
  return result.value;
}

const simple = structure(
  joints('A 0 0 pin', 'B 6 0 roller', 'C 8 0'),
  members('AB', 'BC'),
  cases([down('AB', 10), { kind: 'point', member: 'BC', at: 2, direction: 'y', value: -12 }]),
);

test('finds the reactions of a simple beam by moments, then by the sum of forces, and checks about a joint left over', () => {
  const lines = solved(simple).primary.loaded.P?.lines ?? [];
  const equations = lines.filter(
    (l): l is Extract<StaticsLine, { kind: 'equation' }> => l.kind === 'equation',
  );
  const found = Object.fromEntries(
    equations.map((l) => [l.unknown.kind === 'quantity' ? quantityKey(l.unknown.quantity) : '', l]),
  );
  // ΣM about A: 6 R_B = 60 × 3 + 12 × 8.
  expect(found['reaction:B:y']).toMatchObject({ value: 46, sum: { kind: 'moment', joint: 'A' } });
  expect(found['reaction:A:y']?.value).toBeCloseTo(26, 12);
  expect(found['reaction:A:x']).toMatchObject({ value: 0, sum: { kind: 'force', x: 1, y: 0 } });
  const check = lines.at(-1);
  expect(check?.kind).toBe('check');
  expect(check?.kind === 'check' ? Math.abs(check.residual) : 1).toBeLessThan(1e-11);
});

const gerber = structure(
  joints('A 0 0 fixed', 'B 4 0', 'C 6 0 roller', 'D 10 0 roller', 'E 12 0'),
  members('AB', 'BC moment@start', 'CD', 'DE'),
  cases([down('AB', 4), down('CD', 7)]),
);

const portal = structure(
  joints('1 0 0 pin', '2 0 4', '3 6 5', '4 6 -1 pin'),
  members('12', '23', '34'),
  cases([down('23', 8), { kind: 'joint', joint: '2', x: 9 }]),
);

const fixedPortal = structure(
  joints('1 0 0 fixed', '2 0 4', '3 6 4', '4 6 0 fixed'),
  members('12', '23', '34'),
  cases([down('23', 8), { kind: 'joint', joint: '2', x: 9 }]),
);

const threeHinged = structure(
  joints('1 0 0 pin', '2 0 4', '3 5 6', '4 9 3', '5 9 1 pin'),
  members('12', '23 moment@end', '34', '45'),
  cases([down('23', 8), { kind: 'point', member: '45', at: 1, direction: 'x', value: -6 }]),
);

const tied = structure(
  joints('1 0 0 pin', '2 0 4', '3 6 4', '4 6 0 roller'),
  members('12', '23', '34', '14 moment@start moment@end').map((m) => (m.id === '14' ? { ...m, EA: 500 } : m)),
  cases([down('23', 8)]),
);

const continuous = structure(
  joints('A 0 0 pin', 'B 5 0 roller', 'C 11 0 roller 20', 'D 15 0 roller'),
  members('AB', 'BC', 'CD'),
  cases([down('AB', 8), { kind: 'couple', member: 'BC', at: 2, value: 7 }]),
);

const structures: [string, AnalysisInput][] = [
  ['a simple beam', simple],
  ['a beam with a hinge', gerber],
  ['a portal of unequal columns', portal],
  ['a fixed portal', fixedPortal],
  ['a three-hinged frame', threeHinged],
  ['a tied portal', tied],
  ['a continuous beam with a sloping roller', continuous],
];

const sumOf = (terms: readonly { coefficient: number; value: number }[]) => {
  const parts = terms.map((t) => t.coefficient * t.value);
  const size = Math.max(...parts.map(Math.abs), 0);
  return size === 0 ? 0 : parts.reduce((a, b) => a + b, 0) / size;
};

test.each(structures)(
  'every line of %s adds up to nothing and gives the force of the solution',
  (_, input) => {
    const solution = solved(input);
    const states = [...Object.values(solution.primary.loaded), ...solution.primary.units];
    for (const state of states) {
      expect(state.lines.length).toBeGreaterThan(0);
      const values = new Map(state.reactions.map((r) => [quantityKey(r.quantity), r.value]));
      const size = Math.max(...[...values.values()].map(Math.abs), 1);
      for (const line of state.lines) {
        const equations = line.kind === 'simultaneous' ? line.equations : [line];
        for (const e of equations) expect(Math.abs(sumOf(e.terms))).toBeLessThan(1e-12);
        const unknowns =
          line.kind === 'simultaneous'
            ? line.unknowns
            : line.kind === 'equation'
              ? [{ of: line.unknown, value: line.value }]
              : [];
        for (const { of, value } of unknowns) {
          if (of.kind !== 'quantity') continue;
          expect(Math.abs(value - (values.get(quantityKey(of.quantity)) as number))).toBeLessThan(
            1e-11 * size,
          );
        }
      }
      const named = new Set(
        state.lines
          .flatMap((l) =>
            l.kind === 'simultaneous'
              ? l.unknowns.map((u) => u.of)
              : l.kind === 'equation'
                ? [l.unknown]
                : [],
          )
          .flatMap((of) => (of.kind === 'quantity' ? [quantityKey(of.quantity)] : [])),
      );
      const released = new Set(solution.redundants.map(quantityKey));
      for (const key of values.keys()) if (!released.has(key)) expect(named).toContain(key);
    }
  },
);

test('sets two equations together only where no equation has one unknown', () => {
  const kinds = (input: AnalysisInput) => (solved(input).primary.loaded.P?.lines ?? []).map((l) => l.kind);
  expect(kinds(threeHinged)).toContain('simultaneous');
  for (const input of [simple, gerber, portal, continuous])
    expect(kinds(input)).not.toContain('simultaneous');
});

test('leaves zeros out of the unit states of a long beam', () => {
  const n = 12;
  const long = structure(
    joints(...Array.from({ length: n + 1 }, (_, i) => `${i} ${5 * i} 0 ${i === 0 ? 'pin' : 'roller'}`)),
    members(...Array.from({ length: n }, (_, i) => `${i}-${i + 1}`)),
    cases([down('0-1', 5)]),
  );
  const [, second] = solved(long).primary.units;
  expect(second?.lines.length).toBeLessThan(12);
  for (const l of second?.lines ?? []) if (l.kind === 'equation') expect(l.terms.length).toBeGreaterThan(1);
});
