import { z } from 'zod';
import { nature } from '@/lib/model/load';

/** How far the publication itself was read. */
const evidence = z.enum(['seen', 'seen at second hand', 'from memory']);

const purpose = z.enum(['strength', 'service']);

/** A factor on all cases of a nature. Seismic cases are vertical where their category says so, otherwise horizontal. */
const term = z.object({
  factor: z.number(),
  of: nature,
  category: z.enum(['horizontal', 'vertical']).optional(),
  /** Without this load the rule does not apply. */
  principal: z.boolean().default(false),
  /** Never left out while the sheet has such a load. */
  always: z.boolean().default(false),
});

/** One term, or one of several that never act together. */
const alternatives = z.object({ one: z.array(term).min(2), principal: z.boolean().default(false) });

const rule = z.object({ id: z.string(), purpose, source: z.string(), evidence });

const sums = z.object({
  kind: z.literal('sums'),
  rules: z.array(rule.extend({ terms: z.array(z.union([alternatives, term])) })),
});

/** A factor, times ψ0, ψ1 or ψ2 of the load's category where `psi` is given. */
const variable = z.object({
  factor: z.number(),
  psi: z.union([z.literal(0), z.literal(1), z.literal(2)]).optional(),
});

const partialFactors = z.object({
  kind: z.literal('partial-factors'),
  psi: z.record(z.string(), z.tuple([z.number(), z.number(), z.number()])),
  psiSource: z.string(),
  psiEvidence: evidence,
  rules: z.array(
    rule.extend({ permanent: z.array(z.number()).min(1), leading: variable, accompanying: variable }),
  ),
});

const head = z.object({
  form: z.literal('fairhand.combination-set/1'),
  key: z.string(),
  title: z.string(),
  edition: z.string(),
  notes: z.array(z.string()),
});

/** A published set of load combinations, as data. */
export const combinationSet = z.discriminatedUnion('kind', [
  head.extend(sums.shape),
  head.extend(partialFactors.shape),
]);

export type CombinationSet = z.infer<typeof combinationSet>;
export type SumSet = Extract<CombinationSet, { kind: 'sums' }>;
export type PartialFactorSet = Extract<CombinationSet, { kind: 'partial-factors' }>;
export type Term = z.infer<typeof term>;
