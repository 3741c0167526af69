import { quantityKey } from '@/lib/model/quantity';
import type { StaticsLine, StaticsTerm } from '../statics/statics-line';
import { type Acting, symbolOf } from './acting';
import type { Context } from './context';
import { type Expression, negative, number, sum, type Value } from './expression';
import type { Relation } from './relation';
import { type SignedTerm, signedTerm } from './statics-terms';
import type { SymbolName } from './symbol-name';
import type { EquationOfSet } from './together';

/** One equilibrium equation as it is written: which sum, its terms in symbols, and the unknown it gives. */
export interface StaticsStep {
  sum: Extract<StaticsLine, { kind: 'equation' }>['sum'];
  /** Members of the piece, when it is not the whole structure. */
  piece?: readonly string[];
  /** Its terms add up to zero. */
  equation: Expression;
  /** Reactions and joint forces that drop out, since they pass through the point. */
  passing: readonly SymbolName[];
  /** What it gives. */
  relation?: Relation;
  /** An equation left over: its terms with their figures, and the zero they must give. */
  check?: Relation;
  /** Arms that have no name in the drawing. */
  arms: readonly Value[];
  /** One of several equations that give their unknowns only together. */
  set?: EquationOfSet;
}

/** A term as it is written, beside the force that it is. */
export type Written = SignedTerm & { term: StaticsTerm };

/** Rounding beside the largest force of an equation. */
const negligible = 1e-12;

/** A sum in symbols. Forces found to be zero before drop out of the equations after them. */
export function writeEquation(
  ctx: Context,
  line: Pick<Extract<StaticsLine, { kind: 'equation' }>, 'piece' | 'sum' | 'terms'>,
  sought: readonly StaticsTerm['of'][],
  acting: Acting,
): { step: StaticsStep; terms: Written[] } {
  const before = ctx.arms.count;
  const size = Math.max(...line.terms.map((t) => Math.abs(t.value)), 0);
  const kept = line.terms.filter(
    (t) => sought.some((of) => sameForce(t.of, of)) || Math.abs(t.value) > negligible * size,
  );
  const terms = kept.map((t) => ({ term: t, ...signedTerm(ctx, line.sum, t, acting) }));
  const equation = sum(...terms.map((t) => (t.negative ? negative(t.expression) : t.expression)));
  const whole = line.piece.length === ctx.analysis.members.length;
  const step: StaticsStep = {
    sum: line.sum,
    piece: whole ? undefined : line.piece,
    equation: terms.length === 0 ? number(0) : equation,
    passing: passingThrough(ctx, line.sum, acting),
    arms: ctx.arms.since(before),
  };
  return { step, terms };
}

export function sameForce(a: StaticsTerm['of'], b: StaticsTerm['of']): boolean {
  if (a.kind === 'quantity' && b.kind === 'quantity')
    return quantityKey(a.quantity) === quantityKey(b.quantity);
  if (a.kind === 'interface' && b.kind === 'interface') {
    return a.member === b.member && a.end === b.end && a.component === b.component;
  }
  return false;
}

/** Supports' forces through the point of a moment sum: the reason why the equation has one unknown. */
function passingThrough(ctx: Context, about: StaticsStep['sum'], acting: Acting): SymbolName[] {
  if (about.kind !== 'moment' || about.joint === undefined) return [];
  const support = ctx.analysis.joints.find((j) => j.id === about.joint)?.support;
  const released = new Set(ctx.solution.redundants.map(quantityKey));
  return (['x', 'y'] as const).flatMap((component) => {
    const quantity = { kind: 'reaction' as const, joint: about.joint ?? '', component };
    if (!support || support[component] === 'free' || released.has(quantityKey(quantity))) return [];
    return [symbolOf(ctx, { kind: 'quantity', quantity }, acting)];
  });
}
