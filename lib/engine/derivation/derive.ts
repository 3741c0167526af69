import type { Solution } from '../solution';
import { deriveBasis } from './basis-step';
import { deriveCautions } from './cautions-step';
import { deriveChecks } from './checks-step';
import { deriveCombinations } from './combinations-step';
import { deriveCompatibility } from './compatibility-step';
import { contextOf } from './context';
import { deriveDeflections } from './deflections-step';
import { deriveDegree } from './degree-step';
import { deriveDiagrams } from './diagrams-step';
import { withEnoughFigures } from './elimination-context';
import { deriveForces } from './forces-step';
import { deriveParts } from './parts-step';
import { derivePrimary } from './primary-step';
import { deriveRedundants } from './redundants-step';
import { deriveSolution } from './solution-step';
import type { Step } from './step';
import { deriveStructure } from './structure-step';
import { deriveSummary } from './summary-step';
import { deriveUnitStates } from './unit-states-step';
import { deriveWork } from './work-step';

/** In the order a calculation is written in. */
const order = [
  deriveBasis,
  deriveStructure,
  deriveDegree,
  deriveRedundants,
  derivePrimary,
  deriveParts,
  deriveUnitStates,
  deriveWork,
  deriveCompatibility,
  deriveSolution,
  deriveForces,
  deriveDiagrams,
  deriveDeflections,
  deriveCombinations,
  deriveChecks,
  deriveSummary,
  deriveCautions,
] as const;

/**
 * The written calculation of a solution as data, steps 1 to 17. Every formula is a tree whose printed figures give its
 * printed result (see precision.ts). Throws when a formula does not give the engine's own result: that is a fault of
 * the derivation, never of what was entered.
 */
export function derive(solution: Solution): Step[] {
  const ctx = withEnoughFigures(contextOf(solution));
  return order.map((step, i) => ({ ...step(ctx), number: i + 1 }));
}
