import { z } from 'zod';
import { unitSet } from './analysis';
import { nature } from './load';
import { quantity } from './quantity';

/**
 * A calc sheet as it is being typed. Every quantity is the text the person wrote, so that nothing typed is ever lost or
 * changed; readDraft turns it into an Analysis or says what is wrong at which field.
 */
export const draftForm = 'fairhand.draft/1';

const text = z.string().max(200, 'That is longer than 200 characters.');
const name = z.string().max(17);

export const draftStiffness = z.object({
  /** Multiple of EI0 when the sheet is relative. */
  k: text.default(''),
  /** Blank E and G are the sheet's own. */
  E: text.default(''),
  I: text.default(''),
  /** Given: the member stretches. */
  A: text.default(''),
  G: text.default(''),
  /** Shear area; given: the member shears. */
  As: text.default(''),
  weight: text.default(''),
  depth: text.default(''),
  section: z.string().max(120).default(''),
});

export const supportKind = z.enum(['free', 'fixed', 'pinned', 'roller', 'guided', 'spring']);

export const draftSupport = z.object({
  kind: supportKind,
  angle: text.default(''),
  springX: text.default(''),
  springY: text.default(''),
  springTurn: text.default(''),
});

export const draftSpan = z.object({ length: text, stiffness: draftStiffness });
export const draftJoint = z.object({ id: z.string().max(8), x: text, y: text, support: draftSupport });
export const draftMember = z.object({
  start: z.string().max(8),
  end: z.string().max(8),
  startHinge: z.boolean().default(false),
  endHinge: z.boolean().default(false),
  stiffness: draftStiffness,
});

export const draftGeometry = z.discriminatedUnion('shape', [
  /** Spans from left to right; one support more than spans; a free end is an overhang. */
  z.object({
    shape: z.literal('beam'),
    spans: z
      .array(draftSpan)
      .max(200, 'A sheet takes at most 200 spans. Split the structure into several sheets.'),
    supports: z.array(draftSupport).max(201),
  }),
  /** Two columns and a beam; the heights may differ, then the beam slopes. */
  z.object({
    shape: z.literal('portal'),
    span: text,
    leftHeight: text,
    rightHeight: text,
    leftBase: draftSupport,
    rightBase: draftSupport,
    leftColumn: draftStiffness,
    beam: draftStiffness,
    rightColumn: draftStiffness,
  }),
  z.object({
    shape: z.literal('frame'),
    joints: z
      .array(draftJoint)
      .max(2_000, 'A sheet takes at most 2,000 joints. Split the structure into several sheets.'),
    members: z
      .array(draftMember)
      .max(2_000, 'A sheet takes at most 2,000 members. Split the structure into several sheets.'),
  }),
]);

export const draftLoadKind = z.enum([
  'uniform',
  'varying',
  'point',
  'couple',
  'joint',
  'self-weight',
  'temperature',
  'misfit',
  'settlement',
]);

export const draftDirection = z.enum([
  'down',
  'up',
  'right',
  'left',
  'across',
  'along',
  'counter-clockwise',
  'clockwise',
]);

/**
 * One row of the load table. `first` and `second` are: intensities at both ends (varying), the force (point, joint),
 * the couple, temperature rise and difference, or a movement; `from` and `to` are measured along the member.
 */
export const draftLoad = z.object({
  kind: draftLoadKind,
  on: name.default(''),
  direction: draftDirection,
  per: z.enum(['length', 'projection']).default('length'),
  first: text.default(''),
  second: text.default(''),
  from: text.default(''),
  to: text.default(''),
  source: text.default(''),
});

export const draftCase = z.object({
  id: z.string().max(8),
  title: z.string().max(80),
  nature,
  category: z.string().max(16).default(''),
  reversible: z.boolean().default(false),
  loads: z.array(draftLoad).max(5_000, 'A case takes at most 5,000 loads.'),
});

/** A combination of the office's own, written as a sum: "1.2 D + 1.6 L". */
export const draftCombination = z.object({
  id: z.string().max(24),
  purpose: z.enum(['strength', 'service']),
  sum: text,
  source: text.default(''),
});

export const draftAsk = z.object({
  member: name,
  at: text,
  direction: z.enum(['x', 'y', 'across', 'rotation']),
  limit: text.default(''),
  source: text.default(''),
});

export const draft = z.object({
  form: z.literal(draftForm),
  units: unitSet,
  title: z.string().max(120),
  /** Assumptions and references in the engineer's own words, printed in step 1. */
  basis: z.string().max(4_000, 'The basis is longer than 4,000 characters.').default(''),
  stiffness: z.object({
    kind: z.enum(['absolute', 'relative']),
    EI0: text.default(''),
    E: text.default(''),
    G: text.default(''),
    alpha: text.default(''),
  }),
  geometry: draftGeometry,
  cases: z.array(draftCase).max(64, 'A sheet takes at most 64 cases.'),
  /** Key of a published set of combinations, or blank; the office's own come after it. */
  combinationSet: z.string().max(40).default(''),
  /** Whether the live load acts on the spans in turn, in the arrangements that govern. */
  patterns: z.boolean().default(false),
  combinations: z.array(draftCombination).max(256, 'A sheet takes at most 256 sums of its own.').default([]),
  redundants: z.array(quantity).max(2_000).optional(),
  displacements: z.array(draftAsk).max(64).default([]),
});

export type Draft = z.infer<typeof draft>;
export type DraftGeometry = z.infer<typeof draftGeometry>;
export type DraftStiffness = z.infer<typeof draftStiffness>;
export type DraftSupport = z.infer<typeof draftSupport>;
export type DraftSpan = z.infer<typeof draftSpan>;
export type DraftJoint = z.infer<typeof draftJoint>;
export type DraftMember = z.infer<typeof draftMember>;
export type DraftLoad = z.infer<typeof draftLoad>;
export type DraftLoadKind = z.infer<typeof draftLoadKind>;
export type DraftCase = z.infer<typeof draftCase>;
export type DraftAsk = z.infer<typeof draftAsk>;
