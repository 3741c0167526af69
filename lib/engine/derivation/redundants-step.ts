import type { Quantity } from '@/lib/model/quantity';
import { type Context, redundantSymbol } from './context';
import { dimensionOf } from './dimensions';
import { endForcesOf } from './end-forces';
import type { Value } from './expression';
import { cellsInstead } from './not-written';
import { most, oncePerSymbol, type RefusedSets, refusedExchanges } from './refused-exchanges';
import { type SymbolName, symbolKey } from './symbol-name';

/** Step 4: what may be released, what may not, and what is. */
export interface RedundantsStep {
  kind: 'redundants';
  /** Quantities with the same value whatever the redundants; zero in every case ones apart. */
  fixed: { symbol: SymbolName; quantity: Quantity; values: Value[] }[];
  fixedZero: { symbol: SymbolName; quantity: Quantity }[];
  /** Sets that differ from the chosen one in one place and leave a mechanism, by what moves. */
  refused: RefusedSets[];
  redundants: { symbol: SymbolName; is: SymbolName; quantity: Quantity }[];
  /** Forces that may be released, each once, where there is one redundant. */
  good: SymbolName[];
  /** Pairs of redundants that act on nothing in common: f_ij = 0. */
  uncoupled: number;
  condition: number;
  proposed: boolean;
}

export function deriveRedundants(ctx: Context): RedundantsStep {
  const { solution, names, analysis } = ctx;
  const fixed = oncePerSymbol(ctx).map(({ quantity, values }) => {
    const symbol = names.quantity(quantity);
    const decimals = dimensionOf(quantity).length === 1 ? ctx.figures.moment : ctx.figures.force;
    const list = analysis.cases.map(
      (c): Value => ({
        kind: 'value',
        symbol: { ...symbol, super: c.id },
        value: values[c.id] ?? Number.NaN,
        dimension: dimensionOf(quantity),
        decimals,
      }),
    );
    return { symbol, quantity, values: list };
  });
  const largest = Math.max(...fixed.flatMap((f) => f.values.map((v) => Math.abs(v.value))), 0);
  const isZero = (f: (typeof fixed)[number]) => f.values.every((v) => Math.abs(v.value) <= 1e-9 * largest);
  const n = solution.redundants.length;
  const coupled = solution.work.flexibility.filter((f) => f.i !== f.j && f.total !== 0).length;
  return {
    kind: 'redundants',
    fixed: fixed.filter((f) => !isZero(f)),
    fixedZero: fixed.filter(isZero).map(({ symbol, quantity }) => ({ symbol, quantity })),
    refused: refusedExchanges(ctx),
    redundants: solution.redundants.map((quantity, i) => ({
      symbol: redundantSymbol(i),
      is: names.quantity(quantity),
      quantity,
    })),
    good: n === 1 && analysis.members.length <= most.members ? alternatives(ctx) : [],
    uncoupled: cellsInstead(ctx) ? 0 : (n * (n - 1)) / 2 - coupled,
    condition: solution.condition,
    proposed: solution.proposed,
  };
}

/** Forces that one redundant brings with it: any of them could be released in its place. */
function alternatives(ctx: Context): SymbolName[] {
  const [unit] = ctx.solution.primary.units;
  if (!unit) return [];
  const found = [
    ...unit.reactions.filter((r) => r.value !== 0).map((r) => ctx.names.quantity(r.quantity)),
    ...endForcesOf(ctx, unit.members).flatMap((e) => [
      ...(e.M === 0 ? [] : [ctx.names.moment(e.member, e.end)]),
      ...(e.N === 0 || e.end === 'end' ? [] : [ctx.names.axial(e.member, 'start')]),
    ]),
  ];
  return [...new Map(found.map((s) => [symbolKey(s), s])).values()];
}
