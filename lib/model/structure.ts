import { z } from 'zod';

const positive = z.number().finite().positive();

/** free, held, or an elastic spring with its stiffness (force per length; force × length per radian for `turn`). */
export const restraint = z.union([z.literal('free'), z.literal('held'), z.object({ spring: positive })]);

/**
 * A support, in axes turned counter-clockwise by `angle` degrees from the global ones.
 * fixed: all held. pinned: x and y held. roller: y held. guided: one translation and turn held.
 */
export const support = z.object({
  angle: z.number().finite().default(0),
  x: restraint,
  y: restraint,
  turn: restraint,
});

export const joint = z.object({
  id: z.string().min(1).max(8),
  x: z.number().finite(),
  y: z.number().finite(),
  support: support.optional(),
});

/** EI: force × length² (or a multiple of EI0). EA, GAs: force; absent means it neither stretches nor shears. */
const stiffness = { EI: positive, EA: positive.optional(), GAs: positive.optional() };

export const release = z.enum(['moment', 'shear', 'axial']);

export const member = z.object({
  id: z.string().min(1).max(17),
  start: z.string(),
  end: z.string(),
  ...stiffness,
  /** Steps of stiffness: from `from` (along the member, from its start) to the next step or the end. */
  steps: z.array(z.object({ from: positive, ...stiffness })).optional(),
  releases: z.object({ start: z.array(release).default([]), end: z.array(release).default([]) }).optional(),
  /** Coefficient of thermal expansion, per degree of the unit set (°F or K). */
  alpha: positive.optional(),
  /** Depth of the section, for a temperature difference between its faces. Length. */
  depth: positive.optional(),
  /** Own weight, force per length. */
  weight: positive.optional(),
  /** What the section is and who says so, for print only: "W18x35, EI0". */
  section: z.string().max(120).optional(),
});

export type Restraint = z.infer<typeof restraint>;
export type Support = z.infer<typeof support>;
export type Joint = z.infer<typeof joint>;
export type Member = z.infer<typeof member>;
export type Release = z.infer<typeof release>;
