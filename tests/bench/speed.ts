import { derive } from '@/lib/engine/derivation/derive';
import { solve } from '@/lib/engine/solve';
import type { AnalysisInput } from '@/lib/model/analysis';
import { beam, portal } from './structures';
import { figures, print, table } from './table';

/** Best and median of so many runs, after as many to warm up. */
function warm(run: () => void, times: number): { best: number; median: number } {
  for (let i = 0; i < times; i++) run();
  const taken = Array.from({ length: times }, () => {
    const start = performance.now();
    run();
    return performance.now() - start;
  }).sort((a, b) => a - b);
  return { best: taken[0] as number, median: taken[Math.floor(times / 2)] as number };
}

function written(input: AnalysisInput): () => void {
  return () => {
    const result = solve(input);
    if (!result.ok) throw new Error(result.refusal.message);
    derive(result.value);
  };
}

function solvedOnly(input: AnalysisInput): () => void {
  return () => {
    if (!solve(input).ok) throw new Error('refused');
  };
}

export function speed(): void {
  print('Solved with all steps written as data, warm, ms');
  const rows = [
    ['portal, 4 cases, 7 combinations', portal(), 300, '3'],
    ['beam of 20 spans', beam(20), 60, '25'],
  ] as const;
  table(
    ['structure', 'solved: best', 'median', 'and written: best', 'median', 'target'],
    rows.map(([name, input, times, target]) => {
      const [solved, all] = [warm(solvedOnly(input), times), warm(written(input), times)];
      return [name, ...[solved.best, solved.median, all.best, all.median].map(figures), target];
    }),
  );
}

/** What is refused must not keep anybody waiting: the longest of some large inputs that cannot be solved. */
export function refusals(): void {
  const slides = beam(1_900);
  const loose = slides.joints.map((j) => ({
    ...j,
    support: { x: 'free', y: 'held', turn: 'free' } as const,
  }));
  const inputs: [string, AnalysisInput][] = [
    ['1,900 spans that slide', { ...slides, joints: loose }],
    ['3,000 spans, too many', beam(3_000)],
    ['1,900 spans, the last member without a joint', { ...slides, joints: slides.joints.slice(0, -1) }],
  ];
  print('Refused, ms; target 1000');
  table(
    ['input', 'code', 'best', 'median'],
    inputs.map(([name, input]) => {
      const refused = solve(input);
      if (refused.ok) throw new Error(`${name} was solved`);
      const { best, median } = warm(() => solve(input), 5);
      return [name, refused.refusal.code, figures(best), figures(median)];
    }),
  );
}
