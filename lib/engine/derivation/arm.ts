import type { Joint } from '@/lib/model/structure';
import type { StaticsTerm } from '../statics/statics-line';
import type { Acting, Sum } from './acting';
import { type Context, loadAt, placedMember, pureValue } from './context';
import { dimensionOf } from './dimensions';
import { type Axis, jointDistance, placeDistance } from './distance';
import { type Expression, evaluate } from './expression';
import { resultantOf } from './load-place';
import type { SymbolName } from './symbol-name';

/** Nothing when the arm or cosine is 1. */
export function armOf(ctx: Context, about: Sum, term: StaticsTerm, acting: Acting): Expression | undefined {
  const size = Math.abs(term.coefficient);
  const couple = isCouple(ctx, term, acting);
  if (couple || (about.kind === 'force' && Math.abs(size - 1) <= 1e-12)) return undefined;
  if (about.kind === 'force') return pureValue(size, 5);
  const centre = ctx.analysis.joints.find((j) => j.id === about.joint);
  return (centre ? namedArm(ctx, centre, term, acting, size) : undefined) ?? ctx.arms.add(size);
}

export function isCouple(ctx: Context, term: StaticsTerm, acting: Acting): boolean {
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
