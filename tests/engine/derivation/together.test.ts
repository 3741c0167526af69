import { describe, expect, it } from 'vitest';
import { contextOf } from '@/lib/engine/derivation/context';
import { type Expression, evaluate, type Value, valuesOf } from '@/lib/engine/derivation/expression';
import { writeSteps } from '@/lib/engine/derivation/statics';
import type { StaticsStep } from '@/lib/engine/derivation/statics-equation';
import type { Solution } from '@/lib/engine/solution';
import { solve } from '@/lib/engine/solve';
import type { StaticsLine } from '@/lib/engine/statics/statics-line';
import type { Analysis } from '@/lib/model/analysis';
import { odd } from './odd-structures';
import { simpleBeam } from './sample-structures';

function solved(analysis: Analysis): Solution {
  const result = solve(analysis);
  if (!result.ok) throw new Error(result.refusal.message);
  return result.value;
}

const writtenOf = (solution: Solution): StaticsStep[] => {
  const ctx = contextOf(solution);
  return [
    ...Object.entries(solution.primary.loaded).flatMap(([id, s]) =>
      writeSteps(ctx, s.lines, { kind: 'case', id }),
    ),
    ...solution.primary.units.flatMap((s, index) => writeSteps(ctx, s.lines, { kind: 'unit', index })),
  ];
};

const printed = (e: Expression) => evaluate(e, 'printed');
const unit = (v: Value) => 10 ** -v.decimals;

describe.each([
  ['the reactions of a three-hinged frame on bases that are not level', odd.threeHinges],
  ['the hinge forces of a closed cell', odd.closedCell],
])('equations that give %s only together', (_, analysis) => {
  const steps = writtenOf(solved(analysis)).filter((s) => s.set);

  it('stand one after the other, in symbols and collected with their figures', () => {
    expect(steps.length).toBeGreaterThan(1);
    for (const { equation, set } of steps) {
      expect(Math.abs(evaluate(equation))).toBeLessThan(1e-9);
      expect(evaluate(set?.left as Expression)).toBeCloseTo(set?.right.result.value as number, 9);
    }
  });

  it('end with both unknowns, which the printed figures of the equations give', () => {
    for (const { set } of steps) {
      if (!set || set.place < set.of) {
        expect(set?.solution).toEqual([]);
        continue;
      }
      expect(set.solution.map((r) => r.symbol)).toEqual(set.unknowns.map((u) => u.symbol));
      for (const r of set.solution)
        expect(Math.abs(printed(r.formula) - r.result.value)).toBeLessThan(1.5 * unit(r.result));
    }
  });

  it('print one figure of a coefficient wherever it stands', () => {
    const pairs = steps.flatMap((s, i) => (s.set?.place === 2 ? [[steps[i - 1], s] as const] : []));
    for (const [one, two] of pairs) {
      const equations = [one, two].flatMap((s) =>
        s?.set ? [...valuesOf(s.set.left), s.set.right.result] : [],
      );
      for (const v of two?.set?.solution.flatMap((r) => valuesOf(r.formula)) ?? []) {
        const same = equations.filter((e) => Math.abs(e.value) === Math.abs(v.value));
        expect(same.some((e) => e.decimals === v.decimals)).toBe(true);
      }
    }
  });
});

it('more than two unknowns stand as they were found, and every equation proves them', () => {
  const solution = solved(simpleBeam);
  const [id, state] = Object.entries(solution.primary.loaded)[0] ?? [];
  const lines = (state?.lines ?? []).filter((l) => l.kind === 'equation');
  // The same forces as one set: every equation with all its terms.
  const together: StaticsLine = {
    kind: 'simultaneous',
    equations: lines.map(({ piece, sum, terms }) => ({ piece, sum, terms })),
    unknowns: lines.map(({ unknown, value }) => ({ of: unknown, value })),
  };
  expect(together.unknowns.length).toBe(3);
  const steps = writeSteps(contextOf(solution), [together], { kind: 'case', id: id as string });
  const last = steps.at(-1)?.set;
  expect(last?.solution.map((r) => r.result.value)).toEqual(lines.map((l) => l.value));
  expect(last?.inserted).toHaveLength(3);
  for (const { relation } of last?.inserted ?? [])
    expect(Math.abs(printed(relation.formula))).toBeLessThan(unit(relation.result));
});
