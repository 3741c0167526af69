import type { Joint } from '@/lib/model/structure';
import type { StaticsLine, StaticsTerm } from '../statics/statics-line';
import { type Context, loadValue, placedMember, pureValue, redundantSymbol } from './context';
import { dimensionOf, dimensions, per } from './dimensions';
import { type Axis, jointDistance, placeDistance } from './distance';
import { type Expression, evaluate, negative, number, product, quotient, sum } from './expression';
import { resultantOf } from './load-place';
import { loadedLength } from './loaded-length';
import { inCase, inUnitState, onPrimary, type SymbolName } from './symbol-name';

/** Which forces act: those of a case on the primary structure, or one redundant of value 1. */
export type Acting =
  | { kind: 'case'; id: string }
  | { kind: 'unit'; index: number }
  /** The structure itself under a case. */
  | { kind: 'final'; id: string };

type Sum = Extract<StaticsLine, { kind: 'equation' }>['sum'];

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

function loadForce(ctx: Context, term: StaticsTerm, acting: Acting): Expression {
  if (term.of.kind !== 'load' || acting.kind === 'unit') throw new Error('a load acts outside its case');
  const { index, intensity, length } = term.of;
  const size = Math.abs(term.value);
  if (intensity !== undefined && length !== undefined) {
    const member = memberUnder(ctx, acting.id, index, term, length);
    return product(loadValue(ctx, acting.id, index, 'only', Math.abs(intensity)), member);
  }
  const load = loadAt(ctx, acting.id, index);
  if (load.kind === 'distributed') return varyingForce(ctx, acting.id, index, load, size);
  const part = load.kind === 'joint' ? jointPart(ctx, load, term, acting) : undefined;
  return loadValue(ctx, acting.id, index, part, size);
}

function jointPart(
  ctx: Context,
  load: Extract<ReturnType<typeof loadAt>, { kind: 'joint' }>,
  term: StaticsTerm,
  acting: Acting,
) {
  if (isCouple(ctx, term, acting)) return 'couple';
  return term.value === load.x ? 'x' : 'y';
}

/** ½ w l of a triangle, ½ (w₁ + w₂) l of a trapezoid. */
function varyingForce(
  ctx: Context,
  id: string,
  index: number,
  load: Extract<ReturnType<typeof loadAt>, { kind: 'distributed' }>,
  size: number,
): Expression {
  const ends = (
    [
      ['from', load.w1],
      ['to', load.w2],
    ] as const
  ).flatMap(([part, w]) => {
    if (w === 0) return [];
    const value = loadValue(ctx, id, index, part);
    return [w * (load.w1 + load.w2) < 0 ? negative(value) : value];
  });
  const total = Math.abs(load.w1 + load.w2);
  const length = loadedLength(ctx, load.member, (2 * size) / total);
  return quotient(product(ends.length === 1 ? (ends[0] as Expression) : sum(...ends), length), number(2));
}

function memberUnder(ctx: Context, id: string, index: number, term: StaticsTerm, length: number): Expression {
  const load = loadAt(ctx, id, index);
  if (load.kind === 'distributed') return loadedLength(ctx, load.member, length);
  const weighed = [...ctx.placed.values()].filter((p) => Math.abs(p.L - length) <= 1e-9 * length);
  const own = weighed.find(
    (p) => Math.abs(Math.abs(term.value) - (p.member.weight ?? 0) * p.L) <= 1e-9 * length,
  );
  return loadedLength(ctx, (own ?? weighed[0])?.member.id ?? '', length);
}

function loadAt(ctx: Context, id: string, index: number) {
  const load = ctx.analysis.cases.find((c) => c.id === id)?.loads[index];
  if (!load) throw new Error(`case ${id} has no load ${index}`);
  return load;
}

/** Nothing when the arm or cosine is 1. */
function armOf(ctx: Context, about: Sum, term: StaticsTerm, acting: Acting): Expression | undefined {
  const size = Math.abs(term.coefficient);
  const couple = isCouple(ctx, term, acting);
  if (couple || (about.kind === 'force' && Math.abs(size - 1) <= 1e-12)) return undefined;
  if (about.kind === 'force') return pureValue(size, 5);
  const centre = ctx.analysis.joints.find((j) => j.id === about.joint);
  return (centre ? namedArm(ctx, centre, term, acting, size) : undefined) ?? ctx.arms.add(size);
}

function isCouple(ctx: Context, term: StaticsTerm, acting: Acting): boolean {
  const { of } = term;
  if (of.kind === 'quantity') return of.quantity.kind === 'reaction' && of.quantity.component === 'turn';
  if (of.kind === 'interface') return false;
  if (of.kind === 'unit') {
    const q = ctx.solution.redundants[of.redundant];
    return q !== undefined && dimensionOf(q).length === 1;
  }
  if (acting.kind === 'unit') return false;
  const load = loadAt(ctx, acting.id, of.index);
  if (load.kind === 'joint') {
    const force = [load.x, load.y].includes(term.value);
    return load.couple === term.value && Math.abs(term.coefficient) === 1 && !force;
  }
  return load.kind === 'couple';
}

function namedArm(
  ctx: Context,
  centre: Joint,
  term: StaticsTerm,
  acting: Acting,
  size: number,
): Expression | undefined {
  const tries: (Expression | undefined)[] = [];
  for (const { place, axis } of placesOf(ctx, term, acting)) {
    tries.push(
      'member' in place
        ? placeDistance(ctx, centre, place.member, place.along, axis)
        : jointDistance(ctx, centre, place.joint, axis),
    );
  }
  return tries.find((e) => e !== undefined && Math.abs(evaluate(e) - size) <= 1e-9 * Math.max(1, size));
}

type PlaceOf =
  | { joint: Joint }
  | { member: ReturnType<typeof placedMember>; along: { at: number; symbol?: SymbolName } };

/** Where a force acts, and the axis its arm is measured along. */
function placesOf(ctx: Context, term: StaticsTerm, acting: Acting): { place: PlaceOf; axis: Axis }[] {
  const { of } = term;
  const joint = (id: string, component: string): { place: PlaceOf; axis: Axis }[] => {
    const found = ctx.analysis.joints.find((j) => j.id === id);
    if (!found) return [];
    return [{ place: { joint: found }, axis: component === 'x' ? 'y' : 'x' }];
  };
  switch (of.kind) {
    case 'quantity':
      return of.quantity.kind === 'reaction' ? joint(of.quantity.joint, of.quantity.component) : [];
    case 'unit': {
      const q = ctx.solution.redundants[of.redundant];
      return q?.kind === 'reaction' ? joint(q.joint, q.component) : [];
    }
    case 'interface': {
      const p = placedMember(ctx, of.member);
      return joint(of.end === 'start' ? p.start.id : p.end.id, of.component);
    }
    case 'load': {
      if (acting.kind === 'unit') return [];
      const load = loadAt(ctx, acting.id, of.index);
      if (load.kind === 'joint') return [...joint(load.joint, 'x'), ...joint(load.joint, 'y')];
      const members =
        load.kind === 'self-weight'
          ? [...ctx.placed.keys()]
          : load.kind === 'settlement'
            ? []
            : [load.member];
      return members.flatMap((id) => {
        const member = placedMember(ctx, id);
        const resultant = resultantOf(ctx, load, member);
        if (!resultant) return [];
        const axes: Axis[] = [];
        if (Math.abs(resultant.ux) < 1e-12) axes.push('x');
        if (Math.abs(resultant.uy) < 1e-12) axes.push('y');
        return axes.map((axis) => ({ place: { member, along: resultant.place }, axis }));
      });
    }
  }
}

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
