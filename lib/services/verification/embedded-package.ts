import { z } from 'zod';

export const packageFileName = 'calculations.json';
export const packageForm = 'fairhand.package/1';

/** What rides inside a package: the inputs and results of every sheet, to be solved again by whoever doubts them. */
export const embeddedPackage = z.object({
  form: z.literal(packageForm),
  job: z.object({ number: z.string().max(40), title: z.string().max(200) }),
  submittal: z.number().int(),
  sheets: z
    .array(
      z.object({
        sheet: z.string().max(20),
        title: z.string().max(200),
        revision: z.number().int(),
        digest: z.string().max(64),
        engine: z.string().max(20),
        inputs: z.unknown(),
        results: z.unknown(),
      }),
    )
    .max(500),
});

export type EmbeddedPackage = z.infer<typeof embeddedPackage>;
export type EmbeddedSheet = EmbeddedPackage['sheets'][number];
