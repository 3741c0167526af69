import type { Dimension } from '@/lib/units/dimension';
import { roundTo } from './round-to';
import type { SymbolName } from './symbol-name';

/**
 * A formula as data: one tree gives the symbols, the figures put in for them and the value, so that the three cannot
 * disagree. A value carries the decimals it is printed with.
 */
export type Expression =
  | Value
  /** An exact rational number, printed as an integer or a fraction. */
  | { kind: 'number'; n: number; d: number }
  | { kind: 'sum'; terms: readonly Expression[] }
  | { kind: 'product'; factors: readonly Expression[] }
  | { kind: 'quotient'; over: Expression; under: Expression }
  | { kind: 'power'; base: Expression; exponent: number }
  | { kind: 'root'; of: Expression }
  | { kind: 'negative'; of: Expression };

/** A quantity in a formula. Without a symbol it is printed as a number in the symbolic form too. */
export interface Value {
  kind: 'value';
  symbol?: SymbolName;
  value: number;
  dimension: Dimension;
  decimals: number;
  /** Printed in a smaller unit, so many of which make a coherent one: 12 for inches, 1000 for millimetres. */
  scale?: number;
}

export const sum = (...terms: Expression[]): Expression =>
  terms.length === 1 && terms[0] ? terms[0] : { kind: 'sum', terms };
export const product = (...factors: Expression[]): Expression =>
  factors.length === 1 && factors[0] ? factors[0] : { kind: 'product', factors };
export const quotient = (over: Expression, under: Expression): Expression => ({
  kind: 'quotient',
  over,
  under,
});
export const power = (base: Expression, exponent: number): Expression => ({ kind: 'power', base, exponent });
export const root = (of: Expression): Expression => ({ kind: 'root', of });
export const negative = (of: Expression): Expression => ({ kind: 'negative', of });
export const number = (n: number, d = 1): Expression => ({ kind: 'number', n, d });

/** The value of a formula: at full precision, or worked from the figures it is printed with. */
export function evaluate(e: Expression, figures: 'full' | 'printed' = 'full'): number {
  const of = (x: Expression) => evaluate(x, figures);
  switch (e.kind) {
    case 'value':
      return figures === 'full' ? e.value : printedValue(e);
    case 'number':
      return e.n / e.d;
    case 'sum':
      return e.terms.reduce((total, t) => total + of(t), 0);
    case 'product':
      return e.factors.reduce((total, f) => total * of(f), 1);
    case 'quotient':
      return of(e.over) / of(e.under);
    case 'power':
      return of(e.base) ** e.exponent;
    case 'root':
      return Math.sqrt(of(e.of));
    case 'negative':
      return -of(e.of);
  }
}

/** What the print of a value says, in coherent units. */
export function printedValue({ value, decimals, scale = 1 }: Value): number {
  return roundTo(value * scale, decimals) / scale;
}

/** The same formula with every value passed through `change`. */
export function mapValues(e: Expression, change: (v: Value) => Value): Expression {
  const map = (x: Expression) => mapValues(x, change);
  switch (e.kind) {
    case 'value':
      return change(e);
    case 'number':
      return e;
    case 'sum':
      return { ...e, terms: e.terms.map(map) };
    case 'product':
      return { ...e, factors: e.factors.map(map) };
    case 'quotient':
      return { ...e, over: map(e.over), under: map(e.under) };
    case 'power':
      return { ...e, base: map(e.base) };
    case 'root':
    case 'negative':
      return { ...e, of: map(e.of) };
  }
}

/** Every value of a formula, from left to right. */
export function valuesOf(e: Expression): Value[] {
  const found: Value[] = [];
  mapValues(e, (v) => {
    found.push(v);
    return v;
  });
  return found;
}
