import { type Quantity, quantityKey } from '@/lib/model/quantity';
import { type Context, pureValue, redundantSymbol } from './context';
import { dimensionOf, dimensions, per } from './dimensions';
import { type EndForces, endForcesOf } from './end-forces';
import { type Expression, number, product, sum, type Value } from './expression';
import { cellsInstead, type NotWritten } from './not-written';
import { reactionValue } from './primary-step';
import { type Relation, relate } from './relation';
import { inCase, inUnitState, onPrimary, type SymbolName } from './symbol-name';

/** Step 11: reactions and end forces by superposition; one case in full, all in tables. */
export interface ForcesStep {
  kind: 'forces';
  /** The case that is written out; absent when there is nothing to superpose. */
  example?: { id: string; reactions: Relation[]; moments: Relation[] };
  cases: { id: string; reactions: Value[]; ends: EndForces[] }[];
  /** Why there is nothing to superpose by hand. */
  notWritten?: NotWritten;
}

/** Lines of one case are written out up to so many terms; beyond, tables stand alone. */
const most = { lines: 16, terms: 6 };

export function deriveForces(ctx: Context): ForcesStep {
  const { solution, analysis } = ctx;
  const cases = analysis.cases.flatMap(({ id }) => {
    const result = solution.cases[id];
    if (!result) return [];
    const reactions = result.reactions.map((r) => reactionValue(ctx, r, (s) => inCase(s, id)));
    return [{ id, reactions, ends: endForcesOf(ctx, result.members) }];
  });
  const [first] = cases;
  const n = solution.redundants.length;
  const example = first && n > 0 && n <= most.terms ? exampleOf(ctx, first.id, first) : undefined;
  return { kind: 'forces', example, cases, notWritten: cellsInstead(ctx) };
}

function exampleOf(
  ctx: Context,
  id: string,
  result: { reactions: Value[]; ends: EndForces[] },
): NonNullable<ForcesStep['example']> {
  const { solution } = ctx;
  const final = solution.cases[id]?.reactions ?? [];
  const primary = solution.primary.loaded[id];
  const released = new Set(solution.redundants.map(quantityKey));
  const reactions = final.flatMap((r, k): Relation[] => {
    const value = result.reactions[k];
    if (!value?.symbol || released.has(quantityKey(r.quantity))) return [];
    const before =
      primary?.reactions.find((p) => quantityKey(p.quantity) === quantityKey(r.quantity))?.value ?? 0;
    const units = solution.primary.units.map(
      (u) => u.reactions.find((x) => quantityKey(x.quantity) === quantityKey(r.quantity))?.value ?? 0,
    );
    return superposed(ctx, id, ctx.names.quantity(r.quantity), value, before, units);
  });
  const seen = new Set<string>();
  const primaryEnds = primary ? endForcesOf(ctx, primary.members) : [];
  const unitEnds = solution.primary.units.map(
    (u) => new Map(endForcesOf(ctx, u.members).map((e) => [`${e.member} ${e.end}`, e.M])),
  );
  const moments = result.ends.flatMap((e, k): Relation[] => {
    const symbol = ctx.names.moment(e.member, e.end);
    const key = JSON.stringify(symbol);
    if (seen.has(key) || isRedundant(ctx, e)) return [];
    seen.add(key);
    const before = primaryEnds[k]?.M ?? 0;
    const units = unitEnds.map((u) => u.get(`${e.member} ${e.end}`) ?? 0);
    if (units.every((u) => u === 0)) return [];
    const value: Value = {
      kind: 'value',
      symbol: inCase(symbol, id),
      value: e.M,
      dimension: dimensions.moment,
      decimals: ctx.figures.moment,
    };
    return superposed(ctx, id, symbol, value, before, units);
  });
  return { id, reactions: reactions.slice(0, most.lines), moments: moments.slice(0, most.lines) };
}

const isRedundant = (ctx: Context, e: EndForces): boolean =>
  ctx.solution.redundants.some((q) => q.kind === 'moment' && q.member === e.member && q.end === e.end);

function superposed(
  ctx: Context,
  id: string,
  symbol: SymbolName,
  result: Value,
  before: number,
  units: readonly number[],
): Relation[] {
  const largest = Math.max(Math.abs(before), ...units.map(Math.abs), 1e-300);
  const size = (v: number) => (Math.abs(v) <= 1e-12 * largest ? 0 : v);
  const terms: Expression[] = [];
  if (size(before) !== 0) {
    terms.push({ ...result, symbol: inCase(onPrimary(symbol), id), value: before });
  }
  units.forEach((unit, i) => {
    const q = ctx.solution.redundants[i];
    if (size(unit) === 0 || !q) return;
    terms.push(product(redundantIn(ctx, id, i, q), unitValue(ctx, symbol, result, unit, i, q)));
  });
  const formula = terms.length === 0 ? number(0) : sum(...terms);
  return [relate(result.symbol ?? symbol, formula, result, result.value)];
}

/** X_i of a case. */
export function redundantIn(ctx: Context, id: string, i: number, q: Quantity): Value {
  const moment = dimensionOf(q).length === 1;
  return {
    kind: 'value',
    symbol: inCase(redundantSymbol(i), id),
    value: ctx.solution.X[id]?.[i] ?? Number.NaN,
    dimension: dimensionOf(q),
    decimals: moment ? ctx.figures.redundantMoment : ctx.figures.redundantForce,
  };
}

function unitValue(
  ctx: Context,
  symbol: SymbolName,
  result: Value,
  unit: number,
  i: number,
  q: Quantity,
): Value {
  const moment = result.dimension.length === 1;
  const decimals = moment ? ctx.figures.unitMoment : ctx.figures.unitForce;
  const letter = moment && symbol.letter === 'M' ? 'm' : symbol.letter;
  return {
    ...pureValue(unit, decimals, inUnitState({ ...symbol, letter }, i)),
    dimension: per(result.dimension, dimensionOf(q)),
  };
}
