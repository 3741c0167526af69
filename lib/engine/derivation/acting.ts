import type { StaticsLine, StaticsTerm } from '../statics/statics-line';
import type { Context } from './context';
import { dimensionOf, dimensions, per } from './dimensions';
import { inCase, inUnitState, onPrimary, type SymbolName } from './symbol-name';

/** Which forces act: those of a case on the primary structure, or one redundant of value 1. */
export type Acting =
  | { kind: 'case'; id: string }
  | { kind: 'unit'; index: number }
  /** The structure itself under a case. */
  | { kind: 'final'; id: string };

export type Sum = Extract<StaticsLine, { kind: 'equation' }>['sum'];

/** How the zero of a sum is printed. */
export function sumFigures(ctx: Context, kind: 'moment' | 'force', acting: Acting) {
  const moment = kind === 'moment';
  const own = moment ? dimensions.moment : dimensions.force;
  if (acting.kind !== 'unit') {
    return { dimension: own, decimals: moment ? ctx.figures.moment : ctx.figures.force };
  }
  const q = ctx.solution.redundants[acting.index];
  const dimension = per(own, q ? dimensionOf(q) : dimensions.force);
  return { dimension, decimals: moment ? ctx.figures.unitMoment : ctx.figures.unitForce };
}

export function symbolOf(ctx: Context, of: StaticsTerm['of'], acting: Acting): SymbolName {
  const raw = rawSymbol(ctx, of);
  if (acting.kind === 'unit') return inUnitState(raw, acting.index);
  return inCase(acting.kind === 'case' ? onPrimary(raw) : raw, acting.id);
}

function rawSymbol(ctx: Context, of: StaticsTerm['of']): SymbolName {
  if (of.kind === 'quantity') return ctx.names.quantity(of.quantity);
  if (of.kind !== 'interface') throw new Error('only forces sought have a symbol here');
  return { letter: 'F', sub: [...(ctx.names.shear(of.member, of.end).sub ?? []), ',', of.component] };
}

export function figuresOf(ctx: Context, of: StaticsTerm['of'], acting: Acting) {
  const moment = of.kind === 'quantity' && dimensionOf(of.quantity).length === 1;
  if (acting.kind !== 'unit') {
    return moment
      ? { dimension: dimensions.moment, decimals: ctx.figures.moment }
      : { dimension: dimensions.force, decimals: ctx.figures.force };
  }
  const q = ctx.solution.redundants[acting.index];
  const divisor = q ? dimensionOf(q) : dimensions.force;
  const own = moment ? dimensions.moment : dimensions.force;
  const dimension = { force: 0, length: own.length - divisor.length, temperature: 0 };
  return { dimension, decimals: ctx.figures.unitForce };
}
