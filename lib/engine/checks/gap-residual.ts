import { between, integralOfProduct } from '../diagrams/piecewise';
import type { SolvedForces } from '../force-method/solve-redundants';
import { axialShearRows } from '../force-method/work-row';
import type { CaseResult } from '../solution';
import type { Equilibrium } from '../statics/equilibrium';
import { sizeOfCase } from './size-of-case';

/** The gap at every redundant, integrated anew from the final diagrams. */
export function gapResidual(
  eq: Equilibrium,
  solved: SolvedForces,
  id: string,
  result: CaseResult,
  EI0: number,
): number {
  const c = solved.cases.get(id);
  if (!c) return Number.POSITIVE_INFINITY;
  let worst = 0;
  const force = sizeOfCase(eq, c);
  const diagonal = new Map(solved.entries.filter((f) => f.i === f.j).map((f) => [f.i, f.total]));
  /** The gap that the largest force of the case would open here: what a rounding of forces is to be held against. */
  const opened = (i: number, { members }: SolvedForces['units'][number]) => {
    const ends = [...members.values()].flatMap((u) => [u.N, u.m0 / eq.length, u.m1 / eq.length]);
    const own = Math.max(0, ...ends.map(Math.abs));
    return own === 0 ? 0 : ((diagonal.get(i) as number) * force) / own;
  };
  solved.units.forEach((unit, i) => {
    const terms: number[] = [];
    for (const [b, u] of unit.members) {
      const bar = eq.bars[b];
      const local = c.load.local[b];
      const d = bar && result.members[bar.member.id];
      if (!bar || !d || !local) continue;
      const { L } = bar.axis;
      const own = bar.stretches;
      const line = [{ from: 0, to: L, c: [u.m0, (u.m1 - u.m0) / L] }];
      for (const t of own) {
        const work = integralOfProduct(between(d.M, t.from, t.to), between(line, t.from, t.to));
        terms.push((EI0 * work) / t.EI);
      }
      terms.push(...axialShearRows(bar, u, d, EI0).map((r) => r.value));
      terms.push(
        EI0 * (u.N * (local.strain * L + local.misfit) + (((u.m0 + u.m1) * L) / 2) * local.curvature),
      );
    }
    for (const s of solved.held) {
      const R = unit.reactions.get(s.column);
      if (R !== undefined)
        terms.push((EI0 * R * (c.final[s.column] as number) * (eq.scale[s.column] as number)) / s.stiffness);
    }
    for (const m of c.movements) {
      const R = unit.reactions.get(m.column);
      if (R !== undefined) terms.push(-EI0 * R * m.value);
    }
    const size = Math.max(...terms.map(Math.abs), Math.abs(c.gaps[i]?.total as number), opened(i, unit));
    if (size > 0) worst = Math.max(worst, Math.abs(terms.reduce((a, b) => a + b, 0)) / size);
  });
  return worst;
}
