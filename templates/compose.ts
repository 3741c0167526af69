import { derive } from '@/lib/engine/derivation/derive';
import type { Step } from '@/lib/engine/derivation/step';
import type { Solution } from '@/lib/engine/solution';
import type { Block } from './block';
import { composeBasis } from './steps/compose-basis';
import { composeCautions } from './steps/compose-cautions';
import { composeChecks } from './steps/compose-checks';
import { composeCombinations } from './steps/compose-combinations';
import { composeCompatibility } from './steps/compose-compatibility';
import { composeDeflections } from './steps/compose-deflections';
import { composeDegree } from './steps/compose-degree';
import { composeDiagrams } from './steps/compose-diagrams';
import { composeForces } from './steps/compose-forces';
import { composeParts } from './steps/compose-parts';
import { composePrimary } from './steps/compose-primary';
import { composeRedundants } from './steps/compose-redundants';
import { composeSolution } from './steps/compose-solution';
import { composeStructure } from './steps/compose-structure';
import { composeSummary } from './steps/compose-summary';
import { composeUnitStates } from './steps/compose-unit-states';
import { composeWork } from './steps/compose-work';
import { type Scene, sceneOf } from './steps/scene';
import { StepWriter } from './steps/step-writer';

export interface ComposeOptions {
  /** Title of the sheet; the page prints it above the first line. */
  title?: string;
  /** Assumptions and references in the engineer's own words, printed in step 1. */
  basis?: string;
  /** Make the drawings; default true. */
  figures?: boolean;
  /** Lay each drawing out a second time for the column of a phone; default true. */
  narrowFigures?: boolean;
}

/**
 * The written calculation as blocks: the words, the TeX and the drawings of steps 1 to 17. Line numbers stay the same as
 * long as the calculation keeps its shape.
 */
export function compose(solution: Solution, options: ComposeOptions = {}): Block[] {
  const scene = sceneOf(solution, { figures: options.figures ?? true, basis: options.basis });
  const counters = { figures: 0, narrow: options.narrowFigures ?? true };
  return derive(solution).flatMap((step) => {
    const out = new StepWriter(step.number, scene.units, counters);
    composeStep(step, out, scene);
    return out.blocks;
  });
}

function composeStep(step: Step, out: StepWriter, scene: Scene): void {
  switch (step.kind) {
    case 'basis':
      composeBasis(step, out, scene);
      break;
    case 'structure':
      composeStructure(step, out, scene);
      break;
    case 'degree':
      composeDegree(step, out, scene);
      break;
    case 'redundants':
      composeRedundants(step, out, scene);
      break;
    case 'primary':
      composePrimary(step, out, scene);
      break;
    case 'parts':
      composeParts(step, out, scene);
      break;
    case 'units':
      composeUnitStates(step, out, scene);
      break;
    case 'work':
      composeWork(step, out, scene);
      break;
    case 'compatibility':
      composeCompatibility(step, out, scene);
      break;
    case 'solution':
      composeSolution(step, out, scene);
      break;
    case 'forces':
      composeForces(step, out, scene);
      break;
    case 'diagrams':
      composeDiagrams(step, out, scene);
      break;
    case 'deflections':
      composeDeflections(step, out, scene);
      break;
    case 'combinations':
      composeCombinations(step, out, scene);
      break;
    case 'checks':
      composeChecks(step, out, scene);
      break;
    case 'summary':
      composeSummary(step, out, scene);
      break;
    case 'cautions':
      composeCautions(step, out, scene);
      break;
  }
}
