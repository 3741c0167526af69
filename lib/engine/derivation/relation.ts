import type { Dimension } from '@/lib/units/dimension';
import { type Expression, evaluate, type Value } from './expression';
import { fitFigures } from './precision';
import type { SymbolName } from './symbol-name';

/** One line: symbol = formula = figures put in = result. Values of the formula have the decimals the result needs. */
export interface Relation {
  symbol: SymbolName;
  formula: Expression;
  result: Value;
  /** The same result once more in a smaller unit: feet, then inches. */
  again?: Value;
  /** The result goes on to another sheet. */
  boxed?: boolean;
}

/** How a result is printed. */
export interface ResultFigures {
  dimension: Dimension;
  decimals: number;
  scale?: number;
}

/** Builds a line and gives its formula the figures it needs. The value is that of the formula unless stated. */
export function relate(
  symbol: SymbolName,
  formula: Expression,
  figures: ResultFigures,
  stated?: number,
): Relation {
  const value = stated ?? evaluate(formula);
  return {
    symbol,
    formula: fitFigures(formula, value, figures),
    result: { kind: 'value', symbol, value, ...figures },
  };
}
