import { quantityKey } from '@/lib/model/quantity';
import type { StaticsLine, StaticsTerm } from '../statics/statics-line';
import type { Context } from './context';
import { type Expression, negative, number, quotient, sum, type Value } from './expression';
import { type Relation, relate } from './relation';
import { type Acting, figuresOf, type SignedTerm, signedTerm, sumFigures, symbolOf } from './statics-terms';
import type { SymbolName } from './symbol-name';

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
}

/** The lines of one state of the primary structure; simultaneous systems and structures without an order give none. */
export function writeSteps(ctx: Context, lines: readonly StaticsLine[], acting: Acting): StaticsStep[] {
  return lines.flatMap((line) => {
    if (line.kind === 'simultaneous') return [];
    const step = writeStep(ctx, line, acting);
    const empty = line.kind === 'check' && step.equation.kind === 'number';
    return empty ? [] : [step];
  });
}

/** Rounding beside the largest force of an equation. */
const negligible = 1e-12;

function writeStep(
  ctx: Context,
  line: Exclude<StaticsLine, { kind: 'simultaneous' }>,
  acting: Acting,
): StaticsStep {
  const before = ctx.arms.count;
  const sought = line.kind === 'equation' ? line.unknown : undefined;
  const size = Math.max(...line.terms.map((t) => Math.abs(t.value)), 0);
  // Forces found to be zero before drop out of the equations after them.
  const kept = line.terms.filter(
    (t) => (sought !== undefined && sameForce(t.of, sought)) || Math.abs(t.value) > negligible * size,
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
  if (line.kind === 'check') {
    const figures = sumFigures(ctx, line.sum.kind, acting);
    return { ...step, check: relate({ letter: 'Σ' }, equation, figures, 0) };
  }
  return { ...step, relation: solveFor(ctx, line, terms, acting) };
}

type Written = SignedTerm & { term: StaticsTerm };

function solveFor(
  ctx: Context,
  line: Extract<StaticsLine, { kind: 'equation' }>,
  terms: readonly Written[],
  acting: Acting,
): Relation {
  const sought = terms.find((t) => sameForce(t.term.of, line.unknown));
  const others = terms.filter((t) => t !== sought);
  const symbol = symbolOf(ctx, line.unknown, acting);
  const figures = figuresOf(ctx, line.unknown, acting);
  if (others.length === 0) return relate(symbol, number(0), figures, 0);
  const moved = others.map((t) => (t.negative === sought?.negative ? negative(t.expression) : t.expression));
  const over = sum(...moved);
  return relate(symbol, sought?.arm ? quotient(over, sought.arm) : over, figures, line.value);
}

function sameForce(a: StaticsTerm['of'], b: StaticsTerm['of']): boolean {
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
