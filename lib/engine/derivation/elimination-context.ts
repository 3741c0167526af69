import type { Context } from './context';
import { deriveSolution } from './solution-step';

/** Rounds of asking for figures; each round can only ask for more. */
const most = 8;

/** The gaps and coefficients are printed with the figures that the elimination of step 10 asks of them. */
export function withEnoughFigures(ctx: Context): Context {
  let enough = ctx;
  for (let round = 0; round < most; round++) {
    const solved = deriveSolution(enough);
    const { elimination } = solved;
    const { figures } = enough;
    if (!elimination) return { ...enough, solved };
    const given = elimination.rows.filter((r) => !r.less && !r.back);
    const gap = Math.max(figures.gap, ...given.map((r) => r.decimals));
    const settled = gap === figures.gap;
    if (settled && elimination.works) return { ...enough, solved };
    const flexibility = settled ? figures.flexibility + 1 : figures.flexibility;
    enough = { ...enough, figures: { ...figures, gap, flexibility } };
  }
  return enough;
}
