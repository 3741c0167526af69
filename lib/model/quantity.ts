import { z } from 'zod';

/**
 * A force quantity of a structure that can be named, released or asked for.
 * reaction: component in the support's own axes (`x`, `y` turned by the support's angle; `turn` is the fixing moment).
 * moment: bending moment at one end of a member. axial: axial force at the start of a member.
 */
export const quantity = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('reaction'), joint: z.string(), component: z.enum(['x', 'y', 'turn']) }),
  z.object({ kind: z.literal('axial'), member: z.string() }),
  z.object({ kind: z.literal('moment'), member: z.string(), end: z.enum(['start', 'end']) }),
]);

export type Quantity = z.infer<typeof quantity>;

/** One string per quantity, equal exactly when the quantities are: "reaction:A:x", "axial:BC", "moment:BC:start". */
export function quantityKey(q: Quantity): string {
  switch (q.kind) {
    case 'reaction':
      return `reaction:${q.joint}:${q.component}`;
    case 'axial':
      return `axial:${q.member}`;
    case 'moment':
      return `moment:${q.member}:${q.end}`;
  }
}
