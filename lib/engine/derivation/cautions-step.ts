import type { Context } from './context';

/** Step 17: what this calculation does not cover, and what this structure needs said. */
export interface CautionsStep {
  kind: 'cautions';
  /** Members whose whole length is in hogging under some state of step 16, by state. */
  hogging: { member: string; by: string }[];
  /** Members that carry their force along without resistance to being found by bending. */
  openAxial: readonly string[];
  units: Context['analysis']['units'];
}

export function deriveCautions(ctx: Context): CautionsStep {
  const { analysis, solution, names } = ctx;
  const states = solution.combinations.length > 0 ? solution.combinations : [];
  const hogging = names.beam
    ? states.flatMap((s) =>
        analysis.members.flatMap(({ id }) => {
          const M = s.members[id]?.M ?? [];
          const ends = M.flatMap((p) => [
            p.c[0] ?? 0,
            p.c.reduce((t, c, k) => t + c * (p.to - p.from) ** k, 0),
          ]);
          const inner = M.flatMap((p) => {
            const [, c1 = 0, c2 = 0] = p.c;
            const x = c2 === 0 ? 0 : -c1 / (2 * c2);
            return x > 0 && x < p.to - p.from ? [p.c.reduce((t, c, k) => t + c * x ** k, 0)] : [];
          });
          const all = [...ends, ...inner];
          const size = Math.max(...all.map(Math.abs), 0);
          return size > 0 && all.every((v) => v <= 1e-9 * size) ? [{ member: id, by: s.id }] : [];
        }),
      )
    : [];
  return { kind: 'cautions', hogging, openAxial: solution.determinacy.openAxial, units: analysis.units };
}
