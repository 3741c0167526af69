import type { Analysis } from '@/lib/model/analysis';
import type { Refusal } from '@/lib/model/refusal';
import { validateAsks } from './validate-asks';
import { validateJoints } from './validate-joints';
import { validateLoads } from './validate-loads';
import { validateMembers } from './validate-members';
import { validateSize } from './validate-size';

/** What a schema cannot see: sizes, references, geometry and loads that make no structure. The first fault found, or nothing. */
export function validate(analysis: Analysis): Refusal | undefined {
  return (
    validateSize(analysis) ??
    validateJoints(analysis) ??
    validateMembers(analysis) ??
    validateLoads(analysis) ??
    validateAsks(analysis)
  );
}
