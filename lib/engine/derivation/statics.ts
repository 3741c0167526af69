import type { StaticsLine } from '../statics/statics-line';
import { type Acting, figuresOf, sumFigures, symbolOf } from './acting';
import type { Context } from './context';
import { negative, number, quotient, sum } from './expression';
import { type Relation, relate } from './relation';
import { type StaticsStep, sameForce, type Written, writeEquation } from './statics-equation';
import { writeSet } from './together';

/** The lines of one state of the primary structure; structures without an order give none. */
export function writeSteps(ctx: Context, lines: readonly StaticsLine[], acting: Acting): StaticsStep[] {
  return lines.flatMap((line) => {
    if (line.kind === 'simultaneous') return writeSet(ctx, line, acting);
    const step = writeStep(ctx, line, acting);
    const empty = line.kind === 'check' && step.equation.kind === 'number';
    return empty ? [] : [step];
  });
}

function writeStep(
  ctx: Context,
  line: Exclude<StaticsLine, { kind: 'simultaneous' }>,
  acting: Acting,
): StaticsStep {
  const { step, terms } = writeEquation(ctx, line, line.kind === 'equation' ? [line.unknown] : [], acting);
  if (line.kind === 'check') {
    const figures = sumFigures(ctx, line.sum.kind, acting);
    return { ...step, check: relate({ letter: 'Σ' }, step.equation, figures, 0) };
  }
  return { ...step, relation: solveFor(ctx, line, terms, acting) };
}

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
