import { z } from 'zod';

const finite = z.number().finite();
const note = {
  /** Where the value comes from: clause, table, drawing, or another sheet. */
  source: z.string().max(200).optional(),
};

/**
 * Directions. x, y: global (right, up). along: from start to end of the member. across: to the left when walking from
 * start to end, that is upward on a beam drawn left to right. A downward load on a beam has a negative value.
 */
export const direction = z.enum(['x', 'y', 'along', 'across']);

/** Point force; `at` is measured from the start of the member. Units: force, length. */
export const pointLoad = z.object({
  kind: z.literal('point'),
  member: z.string(),
  at: finite,
  direction,
  value: finite,
  ...note,
});

/** Couple on a member, counter-clockwise positive. Units: force × length. */
export const coupleLoad = z.object({
  kind: z.literal('couple'),
  member: z.string(),
  at: finite,
  value: finite,
  ...note,
});

/**
 * Linearly varying load from `w1` at `from` to `w2` at `to`, both measured along the member from its start.
 * per length: force per length of member. per projection: force per length of plan (direction y) or of elevation
 * (direction x), as snow and wind are often given. Omitted ends are the member's own.
 */
export const distributedLoad = z.object({
  kind: z.literal('distributed'),
  member: z.string(),
  from: finite.optional(),
  to: finite.optional(),
  direction,
  per: z.enum(['length', 'projection']).default('length'),
  w1: finite,
  w2: finite,
  ...note,
});

/** Forces (global) and couple (counter-clockwise) on a joint. */
export const jointLoad = z.object({
  kind: z.literal('joint'),
  joint: z.string(),
  x: finite.default(0),
  y: finite.default(0),
  couple: finite.default(0),
  ...note,
});

/** Own weight, downward, of every member that states a weight per length (or of those named). */
export const selfWeight = z.object({
  kind: z.literal('self-weight'),
  members: z.array(z.string()).optional(),
  ...note,
});

/**
 * Temperature. rise: uniform change. difference: left face less right face, walking from start to end; on a beam drawn
 * left to right the top less the bottom. Needs the member's `alpha`, and `depth` for a difference.
 */
export const temperatureLoad = z.object({
  kind: z.literal('temperature'),
  member: z.string(),
  rise: finite.default(0),
  difference: finite.default(0),
  ...note,
});

/** Lack of fit: the member was made too long by `value` (negative: too short). */
export const misfitLoad = z.object({
  kind: z.literal('misfit'),
  member: z.string(),
  value: finite,
  ...note,
});

/** Prescribed movement of a support in its own axes, positive the way the reaction component is positive. */
export const settlementLoad = z.object({
  kind: z.literal('settlement'),
  joint: z.string(),
  component: z.enum(['x', 'y', 'turn']),
  value: finite,
  ...note,
});

export const load = z.discriminatedUnion('kind', [
  pointLoad,
  coupleLoad,
  distributedLoad,
  jointLoad,
  selfWeight,
  temperatureLoad,
  misfitLoad,
  settlementLoad,
]);

export const nature = z.enum([
  'dead',
  'live',
  'roof-live',
  'snow',
  'rain',
  'wind',
  'seismic',
  'soil',
  'temperature',
  'settlement',
  'other',
]);

/** A load case: loads of one nature that come and go together. `id` is its symbol on paper: D, L, S, W. */
export const loadCase = z.object({
  id: z.string().min(1).max(8),
  title: z.string().max(80),
  nature,
  /** EN 1990 category that ψ is read from (A to H, snow-low, snow-high, wind, temperature). */
  category: z.string().max(16).optional(),
  /** Acts in either sense: combinations take it with both signs. */
  reversible: z.boolean().default(false),
  loads: z.array(load).max(5_000),
});

export type Direction = z.infer<typeof direction>;
export type Load = z.infer<typeof load>;
export type Nature = z.infer<typeof nature>;
export type LoadCase = z.infer<typeof loadCase>;
