import type { StaticsLine, StaticsTerm } from '../statics/statics-line';
import type { Context } from './context';
import { loadTerms, reactionTerms, type Side } from './side-terms';

type Sum = Extract<StaticsLine, { kind: 'equation' }>['sum'];

/** Every force on the whole structure under a case that counts in a sum: final reactions and loads. */
export function wholeTerms(ctx: Context, id: string, sum: Sum): StaticsTerm[] {
  const side: Side = {
    joints: new Set(ctx.analysis.joints.map((j) => j.id)),
    members: new Set(ctx.placed.keys()),
  };
  const reactions = ctx.solution.cases[id]?.reactions ?? [];
  const terms = [...reactionTerms(ctx, reactions, side, sum, false), ...loadTerms(ctx, id, side, sum)];
  return terms.filter((t) => Math.abs(t.coefficient) > 1e-9 && t.value !== 0);
}
