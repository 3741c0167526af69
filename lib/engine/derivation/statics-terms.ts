import type { StaticsTerm } from '../statics/statics-line';
import { type Acting, figuresOf, type Sum, symbolOf } from './acting';
import { armOf } from './arm';
import { type Context, pureValue, redundantSymbol } from './context';
import { type Expression, product } from './expression';
import { loadForce } from './load-force';

/** A term of an equation: arm or cosine times force, and whether it is taken off. */
export interface SignedTerm {
  expression: Expression;
  arm?: Expression;
  negative: boolean;
}

/** A term without its sign: arm or cosine times force. Loads enter with their magnitude, found forces with their sign. */
export function signedTerm(ctx: Context, about: Sum, term: StaticsTerm, acting: Acting): SignedTerm {
  const force = forceOf(ctx, term, acting);
  const signed = term.of.kind === 'load' ? term.coefficient * term.value : term.coefficient;
  const arm = armOf(ctx, about, term, acting);
  return { expression: arm ? product(force, arm) : force, arm, negative: signed < 0 };
}

function forceOf(ctx: Context, term: StaticsTerm, acting: Acting): Expression {
  if (term.of.kind === 'load') return loadForce(ctx, term, acting);
  if (term.of.kind === 'unit') return pureValue(1, 0, redundantSymbol(term.of.redundant));
  const { dimension, decimals } = figuresOf(ctx, term.of, acting);
  return { kind: 'value', symbol: symbolOf(ctx, term.of, acting), value: term.value, dimension, decimals };
}
