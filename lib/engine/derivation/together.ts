import type { StaticsLine } from '../statics/statics-line';
import { type Acting, figuresOf, sumFigures, symbolOf } from './acting';
import type { Context } from './context';
import { per } from './dimensions';
import { type Expression, evaluate, negative, number, product, sum, type Value } from './expression';
import { exactDecimals } from './figure-plan';
import { type Relation, relate } from './relation';
import { solvePair } from './solve-pair';
import { type StaticsStep, sameForce, type Written, writeEquation } from './statics-equation';

/** One of several equations that give their unknowns only together. */
export interface EquationOfSet {
  /** Counted from 1, of so many. */
  place: number;
  of: number;
  unknowns: Value[];
  /** The equation with its figures, what is known on the right: a₁ u₁ + a₂ u₂ = c. */
  left: Expression;
  right: Relation;
  /** With the last equation: the unknowns. Two follow from the figures of their equations (Cramer's rule). */
  solution: Relation[];
  /** With the last of more than two: every equation with what was found put in, and the zero that it gives. */
  inserted: { sum: StaticsStep['sum']; relation: Relation }[];
}

/** An equation as numbers: a coefficient for each unknown, absent where it is not in it, and the right side. */
export interface CollectedRow {
  coefficients: (Value | undefined)[];
  right: Value;
}

type SetLine = Extract<StaticsLine, { kind: 'simultaneous' }>;

/** Rounding beside the largest term of a right side. */
const negligible = 1e-13;

/** Equations with the same unknowns, one after another, and with the last of them what they give. */
export function writeSet(ctx: Context, line: SetLine, acting: Acting): StaticsStep[] {
  const sought = line.unknowns.map((u) => u.of);
  const unknowns = line.unknowns.map(
    ({ of, value }): Value => ({
      kind: 'value',
      symbol: symbolOf(ctx, of, acting),
      value,
      ...figuresOf(ctx, of, acting),
    }),
  );
  const written = line.equations.map((e) => writeEquation(ctx, e, sought, acting));
  const known = written.map(({ terms }) =>
    terms.filter((t) => !sought.some((of) => sameForce(t.term.of, of))),
  );
  const start = written.map(({ step, terms }, i): CollectedRow => {
    const figures = sumFigures(ctx, step.sum.kind, acting);
    const coefficients = line.unknowns.map(({ of }, k) => {
      const term = terms.find((t) => sameForce(t.term.of, of));
      return term && coefficientOf(ctx, term, per(figures.dimension, (unknowns[k] as Value).dimension));
    });
    return { coefficients, right: { kind: 'value', value: rightOf(known[i] ?? []), ...figures } };
  });
  const { rows, solution } = unknowns.length === 2 ? solvePair(start, unknowns) : asFound(start, unknowns);
  return written.map(({ step }, i) => {
    const last = i === written.length - 1;
    const { coefficients, right } = rows[i] as CollectedRow;
    const set: EquationOfSet = {
      place: i + 1,
      of: written.length,
      unknowns,
      left: sum(...coefficients.flatMap((a, k) => (a ? [times(a, unknowns[k] as Value)] : []))),
      right: relate({ letter: 'Σ' }, movedOver(known[i] ?? []), right, right.value),
      solution: last ? solution : [],
      inserted:
        last && unknowns.length > 2
          ? written.map((w) => ({
              sum: w.step.sum,
              relation: relate({ letter: 'Σ' }, w.step.equation, sumFigures(ctx, w.step.sum.kind, acting), 0),
            }))
          : [],
    };
    return { ...step, set };
  });
}

/** More than two: each as it was found, which the equations themselves then prove. */
function asFound(
  rows: CollectedRow[],
  unknowns: readonly Value[],
): { rows: CollectedRow[]; solution: Relation[] } {
  const solution = unknowns.flatMap((u) =>
    u.symbol ? [{ symbol: u.symbol, formula: { ...u, symbol: undefined }, result: u }] : [],
  );
  return { rows, solution };
}

function coefficientOf(ctx: Context, term: Written, dimension: Value['dimension']): Value {
  const size = term.arm ? evaluate(term.arm) : 1;
  const value = term.negative ? -size : size;
  const least = dimension.length === 0 ? 5 : ctx.figures.length;
  return { kind: 'value', value, dimension, decimals: Math.min(least, exactDecimals([value], 0, 5)) };
}

/** What is known, on the other side of the equals sign. */
function movedOver(known: readonly Written[]): Expression {
  if (known.length === 0) return number(0);
  return sum(...known.map((t) => (t.negative ? t.expression : negative(t.expression))));
}

function rightOf(known: readonly Written[]): number {
  const values = known.map((t) => (t.negative ? 1 : -1) * evaluate(t.expression));
  const total = values.reduce((a, b) => a + b, 0);
  return Math.abs(total) <= negligible * Math.max(...values.map(Math.abs), 0) ? 0 : total;
}

/** a · b, where a coefficient of 1 is not written. */
export function times(a: Value, b: Value): Expression {
  if (a.value === 1) return b;
  if (a.value === -1) return negative(b);
  return a.value < 0 ? negative(product({ ...a, value: -a.value }, b)) : product(a, b);
}
