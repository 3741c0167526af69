import type { Quantity } from '@/lib/model/quantity';
import { type Context, redundantSymbol } from './context';
import { flexibilityDimension, gapDimension } from './dimensions';
import { product, type Value } from './expression';
import { cellsInstead, type NotWritten } from './not-written';
import { type Relation, relate } from './relation';
import { referenceValue } from './structure-step';
import type { SymbolName } from './symbol-name';
import { flexibilitySymbol, gapSymbol } from './work-step';

/** Step 9: one equation for each redundant; the gaps stand as step 8 found them. */
export interface CompatibilityStep {
  kind: 'compatibility';
  redundants: { symbol: SymbolName; quantity: Quantity }[];
  /** EI0 f_ij, row by row; zero where two unit states act on nothing in common. */
  matrix: (Value | undefined)[][];
  cases: { id: string; gaps: Value[]; rightSides: Value[] }[];
  /** EI0 times the movements prescribed at the releases themselves. */
  movements: Relation[];
  /** Why the equations have no figures: matrix and cases are empty. */
  notWritten?: NotWritten;
}

export function deriveCompatibility(ctx: Context): CompatibilityStep {
  const { redundants, work } = ctx.solution;
  const { figures } = ctx;
  const named = redundants.map((quantity, i) => ({ symbol: redundantSymbol(i), quantity }));
  const notWritten = cellsInstead(ctx);
  if (notWritten)
    return { kind: 'compatibility', redundants: named, matrix: [], cases: [], movements: [], notWritten };
  const matrix = redundants.map(() => redundants.map((): Value | undefined => undefined));
  for (const { i, j, total } of work.flexibility) {
    const [qa, qb] = [redundants[i], redundants[j]];
    if (!qa || !qb) continue;
    const dimension = flexibilityDimension(qa, qb);
    const put = (r: number, c: number) => {
      const [row, symbol] = [matrix[r], flexibilitySymbol(r, c)];
      if (row) row[c] = { kind: 'value', symbol, value: total, dimension, decimals: figures.flexibility };
    };
    put(i, j);
    if (i !== j) put(j, i);
  }
  const gaps = new Map(work.gaps.map((g) => [`${g.case} ${g.i}`, g]));
  const cases = ctx.analysis.cases.map(({ id }) => {
    const of = (i: number) => {
      const gap = gaps.get(`${id} ${i}`);
      const q = redundants[i];
      if (!gap || !q) throw new Error(`case ${id} has no gap ${i + 1}`);
      const common = { kind: 'value', dimension: gapDimension(q), decimals: figures.gap } as const;
      const movement: SymbolName = { letter: 'Δ', sub: [`${i + 1}`], super: id, timesEI0: true };
      return {
        gap: { ...common, symbol: gapSymbol(i, id), value: gap.total },
        right: { ...common, symbol: movement, value: gap.rightSide },
      };
    };
    const rows = redundants.map((_, i) => of(i));
    return { id, gaps: rows.map((r) => r.gap), rightSides: rows.map((r) => r.right) };
  });
  return {
    kind: 'compatibility',
    redundants: named,
    matrix,
    cases,
    movements: cases.flatMap((c) => c.rightSides.flatMap((r) => movementLine(ctx, r))),
  };
}

function movementLine(ctx: Context, right: Value): Relation[] {
  const EI0 = ctx.solution.reference.value;
  if (right.value === 0 || EI0 === undefined || !right.symbol) return [];
  const dimension = { ...right.dimension, force: 0, length: right.dimension.length - 2 };
  const movement: Value = {
    kind: 'value',
    symbol: { ...right.symbol, timesEI0: undefined },
    value: right.value / EI0,
    dimension,
    decimals: 4,
  };
  return [relate(right.symbol, product(referenceValue(EI0), movement), right, right.value)];
}
