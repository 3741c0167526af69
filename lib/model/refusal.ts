import { z } from 'zod';

/** Where in the model something is wrong. `path` is the JSON path of the form ("members.2.EI"). */
export const place = z.object({
  path: z.string().optional(),
  joint: z.string().optional(),
  member: z.string().optional(),
  case: z.string().optional(),
  load: z.number().int().optional(),
});

/** A small motion that costs no force: displacement (x, y) of every joint and rotation of every member that moves. */
export const mechanism = z.object({
  joints: z.record(z.string(), z.object({ x: z.number(), y: z.number() })),
  members: z.record(z.string(), z.object({ rotation: z.number() })),
  /** Rigid pieces that move: their members, and the centre they turn about (absent: they slide). */
  pieces: z.array(
    z.object({
      members: z.array(z.string()),
      centre: z.object({ x: z.number(), y: z.number(), joint: z.string().optional() }).optional(),
      rotation: z.number(),
      slide: z.object({ x: z.number(), y: z.number() }).optional(),
    }),
  ),
});

/** Why a model is not solved: a code for programs, a sentence for people, the place, and the motion when it moves. */
export const refusal = z.object({
  code: z.string(),
  message: z.string(),
  place,
  mechanism: mechanism.optional(),
});

export type Place = z.infer<typeof place>;
export type Mechanism = z.infer<typeof mechanism>;
export type Refusal = z.infer<typeof refusal>;
