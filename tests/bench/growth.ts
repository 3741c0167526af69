import { spawnSync } from 'node:child_process';
import { figures, print, table } from './table';

interface Measured {
  ms: number;
  peak: number;
  refused: string;
}

function measure(way: string, shape: string, n: number, m: number): Measured {
  const script = `${import.meta.dirname}/measure.js`;
  const run = spawnSync('node', [script, way, shape, `${n}`, `${m}`], {
    encoding: 'utf8',
  });
  if (run.status !== 0) throw new Error(run.stderr);
  return JSON.parse(run.stdout) as Measured;
}

/** Beyond this many unknowns the dense solution is not run: its time grows with their cube. */
const densest = 1_100;

export function growth(): void {
  print(
    'Growth: best in ms, each in a process of its own, run at least three times unless it takes over 4 s; peak memory above an idle process in MB; dense: full matrix with mathjs lusolve',
  );
  const sizes = [
    ['beam', 10, 0],
    ['beam', 100, 0],
    ['beam', 1_000, 0],
    ['frame', 3, 3],
    ['frame', 10, 3],
    ['frame', 10, 8],
    ['frame', 20, 8],
    ['frame', 40, 8],
  ] as const;
  const idle = measure('nothing', 'beam', 1, 0).peak;
  const shown = (m: Measured) => (m.refused === '' ? figures(m.ms) : m.refused);
  const rows = sizes.map(([shape, n, m]) => {
    const members = shape === 'beam' ? n : n * (m + 1) + n * m;
    const unknowns = shape === 'beam' ? 2 * n + 1 : 3 * n * (m + 1);
    const own = measure('solve', shape, n, m);
    const written = measure('written', shape, n, m);
    const second = measure('stiffness', shape, n, m);
    const dense = unknowns <= densest ? measure('dense', shape, n, m) : undefined;
    return [
      shape === 'beam' ? `${n} spans` : `${n} × ${m} frame`,
      `${members}`,
      shown(own),
      figures((own.ms / members) * 1000),
      figures(Math.max(0, own.peak - idle)),
      shown(written),
      shown(second),
      figures(Math.max(0, second.peak - idle)),
      dense ? shown(dense) : 'not run',
      dense ? figures(Math.max(0, dense.peak - idle)) : '',
      dense ? figures(dense.ms / own.ms) : '',
    ];
  });
  table(
    [
      'structure',
      'members',
      'solve',
      'µs a member',
      'MB',
      'and written',
      'stiffness',
      'MB',
      'dense',
      'MB',
      'dense/solve',
    ],
    rows,
  );
}
