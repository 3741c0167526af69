import type { Ink } from './ink';

/**
 * A slice of a sheet that no page break divides. Its ink is placed from the left edge of the text (x) and its own top
 * (y); what stands in the margin has negative x.
 */
export type Strip = {
  /** The block it belongs to. */
  readonly block: string;
  readonly height: number;
  /** Space above it, dropped at the head of a page. */
  readonly before: number;
  readonly ink: readonly Ink[];
  /** No page break between this strip and the next. */
  readonly keep: boolean;
  /** How far what stands in the margin reaches down from the strip's top. */
  readonly noteHeight: number;
  /** Set on headings: the strip that says the section goes on, at the head of the next page. */
  readonly again?: Strip;
  /** Set on rows of a table but the first: the head repeated above them at the head of a page. */
  readonly head?: Strip;
};
