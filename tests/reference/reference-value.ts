import { z } from 'zod';
import { quantity } from '@/lib/model/quantity';

const polynomial = z.array(z.object({ from: z.number(), to: z.number(), c: z.array(z.number()) }));

/** Published values are often magnitudes: `magnitude` compares without sign. `sign` turns the engine's sense into theirs. */
const signed = { sign: z.union([z.literal(1), z.literal(-1)]), magnitude: z.boolean().default(false) };

const section = { member: z.string(), at: z.number() };

/** What is asked of the engine. */
export const ask = z.discriminatedUnion('of', [
  z.object({ of: z.literal('M'), ...section, ...signed }),
  z.object({ of: z.literal('N'), ...section, ...signed }),
  z.object({
    of: z.literal('reaction'),
    joint: z.string(),
    component: z.enum(['x', 'y', 'turn']),
    ...signed,
  }),
  z.object({ of: z.literal('rotation'), joint: z.string(), ...signed }),
  z.object({ of: z.literal('displacement'), joint: z.string(), component: z.enum(['x', 'y']), ...signed }),
  z.object({ of: z.literal('deflection'), ...section, direction: z.enum(['across', 'rotation']), ...signed }),
  z.object({
    of: z.literal('extreme'),
    diagram: z.enum(['M', 'across']),
    member: z.string(),
    bound: z.enum(['max', 'min']),
    ...signed,
  }),
  z.object({ of: z.literal('influence'), released: quantity, ...section, ...signed }),
  z.object({
    of: z.literal('influence-extreme'),
    released: quantity,
    member: z.string(),
    bound: z.enum(['max', 'min']),
    ...signed,
  }),
  z.object({ of: z.literal('degree') }),
  z.object({
    of: z.literal('rank'),
    motion: z.enum(['slide', 'turn']),
    centre: z.object({ x: z.number(), y: z.number() }).optional(),
  }),
  z.object({ of: z.literal('product-integral'), f: polynomial, g: polynomial }),
  z.object({ of: z.literal('area'), f: polynomial }),
  z.object({ of: z.literal('centroid'), f: polynomial }),
  z.object({
    of: z.literal('combination'),
    set: z.string(),
    cases: z.array(z.object({ id: z.string(), nature: z.string() }).loose()),
    effects: z.record(z.string(), z.number()),
    sum: z.string(),
  }),
  z.object({
    of: z.literal('limit'),
    table: z.string(),
    row: z.string(),
    action: z.enum(['L', 'S or W', 'D+L']),
    length: z.number(),
    cantilever: z.boolean(),
  }),
]);

/**
 * One published value. `exact` is the value as a fraction or with roots, `value` its decimal. `evidence` says whether the
 * source was read, recalled, or the value derived in exact fractions where no source was looked up.
 */
export const referenceValue = z.object({
  id: z.string(),
  description: z.string(),
  source: z.string(),
  evidence: z.enum(['seen', 'from memory', 'derived']),
  formula: z.string(),
  structure: z.string().optional(),
  ask,
  quantity: z.string(),
  exact: z.string(),
  value: z.number(),
  unit: z.string(),
});

/** Structures are in the engine's own form; each is solved as it stands. */
export const group = z.object({
  title: z.string(),
  structures: z.record(z.string(), z.unknown()).optional(),
  values: z.array(referenceValue),
});

export type Ask = z.infer<typeof ask>;
export type ReferenceValue = z.infer<typeof referenceValue>;
