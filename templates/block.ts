import { z } from 'zod';
import { drawingSchema } from '@/lib/figures/drawing';

/**
 * What a calc sheet says, free of any looks: the one form that the screen, the paper and a frozen revision share.
 *
 * Rich text is plain text with `$TeX$` for mathematics and `**bold**` for emphasis; a literal dollar sign is `\$`.
 * TeX uses only the macros of lib/typeset/macros.ts. `id` is the line a mark or comment is pinned to ("7.5"),
 * stable as long as the calculation keeps its shape.
 */
export const richText = z.string();

const line = {
  /** The line's own number, as printed outside the margin rule: "7.5". Unique on the sheet. */
  id: z.string().min(1),
  /** Where a formula, factor, limit or input comes from; printed under the number, outside the rule. */
  source: richText.optional(),
};

export const headingBlock = z.object({
  kind: z.literal('heading'),
  id: z.string().min(1),
  text: richText,
});

export const paragraphBlock = z.object({ kind: z.literal('paragraph'), ...line, text: richText });

/** One row of an equation group: `lhs = chain[0] = chain[1] = …`; the last member is the result. */
export const equationRow = z.object({
  lhs: z.string(),
  /** Members after the equals signs, TeX: formula, substitution with units, result with unit. */
  chain: z.array(z.string()),
  /** Box the result: the value goes on to the next sheet or step. */
  boxed: z.boolean().optional(),
  /** A few words after the result: "(to the left)". */
  note: richText.optional(),
});

export const equationsBlock = z.object({
  kind: z.literal('equations'),
  ...line,
  /** A sentence that leads in, when there is one. */
  text: richText.optional(),
  rows: z.array(equationRow).min(1),
});

export const figureBlock = z.object({
  kind: z.literal('figure'),
  ...line,
  caption: richText,
  /** Drawings set side by side on one row; widths share the text width in proportion to theirs. */
  drawings: z.array(drawingSchema).min(1),
  /** The same drawings laid out for a column of a phone; without them the wide ones are shrunk there. */
  narrow: z.array(drawingSchema).optional(),
});

export const tableColumn = z.object({
  head: richText,
  /** TeX of the unit, repeated under the head on each page. */
  unit: z.string().optional(),
  align: z.enum(['left', 'right', 'centre']),
});

export const tableRow = z.object({
  /** Rich text per column; numbers are `$TeX$`. An empty string is an empty cell. */
  cells: z.array(richText),
  /** total: bold under a rule. group: first row of a group that is not split from its follower. */
  emphasis: z.enum(['total', 'group', 'governing']).optional(),
});

export const tableBlock = z.object({
  kind: z.literal('table'),
  ...line,
  caption: richText.optional(),
  columns: z.array(tableColumn).min(1),
  rows: z.array(tableRow),
  note: richText.optional(),
});

/** A caution or an assumption set apart from the run of the calculation. */
export const cautionBlock = z.object({ kind: z.literal('caution'), ...line, text: richText });

export const block = z.discriminatedUnion('kind', [
  headingBlock,
  paragraphBlock,
  equationsBlock,
  figureBlock,
  tableBlock,
  cautionBlock,
]);

export const blocks = z.array(block);

export type Block = z.infer<typeof block>;
export type HeadingBlock = z.infer<typeof headingBlock>;
export type ParagraphBlock = z.infer<typeof paragraphBlock>;
export type EquationRow = z.infer<typeof equationRow>;
export type EquationsBlock = z.infer<typeof equationsBlock>;
export type FigureBlock = z.infer<typeof figureBlock>;
export type TableColumn = z.infer<typeof tableColumn>;
export type TableRow = z.infer<typeof tableRow>;
export type TableBlock = z.infer<typeof tableBlock>;
export type CautionBlock = z.infer<typeof cautionBlock>;
