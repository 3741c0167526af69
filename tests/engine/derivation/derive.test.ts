import { describe, expect, it } from 'vitest';
import { derive } from '@/lib/engine/derivation/derive';
import type { Relation } from '@/lib/engine/derivation/relation';
import type { Step } from '@/lib/engine/derivation/step';
import { solve } from '@/lib/engine/solve';
import type { Analysis } from '@/lib/model/analysis';
import { odd } from './odd-structures';
import { proppedCantilever, samples, simpleBeam, threeSpans } from './sample-structures';

function steps(analysis: Analysis): Step[] {
  const solved = solve(analysis);
  if (!solved.ok) throw new Error(solved.refusal.message);
  return derive(solved.value);
}

function step<K extends Step['kind']>(all: readonly Step[], kind: K): Extract<Step, { kind: K }> {
  const found = all.find((s): s is Extract<Step, { kind: K }> => s.kind === kind);
  if (!found) throw new Error(`no step ${kind}`);
  return found;
}

const order = [
  'basis',
  'structure',
  'degree',
  'redundants',
  'primary',
  'parts',
  'units',
  'work',
  'compatibility',
  'solution',
  'forces',
  'diagrams',
  'deflections',
  'combinations',
  'checks',
  'summary',
  'cautions',
];

describe('derive', () => {
  it.each(Object.entries<Analysis>({ ...samples, ...odd }))(
    'writes seventeen steps in one order for %s',
    (_, analysis) => {
      const all = steps(analysis);
      expect(all.map((s) => s.kind)).toEqual(order);
      expect(all.map((s) => s.number)).toEqual(order.map((_, i) => i + 1));
    },
  );

  it('finds the fixing moment of a propped cantilever by its published formulas', () => {
    // Uniform load: w L²/8. Point load: P a b (L + b)/(2 L²) from the fixed end. AISC Manual, Table 3-23, from memory.
    const [L, w, P, a] = [6, 12, 20, 3.5];
    const b = L - a;
    const { values } = step(steps(proppedCantilever), 'solution');
    expect(values.find((v) => v.id === 'G')?.X[0]?.value).toBeCloseTo((w * L * L) / 8, 9);
    expect(values.find((v) => v.id === 'Q')?.X[0]?.value).toBeCloseTo((P * a * b * (L + b)) / (2 * L * L), 9);
  });

  it('finds its deflection at a place by its published formula', () => {
    // Uniform load, x from the free (propped) end: w x (L³ − 3 L x² + 2 x³)/(48 EI) down. Same table, from memory.
    const [L, w, EI] = [6, 12, 18_000];
    const x = L - 3.5;
    const down = (w * x * (L ** 3 - 3 * L * x ** 2 + 2 * x ** 3)) / (48 * EI);
    const [asked] = step(steps(proppedCantilever), 'deflections').deflections;
    const line = asked?.cases.find((c) => c.id === 'G')?.result;
    expect(line?.result.value).toBeCloseTo(-down, 9);
    expect(line?.again?.scale).toBe(1000);
  });

  it('writes the coefficients of the three-moment equation for a continuous beam', () => {
    // Clapeyron 1857: (L1/k1 + L2/k2)/3 on the diagonal, L2/(6 k2) beside it, times EI0.
    const { matrix } = step(steps(threeSpans), 'compatibility');
    expect(matrix[0]?.[0]?.value).toBeCloseTo(5.4 / 3 + 7.2 / 1.6 / 3, 12);
    expect(matrix[0]?.[1]?.value).toBeCloseTo(7.2 / 1.6 / 6, 12);
    expect(matrix[1]?.[1]?.value).toBeCloseTo(7.2 / 1.6 / 3 + 4.5 / 3, 12);
  });

  it('has nothing to solve for a determinate structure', () => {
    const all = steps(simpleBeam);
    expect(step(all, 'redundants').redundants).toEqual([]);
    expect(step(all, 'compatibility').matrix).toEqual([]);
    expect(step(all, 'solution').single).toEqual([]);
  });

  it('counts the degree as the rank does', () => {
    for (const analysis of Object.values(samples)) {
      const { count, determinacy } = step(steps(analysis), 'degree');
      expect(count.result.value).toBe(determinacy.degree);
    }
  });

  it('prints a redundant with one decimal more than what it produces', () => {
    const all = steps(threeSpans);
    const X: Relation['result'] | undefined = step(all, 'solution').values[0]?.X[0];
    expect(X?.decimals).toBe(step(all, 'basis').figures.moment + 1);
  });

  it('leaves the statics of many redundants to tables, and keeps every coefficient', () => {
    const all = steps(odd.manySpans);
    expect(step(all, 'units').states.every((s) => s.steps.length === 0)).toBe(true);
    expect(step(all, 'solution').elimination).toBeUndefined();
    const groups = step(all, 'work').flexibility.flatMap((t) => t.groups);
    expect(groups).toHaveLength(19 + 18);
  });
});
