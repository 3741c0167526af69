import type { BasisStep } from './basis-step';
import type { CautionsStep } from './cautions-step';
import type { ChecksStep } from './checks-step';
import type { CombinationsStep } from './combinations-step';
import type { CompatibilityStep } from './compatibility-step';
import type { DeflectionsStep } from './deflections-step';
import type { DegreeStep } from './degree-step';
import type { DiagramsStep } from './diagrams-step';
import type { ForcesStep } from './forces-step';
import type { PartsStep } from './parts-step';
import type { PrimaryStep } from './primary-step';
import type { RedundantsStep } from './redundants-step';
import type { SolutionStep } from './solution-step';
import type { StructureStep } from './structure-step';
import type { SummaryStep } from './summary-step';
import type { UnitStatesStep } from './unit-states-step';
import type { WorkStep } from './work-step';

/** What a step of the written calculation says, as data: symbols, formulas, figures, results. Words come later. */
export type StepContent =
  | BasisStep
  | StructureStep
  | DegreeStep
  | RedundantsStep
  | PrimaryStep
  | PartsStep
  | UnitStatesStep
  | WorkStep
  | CompatibilityStep
  | SolutionStep
  | ForcesStep
  | DiagramsStep
  | DeflectionsStep
  | CombinationsStep
  | ChecksStep
  | SummaryStep
  | CautionsStep;

/** A step with its number, 1 to 17, the same on every sheet. */
export type Step = StepContent & { number: number };
