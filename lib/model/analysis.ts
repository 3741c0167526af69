import { z } from 'zod';
import { loadCase } from './load';
import { quantity } from './quantity';
import { joint, member } from './structure';

/** The versioned name of this form; a reader refuses any other. */
export const analysisForm = 'fairhand.analysis/1';

/** US: kip, ft, °F. SI: kN, m, K. Every number of an analysis is in these coherent units; rotations in rad. */
export const unitSet = z.enum(['US', 'SI']);

/**
 * absolute: member EI, EA, GAs are values. relative: member EI are multiples of one EI0; forces of a structure without
 * settlement, temperature, misfit, springs, EA and GAs do not depend on EI0; whatever does, needs its value.
 */
export const stiffnessBasis = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('absolute') }),
  z.object({ kind: z.literal('relative'), EI0: z.number().finite().positive().optional() }),
]);

/** Characters of a combination's name, at most. */
export const longestName = 24;

/** A factored sum of load cases. `source`: publication, edition, section or equation the factors come from. */
export const combination = z.object({
  id: z.string().min(1).max(longestName),
  purpose: z.enum(['strength', 'service']),
  factors: z.record(z.string(), z.number().finite()),
  source: z.string().max(200).optional(),
});

/** A displacement asked for by its own virtual-work line, with its limit (length, positive) where there is one. */
export const displacementAsk = z.object({
  member: z.string(),
  at: z.number().finite(),
  direction: z.enum(['x', 'y', 'across', 'rotation']),
  limit: z.object({ value: z.number().finite().positive(), source: z.string().max(200) }).optional(),
});

export const limits = { joints: 2_000, members: 2_000, cases: 64, combinations: 512 } as const;

export const analysis = z.object({
  form: z.literal(analysisForm),
  units: unitSet,
  title: z.string().max(120).default(''),
  basis: stiffnessBasis,
  joints: z.array(joint).min(2).max(limits.joints),
  members: z.array(member).min(1).max(limits.members),
  cases: z.array(loadCase).max(limits.cases),
  combinations: z.array(combination).max(limits.combinations).default([]),
  /** The engineer's choice of redundants; absent: the proposed set. */
  redundants: z.array(quantity).optional(),
  displacements: z.array(displacementAsk).max(64).default([]),
});

export type UnitSet = z.infer<typeof unitSet>;
export type Combination = z.infer<typeof combination>;
export type DisplacementAsk = z.infer<typeof displacementAsk>;
export type Analysis = z.infer<typeof analysis>;
/** What a caller may write: defaults left out. */
export type AnalysisInput = z.input<typeof analysis>;
