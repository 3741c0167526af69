import type { SolvedForces } from '../force-method/solve-redundants';
import type { CaseResult, Check } from '../solution';
import type { Equilibrium } from '../statics/equilibrium';
import { solveStiffness } from '../stiffness/solve-stiffness';
import { checkOf } from './check-of';
import { gapResidual } from './gap-residual';
import { jointResidual } from './joint-residual';
import { reciprocity } from './reciprocity';
import { secondWay } from './second-way';

/** Equilibrium of every joint, reciprocity, closed gaps and agreement with the stiffness way, each relative to the largest value of its kind. */
export function checkSolution(
  eq: Equilibrium,
  solved: SolvedForces,
  cases: Readonly<Record<string, CaseResult>>,
  EI0: number,
): Check[] {
  const checks: Check[] = [];
  for (const [id, c] of solved.cases)
    checks.push(
      checkOf('equilibrium', 'every joint is in equilibrium', jointResidual(eq, c.final, c.load.rows), id),
    );
  if (solved.units.length > 1)
    checks.push(checkOf('reciprocity', 'f_ij equals f_ji', reciprocity(eq, solved, EI0)));
  for (const [id] of solved.cases)
    if (solved.units.length > 0)
      checks.push(
        checkOf('gap', 'every gap is closed', gapResidual(eq, solved, id, cases[id] as CaseResult, EI0), id),
      );
  const second = solveStiffness(eq.analysis);
  for (const [id, c] of solved.cases) {
    const other = second?.get(id);
    const residual = other ? secondWay(eq, c, cases[id] as CaseResult, other) : Number.POSITIVE_INFINITY;
    checks.push(checkOf('second-way', 'direct stiffness gives the same forces', residual, id));
  }
  return checks;
}
