import type { Context } from './context';
import { deriveSolution } from './solution-step';

/** The gaps are printed with the figures that the elimination of step 10 asks of its right sides. */
export function withEnoughFigures(ctx: Context): Context {
  const rows = deriveSolution(ctx).elimination?.rows ?? [];
  const given = rows.filter((r) => !r.less && !r.back);
  const gap = Math.max(ctx.figures.gap, ...given.map((r) => r.decimals));
  return { ...ctx, figures: { ...ctx.figures, gap } };
}
