import { solve } from '@/lib/engine/solve';
import type { AnalysisInput } from '@/lib/model/analysis';
import { frame, inUnits } from './structures';
import { print, table } from './table';

/** A sway mechanism, and the same frame held by one column that hardly leans: told apart alike at every scale. */
export function singularity(): void {
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
  /** One column leans by a little: stable, though hardly. */
  const leaning = (by: number): AnalysisInput => ({
    ...sway,
    joints: sway.joints.map((j) => (j.id === '0.0' ? { ...j, x: -by } : j)),
  });
  const scales = [1e-6, 1e-4, 1e-2, 1, 1e2, 1e4, 1e6];
  const rows = [
    ['fixed frame', base],
    ['sway mechanism', sway],
    ['held by one column leaning 0.05 in 3.5', leaning(0.05)],
    ['the same, leaning 1e-4 in 3.5', leaning(1e-4)],
    ['the same, leaning 1e-6 in 3.5', leaning(1e-6)],
    ['the same, leaning 1e-12 in 3.5: none, to rounding', leaning(1e-12)],
  ] as const;
  print('Singular and nearly singular, loads included, at 49 scales of force and length from 1e-6 to 1e6');
  table(
    ['structure', 'solved', 'unstable', 'refused otherwise', 'told apart alike'],
    rows.map(([name, input]) => {
      const found = scales.flatMap((f) => scales.map((l) => solve(inUnits(input, f, l))));
      const solved = found.filter((r) => r.ok).length;
      const unstable = found.filter((r) => !r.ok && r.refusal.code.startsWith('unstable')).length;
      const other = found.length - solved - unstable;
      const alike = unstable === 0 || unstable === found.length ? 'yes' : 'no';
      return [name, `${solved}`, `${unstable}`, `${other}`, alike];
    }),
  );
}
