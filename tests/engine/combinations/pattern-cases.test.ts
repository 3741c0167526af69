import { expect, test } from 'vitest';
import { compareCombinations } from '@/lib/engine/combinations/compare-combinations';
import { envelopes } from '@/lib/engine/combinations/envelopes';
import { patternCases, spanLines } from '@/lib/engine/combinations/pattern-cases';
import { valueAt } from '@/lib/engine/diagrams/piecewise';
import type { Solution } from '@/lib/engine/solution';
import { solve } from '@/lib/engine/solve';
import { type AnalysisInput, analysis } from '@/lib/model/analysis';

const pinned = { x: 'held', y: 'held', turn: 'free' } as const;
const roller = { x: 'free', y: 'held', turn: 'free' } as const;

function beam(spans: readonly number[]): AnalysisInput {
  const places = [0];
  for (const L of spans) places.push((places.at(-1) as number) + L);
  return {
    form: 'fairhand.analysis/1',
    units: 'SI',
    basis: { kind: 'relative' },
    joints: places.map((x, i) => ({ id: `${i}`, x, y: 0, support: i === 0 ? pinned : roller })),
    members: spans.map((_, i) => ({ id: `m${i}`, start: `${i}`, end: `${i + 1}`, EI: 1 })),
    cases: [
      {
        id: 'L',
        title: 'Live',
        nature: 'live',
        loads: spans.map((_, i) => ({
          kind: 'distributed',
          member: `m${i}`,
          direction: 'y',
          w1: -10,
          w2: -10,
        })),
      },
    ],
  };
}

function solved(input: AnalysisInput): Solution {
  const result = solve(input);
  if (!result.ok) throw new Error(result.refusal.message);
  return result.value;
}

test('arrangements hold the greatest and least moment at supports and midspans of all there are', () => {
  const spans = [6, 8, 5, 7, 6];
  const parsed = analysis.parse(beam(spans));
  const [live] = parsed.cases;
  if (!live) throw new Error('no case');
  const { cases, arrangements } = patternCases(live, spanLines(parsed));
  expect(cases.map((c) => c.id)).toEqual(['L1', 'L2', 'L3', 'L4', 'L5']);
  expect(arrangements.length).toBeLessThanOrEqual(3 + 2 * 4);
  const combination = (ids: readonly string[], i: number) => ({
    id: `${i}`,
    purpose: 'strength' as const,
    factors: Object.fromEntries(ids.map((id) => [id, 1])),
  });
  const solution = solved({ ...parsed, cases, combinations: arrangements.map(combination) });
  const bounds = envelopes(solution.analysis, solution.combinations);
  spans.forEach((L, k) => {
    for (const s of [L / 2, L]) {
      const parts = cases.map((c) => valueAt(solution.cases[c.id]?.members[`m${k}`]?.M ?? [], s, 'left'));
      const most = parts.reduce((t, v) => t + Math.max(v, 0), 0);
      const least = parts.reduce((t, v) => t + Math.min(v, 0), 0);
      const station = bounds
        .find((b) => b.member === `m${k}`)
        ?.stations.find((x) => Math.abs(x.s - s) < 1e-9);
      expect(station?.M.max).toBeCloseTo(k === 4 && s === L ? 0 : most, 9);
      expect(station?.M.min).toBeCloseTo(k === 4 && s === L ? 0 : least, 9);
    }
  });
});

test('spans of a two-bay frame are its beams, in one line a storey', () => {
  const at = (id: string, x: number, y: number) => ({ id, x, y, support: y === 0 ? pinned : undefined });
  const joints = ['a', 'b', 'c'].flatMap((name, k) => [0, 4, 8].map((y, i) => at(`${name}${i}`, 6 * k, y)));
  const member = (start: string, end: string) => ({ id: `${start}${end}`, start, end, EI: 1 });
  const members = [1, 2].flatMap((i) => [
    ...['a', 'b', 'c'].map((n) => member(`${n}${i - 1}`, `${n}${i}`)),
    member(`a${i}`, `b${i}`),
    member(`b${i}`, `c${i}`),
  ]);
  const frame = analysis.parse({ ...beam([1]), joints, members, cases: [] });
  expect(spanLines(frame)).toEqual([
    [['a1b1'], ['b1c1']],
    [['a2b2'], ['b2c2']],
  ]);
});

test('the envelope names the governing combination and the comparison proves it', () => {
  const input = beam([6, 6]);
  const combinations = [
    { id: 'half', purpose: 'strength' as const, factors: { L: 0.5 } },
    { id: 'full', purpose: 'strength' as const, factors: { L: 1 } },
    { id: 'lift', purpose: 'strength' as const, factors: { L: -0.25 } },
  ];
  const { analysis: sheet, combinations: results, envelopes: bounds } = solved({ ...input, combinations });
  const support = bounds.find((b) => b.member === 'm0')?.stations.at(-1);
  expect(support?.M).toMatchObject({ minBy: 'full', maxBy: 'lift' });
  expect(support?.M.min).toBeCloseTo(-45, 10);
  const proof = compareCombinations(sheet, results, 'strength');
  const row = proof.find((p) => p.member === 'm0' && p.force === 'M' && p.bound === 'max');
  expect(row?.by).toBe('full');
  expect(row?.rows.map((r) => r.id)).toEqual(['full', 'half', 'lift']);
  expect(row?.rows[1]?.share).toBeCloseTo(0.5, 12);
});

test('a combination without a case is zero everywhere', () => {
  const combinations = [{ id: 'none', purpose: 'service' as const, factors: {} }];
  const result = solved({ ...beam([6, 6]), combinations });
  expect(result.combinations[0]?.reactions.every((r) => r.value === 0)).toBe(true);
  expect(result.envelopes[0]?.stations.every((s) => s.M.max === 0 && s.M.min === 0)).toBe(true);
});
