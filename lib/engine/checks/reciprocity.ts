import { flexibilityRows } from '../force-method/flexibility';
import type { SolvedForces } from '../force-method/solve-redundants';
import type { Equilibrium } from '../statics/equilibrium';

/** The same coefficient with areas of the one diagram and ordinates of the other exchanged. */
export function reciprocity(eq: Equilibrium, solved: SolvedForces, EI0: number): number {
  const diagonal = new Map(solved.entries.filter((f) => f.i === f.j).map((f) => [f.i, f.total]));
  let worst = 0;
  for (const { i, j, total } of solved.entries) {
    const [a, b] = [solved.units[j], solved.units[i]];
    if (i === j || !a || !b) continue;
    const turned = flexibilityRows(eq, a, b, solved.held, EI0).reduce((t, r) => t + r.value, 0);
    const size = Math.sqrt((diagonal.get(i) as number) * (diagonal.get(j) as number));
    if (size > 0) worst = Math.max(worst, Math.abs(turned - total) / size);
  }
  return worst;
}
