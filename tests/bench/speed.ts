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
