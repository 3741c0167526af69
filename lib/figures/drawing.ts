import { z } from 'zod';

/**
 * A figure as plain shapes in page units (points, 1/72 in; x right, y down, origin top left). It knows neither SVG nor
 * PDF; templates draw it on either. Tones are names: in grey print dashes, hatching and arrowheads carry the meaning.
 */
export const tone = z.enum(['ink', 'ink2', 'ink3', 'pen', 'ochre', 'tick', 'grid', 'wash', 'paper']);

/** What a shape stands for, so that a screen can light it: a member, joint, load or support of the model. */
export const shapeRef = z.object({
  of: z.enum(['member', 'joint', 'load', 'support', 'redundant']),
  id: z.string(),
});

const stroke = {
  stroke: tone.optional(),
  width: z.number().optional(),
  dash: z.array(z.number()).optional(),
  fill: tone.optional(),
  ref: shapeRef.optional(),
};

export const lineShape = z.object({
  kind: z.literal('line'),
  x1: z.number(),
  y1: z.number(),
  x2: z.number(),
  y2: z.number(),
  ...stroke,
});
/** An open or closed run of points [x, y]. */
export const polyShape = z.object({
  kind: z.literal('poly'),
  points: z.array(z.tuple([z.number(), z.number()])).min(2),
  closed: z.boolean(),
  ...stroke,
});
/** A path of M, L, C (cubic) and Z commands with absolute coordinates, as in SVG 1.1 §8.3. */
export const pathShape = z.object({ kind: z.literal('path'), d: z.string(), ...stroke });
export const circleShape = z.object({
  kind: z.literal('circle'),
  cx: z.number(),
  cy: z.number(),
  r: z.number(),
  ...stroke,
});
/** A label: rich text (`$TeX$` for mathematics). (x, y) is the anchor on the baseline. */
export const labelShape = z.object({
  kind: z.literal('label'),
  x: z.number(),
  y: z.number(),
  text: z.string(),
  size: z.number(),
  anchor: z.enum(['start', 'middle', 'end']),
  /** Degrees counter-clockwise; dimensions along a column use 90. */
  turn: z.number().optional(),
  tone: tone.optional(),
  /** White ground behind the label, so that a line beneath it stays legible. */
  halo: z.boolean().optional(),
  ref: shapeRef.optional(),
});

export const shape = z.discriminatedUnion('kind', [lineShape, polyShape, pathShape, circleShape, labelShape]);

export const drawingSchema = z.object({
  width: z.number().positive(),
  height: z.number().positive(),
  shapes: z.array(shape),
  /** The drawing in words, for people who do not see it. */
  alt: z.string(),
});

export type Tone = z.infer<typeof tone>;
export type ShapeRef = z.infer<typeof shapeRef>;
export type Shape = z.infer<typeof shape>;
export type LabelShape = z.infer<typeof labelShape>;
export type Drawing = z.infer<typeof drawingSchema>;
