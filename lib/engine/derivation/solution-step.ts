import { deriveCompatibility } from './compatibility-step';
import { type Context, redundantSymbol } from './context';
import { dimensionOf, dimensions } from './dimensions';
import { type Elimination, eliminate } from './elimination';
import { negative, quotient, sum, type Value } from './expression';
import { type Relation, relate } from './relation';
import { inCase } from './symbol-name';

/** Step 10: the redundants. One by one division, several by elimination, many by the table of results. */
export interface SolutionStep {
  kind: 'solution';
  single: Relation[];
  elimination?: Elimination;
  /** Per case, in the order of the redundants. */
  values: { id: string; X: Value[] }[];
}

/** Elimination is written out up to here. */
const most = 12;

export function deriveSolution(ctx: Context): SolutionStep {
  if (ctx.solved) return ctx.solved;
  const { solution, figures, analysis } = ctx;
  const values = analysis.cases.map(({ id }) => ({
    id,
    X: solution.redundants.map((q, i): Value => {
      const moment = dimensionOf(q).length === 1;
      return {
        kind: 'value',
        symbol: inCase(redundantSymbol(i), id),
        value: solution.X[id]?.[i] ?? Number.NaN,
        dimension: moment ? dimensions.moment : dimensions.force,
        decimals: moment ? figures.redundantMoment : figures.redundantForce,
      };
    }),
  }));
  const n = solution.redundants.length;
  const open = solution.determinacy.openAxial.length > 0;
  return {
    kind: 'solution',
    single: n === 1 && !open ? singleLines(ctx, values) : [],
    elimination: n > 1 && n <= most && !open ? eliminate(ctx, values) : undefined,
    values,
  };
}

function singleLines(ctx: Context, values: SolutionStep['values']): Relation[] {
  const { matrix, cases } = deriveCompatibility(ctx);
  const f = matrix[0]?.[0];
  if (!f) return [];
  return cases.flatMap(({ id, gaps, rightSides }) => {
    const [gap] = gaps;
    const [right] = rightSides;
    const X = values.find((v) => v.id === id)?.X[0];
    if (!gap || !right || !X?.symbol) return [];
    const moved = right.value === 0 ? negative(quotient(gap, f)) : quotient(sum(right, negative(gap)), f);
    const line = relate(X.symbol, moved, X, X.value);
    return [{ ...line, boxed: true }];
  });
}
