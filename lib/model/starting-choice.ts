import { z } from 'zod';

const size = z.string().trim().max(200);
const base = z.enum(['fixed', 'pinned']);

/** How the ends of a single span are held. */
export const spanEnds = z.enum(['propped', 'fixed', 'simple', 'overhang']);

/** What each starting sheet asks for before it is made; sizes are texts, read like any other quantity of the sheet. */
export const startingChoice = z.discriminatedUnion('start', [
  z.object({ start: z.literal('single'), ends: spanEnds }),
  z.object({ start: z.literal('beam') }),
  z.object({ start: z.literal('portal') }),
  z.object({ start: z.literal('gable'), span: size, eaves: size, ridge: size, bases: base }),
  z.object({
    start: z.literal('knee'),
    height: size,
    span: size,
    bases: base,
    far: z.enum(['roller', 'pinned', 'fixed']),
  }),
  z.object({ start: z.literal('storeys'), bays: size, heights: size, bases: base }),
  z.object({ start: z.literal('frame') }),
]);

export type StartingChoice = z.infer<typeof startingChoice>;
export type StartName = StartingChoice['start'];
export type SpanEnds = z.infer<typeof spanEnds>;
