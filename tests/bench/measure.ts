import { derive } from '@/lib/engine/derivation/derive';
import { solve } from '@/lib/engine/solve';
import { solveStiffness } from '@/lib/engine/stiffness/solve-stiffness';
import { type AnalysisInput, analysis } from '@/lib/model/analysis';
import { denseSolution } from './dense-solution';
import { beam, frame } from './structures';

/** One measurement in a process of its own, so that its memory is its own: `measure.js <way> <shape> <n> <m>`. */
const [way, shape, n, m] = process.argv.slice(2);
const input: AnalysisInput = shape === 'beam' ? beam(Number(n)) : frame(Number(n), Number(m));
const parsed = analysis.parse(input);

const ways: Record<string, () => string> = {
  nothing: () => '',
  solve: () => {
    const result = solve(input);
    return result.ok ? '' : result.refusal.code;
  },
  written: () => {
    const result = solve(input);
    if (result.ok) derive(result.value);
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
/** Again and again for a while, so that what is short is measured warm and a neighbour on the machine weighs less. */
const enough = { ms: 1_500, fewest: 3, runs: 40 };
const first = once();
let [ms, spent] = [first.ms, first.ms];
const more = (i: number) => i < enough.runs && (spent < enough.ms || (i < enough.fewest && first.ms < 4_000));
for (let i = 1; more(i); i++) {
  const again = once();
  ms = Math.min(ms, again.ms);
  spent += again.ms;
}
const peak = process.resourceUsage().maxRSS / 1024;
process.stdout.write(JSON.stringify({ ms, peak, refused: first.refused }));
