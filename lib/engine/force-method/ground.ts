import type { Analysis } from '@/lib/model/analysis';
import { snapPlaces } from '../snap-places';
import { type Equilibrium, equilibrium } from '../statics/equilibrium';
import { proposeRedundants } from './propose-redundants';
import { type Reference, referenceStiffness, withReference } from './reference';
import type { PrimaryBasis } from './self-stress';

/** What solving and every answer about redundants start from: equilibrium, and the set that the engine proposes. */
export interface Ground {
  reference: Reference;
  eq: Equilibrium;
  proposed: PrimaryBasis;
}

/** One analysis is solved, asked about its redundants and written out; its ground is laid once. */
const laid = new WeakMap<Analysis, Ground>();

/** Whether an analysis was found valid and prepared before. */
export const isLaid = (analysis: Analysis): boolean => laid.has(analysis);

/** The ground of a valid analysis; `proposed.unstable` where it is a mechanism. An analysis is never changed in place. */
export function layGround(analysis: Analysis): Ground {
  const known = laid.get(analysis);
  if (known) return known;
  const reference = referenceStiffness(analysis);
  const eq = equilibrium(withReference(snapPlaces(analysis), reference));
  const ground = { reference, eq, proposed: proposeRedundants(eq) };
  laid.set(analysis, ground);
  return ground;
}
