import fc from 'fast-check';
import { valueAt } from '@/lib/engine/diagrams/piecewise';
import { solve } from '@/lib/engine/solve';
import { solveStiffness } from '@/lib/engine/stiffness/solve-stiffness';
import { type AnalysisInput, analysis } from '@/lib/model/analysis';
import { randomStructure } from '../engine/properties/random-structure';
import { beam, frame } from './structures';
import { figures, print, table } from './table';

/** Greatest difference of end moments between the two ways, over the greatest moment; undefined when refused. */
function disagreement(input: AnalysisInput): number | undefined {
  const result = solve(input);
  if (!result.ok) return undefined;
  const second = solveStiffness(analysis.parse(input));
  let [worst, size] = [0, 0];
  for (const [id, c] of Object.entries(result.value.cases)) {
    result.value.analysis.members.forEach((m, i) => {
      const M = c.members[m.id]?.M ?? [];
      const other = second?.get(id)?.members[i];
      const pairs = [
        [valueAt(M, 0), other?.M0],
        [valueAt(M, M.at(-1)?.to as number, 'left'), other?.M1],
      ] as const;
      for (const [a, b] of pairs) {
        size = Math.max(size, Math.abs(a));
        worst = Math.max(worst, Math.abs(a - (b as number)));
      }
    });
  }
  return size < 1e-6 ? 0 : worst / size;
}

function extremeBeam(spans: readonly { L: number; EI: number }[]): AnalysisInput {
  const input = beam(spans.length);
  let x = 0;
  const joints = input.joints.map((j, i) => {
    if (i > 0) x += 10 ** (spans[i - 1]?.L as number);
    return { ...j, x };
  });
  return {
    ...input,
    joints,
    members: input.members.map((m, i) => ({ ...m, EI: 10 ** (spans[i]?.EI as number) })),
  };
}

/** Frames of one to three storeys with members and stiffnesses as far apart. */
function extremeFrame({ storeys, bays, heights, widths, EI }: ExtremeFrame): AnalysisInput {
  const input = frame(storeys, bays);
  const along = (steps: readonly number[], n: number) => steps.slice(0, n).reduce((t, e) => t + 10 ** e, 0);
  const place = (id: string) => id.split('.').map(Number) as [number, number];
  return {
    ...input,
    joints: input.joints.map((j) => {
      const [i, k] = place(j.id);
      return { ...j, x: along(widths, k), y: along(heights, i) };
    }),
    members: input.members.map((m, i) => ({ ...m, EI: 10 ** (EI[i] as number) })),
  };
}

interface ExtremeFrame {
  storeys: number;
  bays: number;
  heights: number[];
  widths: number[];
  EI: number[];
}

export function accuracy(seed: number): void {
  const [L, EI] = [fc.integer({ min: -3, max: 3 }), fc.integer({ min: 0, max: 6 })];
  const spans = fc.array(fc.record({ L, EI }), { minLength: 2, maxLength: 6 });
  const many = <T>(of: fc.Arbitrary<T>, n: number) => fc.array(of, { minLength: n, maxLength: n });
  const frames = fc.record({
    storeys: fc.integer({ min: 1, max: 3 }),
    bays: fc.integer({ min: 1, max: 2 }),
    heights: many(L, 3),
    widths: many(L, 2),
    EI: many(EI, 15),
  });
  const groups = [
    ['ordinary (500 random structures)', fc.sample(randomStructure, { seed, numRuns: 500 }), '1e-9'],
    [
      'extreme (500 beams, 1e-3 to 1e3 long, EI 1 to 1e6)',
      fc.sample(spans, { seed, numRuns: 500 }).map(extremeBeam),
      '1e-6',
    ],
    ['extreme (500 frames, the same)', fc.sample(frames, { seed, numRuns: 500 }).map(extremeFrame), '1e-6'],
  ] as const;
  print('Agreement of the two ways, relative to the largest moment');
  table(
    ['structures', 'solved', 'refused', 'median', 'worst', 'target'],
    groups.map(([name, list, target]) => {
      const found = list.map(disagreement);
      const solved = found.filter((d) => d !== undefined).sort((a, b) => a - b);
      const middle = solved[Math.floor(solved.length / 2)];
      const refused = `${found.length - solved.length}`;
      return [
        name,
        `${solved.length}`,
        refused,
        figures(middle as number),
        figures(solved.at(-1) as number),
        target,
      ];
    }),
  );
}
