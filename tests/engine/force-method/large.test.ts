import { expect, test } from 'vitest';
import { integralOfProduct } from '@/lib/engine/diagrams/piecewise';
import { chooser } from '@/lib/engine/force-method/choose';
import { proposedChoices } from '@/lib/engine/force-method/list-choices';
import { solve } from '@/lib/engine/solve';
import { type AnalysisInput, analysis } from '@/lib/model/analysis';
import { quantityKey } from '@/lib/model/quantity';
import { joints, members, structure } from '../statics/build-structure';

/** Storeys and bays of 3 m and 6 m on fixed bases, with loaded beams and a push at every floor. */
function grid(storeys: number, bays: number): AnalysisInput {
  const at = (i: number, k: number) => `${i}.${k}`;
  const all = Array.from({ length: (storeys + 1) * (bays + 1) }, (_, n) => [
    Math.floor(n / (bays + 1)),
    n % (bays + 1),
  ]) as [number, number][];
  const beams = all.filter(([i, k]) => i > 0 && k > 0).map(([i, k]) => `${at(i, k - 1)}-${at(i, k)}`);
  return structure(
    joints(...all.map(([i, k]) => `${at(i, k)} ${6 * k} ${3 * i}${i === 0 ? ' fixed' : ''}`)),
    members(...all.filter(([i]) => i > 0).map(([i, k]) => `${at(i - 1, k)}-${at(i, k)}`), ...beams),
    [
      {
        id: 'P',
        title: 'floors and wind',
        nature: 'other',
        loads: [
          ...beams.map(
            (m) => ({ kind: 'distributed', member: m, direction: 'y', w1: -10, w2: -10 }) as const,
          ),
          ...all
            .filter(([i, k]) => i > 0 && k === 0)
            .map(([i, k]) => ({ kind: 'joint', joint: at(i, k), x: 5 }) as const),
        ],
      },
    ],
  );
}

test('solves a tall frame on states around its cells, and holds it to every check', () => {
  const [storeys, bays] = [14, 5];
  const result = solve(grid(storeys, bays));
  if (!result.ok) throw new Error(result.refusal.message);
  const { determinacy, redundants, work, checks, cases } = result.value;
  expect(determinacy.degree).toBe(3 * storeys * bays);
  expect(redundants).toHaveLength(3 * storeys * bays);
  expect(work.flexibility).toEqual([]);
  expect(checks.every((c) => c.holds)).toBe(true);
  expect(new Set(checks.map((c) => c.kind))).toEqual(
    new Set(['equilibrium', 'reciprocity', 'gap', 'second-way']),
  );
  const sum = (component: string) =>
    (cases.P?.reactions ?? []).reduce(
      (t, r) => (r.quantity.kind === 'reaction' && r.quantity.component === component ? t + r.value : t),
      0,
    );
  expect(sum('x')).toBeCloseTo(-5 * storeys, 8);
  expect(sum('y')).toBeCloseTo(10 * 6 * storeys * bays, 7);
});

test('another good set of redundants of a tall frame gives the same forces', () => {
  const input = grid(11, 5);
  const first = solve(input);
  if (!first.ok) throw new Error(first.refusal.message);
  const own = first.value.redundants;
  const [other] = proposedChoices(first.value).slice(own.length);
  if (!other) throw new Error('no other force is open');
  const sets = own.map((_, i) => own.map((q, k) => (k === i ? other : q)));
  const ask = chooser(analysis.parse(input));
  const redundants = sets.find((set) => ask(set).good);
  const second = solve({ ...input, redundants });
  if (!second.ok) throw new Error(second.refusal.message);
  const size = Math.max(...(first.value.X.P ?? []).map(Math.abs));
  expect(second.value.redundants.map(quantityKey)).toContain(quantityKey(other));
  for (const [id, d] of Object.entries(second.value.cases.P?.members ?? {})) {
    const M = first.value.cases.P?.members[id]?.M ?? [];
    expect(Math.abs((d.M[0]?.c[0] as number) - (M[0]?.c[0] as number))).toBeLessThan(1e-9 * size);
  }
});

test('a beam of 200 spans has a flexibility matrix of three diagonals', () => {
  const n = 200;
  const result = solve(
    structure(
      joints(...Array.from({ length: n + 1 }, (_, i) => `${i} ${5 * i} 0 ${i === 0 ? 'pin' : 'roller'}`)),
      members(...Array.from({ length: n }, (_, i) => `${i}-${i + 1}`)),
      [
        {
          id: 'P',
          title: 'uniform',
          nature: 'other',
          loads: Array.from({ length: n }, (_, i) => ({
            kind: 'distributed',
            member: `${i}-${i + 1}`,
            direction: 'y',
            w1: -12,
            w2: -12,
          })),
        },
      ],
    ),
  );
  if (!result.ok) throw new Error(result.refusal.message);
  const { work, cases } = result.value;
  expect(work.flexibility).toHaveLength(2 * (n - 1) - 1);
  expect(work.flexibility.every((f) => f.i - f.j <= 1)).toBe(true);
  // Far from its ends the beam is fixed by its own symmetry: M = −w l²/12, and each span turns nowhere at its supports.
  const middle = cases.P?.members['100-101']?.M ?? [];
  expect(middle[0]?.c[0]).toBeCloseTo(-25, 10);
  expect(integralOfProduct(middle, [{ from: 0, to: 5, c: [1] }])).toBeCloseTo(0, 9);
});
