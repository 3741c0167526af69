import { spawnSync } from 'node:child_process';
import fc from 'fast-check';
import { derive } from '@/lib/engine/derivation/derive';
import { valueAt } from '@/lib/engine/diagrams/piecewise';
import { solve } from '@/lib/engine/solve';
import { solveStiffness } from '@/lib/engine/stiffness/solve-stiffness';
import { type AnalysisInput, analysis } from '@/lib/model/analysis';
import { randomStructure } from '../engine/properties/random-structure';
import { beam, frame, inUnits, portal } from './structures';

/** Numbers of the engine side by side, measured in one run on one machine. The targets stand beside them. */
const seed = 20_261;

function print(line = ''): void {
  process.stdout.write(`${line}\n`);
}

function table(head: readonly string[], rows: readonly (readonly string[])[]): void {
  const width = head.map((h, i) => Math.max(h.length, ...rows.map((r) => (r[i] ?? '').length)));
  const line = (cells: readonly string[]) =>
    print(cells.map((c, i) => c.padStart(width[i] as number)).join('  '));
  line(head);
  line(width.map((w) => '-'.repeat(w)));
  for (const row of rows) line(row);
  print();
}

const figures = (v: number) => (v === 0 ? '0' : v.toPrecision(3));

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

function accuracy(): void {
  const span = fc.record({ L: fc.integer({ min: -3, max: 3 }), EI: fc.integer({ min: 0, max: 6 }) });
  const spans = fc.array(span, { minLength: 2, maxLength: 6 });
  const groups = [
    ['ordinary (500 random structures)', fc.sample(randomStructure, { seed, numRuns: 500 }), '1e-9'],
    [
      'extreme (500 beams, 1e-3 to 1e3 long, EI 1 to 1e6)',
      fc.sample(spans, { seed, numRuns: 500 }).map(extremeBeam),
      '1e-6',
    ],
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

function warm(run: () => void, times: number): number {
  for (let i = 0; i < times; i++) run();
  const taken = Array.from({ length: times }, () => {
    const start = performance.now();
    run();
    return performance.now() - start;
  }).sort((a, b) => a - b);
  return taken[Math.floor(times / 2)] as number;
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

function speed(): void {
  print('Solved with all steps written as data, warm, median in ms');
  const rows = [
    ['portal, 4 cases, 7 combinations', portal(), 150, '3'],
    ['beam of 20 spans', beam(20), 40, '25'],
  ] as const;
  table(
    ['structure', 'solved', 'and written', 'target'],
    rows.map(([name, input, times, target]) => [
      name,
      figures(warm(solvedOnly(input), times)),
      figures(warm(written(input), times)),
      target,
    ]),
  );
}

interface Measured {
  ms: number;
  peak: number;
  refused: string;
}

function measure(way: string, shape: string, n: number, m: number): Measured {
  const script = `${import.meta.dirname}/measure.ts`;
  const run = spawnSync('node', ['--import', 'tsx', script, way, shape, `${n}`, `${m}`], {
    encoding: 'utf8',
  });
  if (run.status !== 0) throw new Error(run.stderr);
  return JSON.parse(run.stdout) as Measured;
}

/** Beyond this many unknowns the dense solution is not run: its time grows with their cube. */
const densest = 800;

function growth(): void {
  print(
    'Growth: best of four in ms, peak memory above an idle process in MB; dense: full matrix with mathjs lusolve',
  );
  const sizes = [
    ['beam', 10, 0],
    ['beam', 100, 0],
    ['beam', 1_000, 0],
    ['frame', 3, 3],
    ['frame', 10, 3],
    ['frame', 20, 8],
    ['frame', 40, 8],
  ] as const;
  const idle = measure('nothing', 'beam', 1, 0).peak;
  const shown = (m: Measured) => (m.refused === '' ? figures(m.ms) : m.refused);
  const rows = sizes.map(([shape, n, m]) => {
    const members = shape === 'beam' ? n : n * (m + 1) + n * m;
    const unknowns = shape === 'beam' ? 2 * n + 1 : 3 * n * (m + 1);
    const own = measure('solve', shape, n, m);
    const second = measure('stiffness', shape, n, m);
    const dense = unknowns <= densest ? measure('dense', shape, n, m) : undefined;
    return [
      shape === 'beam' ? `${n} spans` : `${n} × ${m} frame`,
      `${members}`,
      shown(own),
      figures((own.ms / members) * 1000),
      figures(Math.max(0, own.peak - idle)),
      shown(second),
      figures(Math.max(0, second.peak - idle)),
      dense ? shown(dense) : 'not run',
      dense ? figures(Math.max(0, dense.peak - idle)) : '',
      dense ? figures(dense.ms / own.ms) : '',
    ];
  });
  table(
    ['structure', 'members', 'solve', 'µs a member', 'MB', 'stiffness', 'MB', 'dense', 'MB', 'dense/solve'],
    rows,
  );
}

/** A sway mechanism, and the same frame held by one column that hardly leans: told apart alike at every scale. */
function singularity(): void {
  const base = frame(1, 2);
  const hinged = { x: 'held', y: 'held', turn: 'free' } as const;
  const ends = ['moment' as const];
  const sway: AnalysisInput = {
    ...base,
    joints: base.joints.map((j) => (j.support ? { ...j, support: hinged } : j)),
    members: base.members.map((m) =>
      m.id.startsWith('c') ? { ...m, releases: { start: [], end: ends } } : m,
    ),
  };
  const leaning: AnalysisInput = {
    ...sway,
    joints: sway.joints.map((j) => (j.id === '0.0' ? { ...j, x: -0.05 } : j)),
  };
  const scales = [1e-6, 1e-3, 1, 1e3, 1e6];
  const rows = [
    ['sway mechanism', sway],
    ['held by one column leaning 0.05 in 3.5', leaning],
  ] as const;
  print('Singular and nearly singular, at 25 scales of force and length from 1e-6 to 1e6');
  table(
    ['structure', 'stable', 'unstable', 'other'],
    rows.map(([name, input]) => {
      const found = scales.flatMap((f) => scales.map((l) => solve(inUnits({ ...input, cases: [] }, f, l))));
      const stable = found.filter((r) => r.ok).length;
      const unstable = found.filter((r) => !r.ok && r.refusal.code.startsWith('unstable')).length;
      return [name, `${stable}`, `${unstable}`, `${found.length - stable - unstable}`];
    }),
  );
}

print(`Node ${process.version}, seed ${seed}`);
print();
accuracy();
speed();
growth();
singularity();
