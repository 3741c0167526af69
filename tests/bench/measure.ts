import { solve } from '@/lib/engine/solve';
import { solveStiffness } from '@/lib/engine/stiffness/solve-stiffness';
import { type AnalysisInput, analysis } from '@/lib/model/analysis';
import { denseSolution } from './dense-solution';
import { beam, frame } from './structures';

/** One measurement in a process of its own, so that its memory is its own: `measure.ts <way> <shape> <n> <m>`. */
const [way, shape, n, m] = process.argv.slice(2);
const input: AnalysisInput = shape === 'beam' ? beam(Number(n)) : frame(Number(n), Number(m));
const parsed = analysis.parse(input);

const ways: Record<string, () => string> = {
  nothing: () => '',
  solve: () => {
    const result = solve(input);
    return result.ok ? '' : result.refusal.code;
  },
  stiffness: () => (solveStiffness(parsed) ? '' : 'unstable'),
  dense: () => (denseSolution(input).every(Number.isFinite) ? '' : 'not finite'),
};
const run = ways[way ?? ''];
if (!run) throw new Error(`no way ${way}`);
const once = () => {
  const start = performance.now();
  const refused = run();
  return { ms: performance.now() - start, refused };
};
const first = once();
const again = first.ms < 2_000 ? [once(), once(), once()] : [];
const ms = Math.min(first.ms, ...again.map((a) => a.ms));
const peak = process.resourceUsage().maxRSS / 1024;
process.stdout.write(JSON.stringify({ ms, peak, refused: first.refused }));
