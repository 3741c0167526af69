import type { Joint } from '@/lib/model/structure';
import { type Context, lengthValue, pureValue } from './context';
import { type Expression, evaluate, number, product, quotient, sum } from './expression';
import type { Placed } from './geometry';
import type { SymbolName } from './symbol-name';

export type Axis = 'x' | 'y';

const near = (a: number, b: number) => Math.abs(a - b) <= 1e-9 * Math.max(1, Math.abs(a), Math.abs(b));

/** Horizontal or vertical distance of two joints: a member's own length where one spans it, else x_AB or y_AB. */
export function jointDistance(ctx: Context, a: Joint, b: Joint, axis: Axis): Expression | undefined {
  const value = Math.abs(a[axis] - b[axis]);
  if (near(value, 0)) return undefined;
  const spans = [...ctx.placed.values()].filter((p) => {
    const [from, to] = [p.start[axis], p.end[axis]];
    return (near(from, a[axis]) && near(to, b[axis])) || (near(from, b[axis]) && near(to, a[axis]));
  });
  const joins = (p: Placed) => [p.start.id, p.end.id].includes(a.id) && [p.start.id, p.end.id].includes(b.id);
  const best = spans.find(joins) ?? spans[0];
  if (best) return extent(ctx, best, axis);
  const long = ctx.analysis.joints.some((j) => j.id.length > 1);
  const sub = long ? [a.id, '–', b.id] : [a.id, b.id];
  return lengthValue(ctx, { letter: axis, sub }, value);
}

/** What a member spans along an axis: its length when it lies along it, its plan length or rise when inclined. */
export function extent(ctx: Context, p: Placed, axis: Axis): Expression {
  const { id } = p.member;
  const symbol: SymbolName =
    p.lie === 'inclined' ? (axis === 'x' ? ctx.names.plan(id) : ctx.names.rise(id)) : ctx.names.length(id);
  return lengthValue(ctx, symbol, Math.abs(axis === 'x' ? p.dx : p.dy));
}

/** A place on a member, from its start: half of it, the place of a point load, or a number. */
export interface Along {
  at: number;
  symbol?: SymbolName;
}

/** Distance along an axis from a joint to a place on a member, in symbols where it has them. */
export function placeDistance(
  ctx: Context,
  from: Joint,
  p: Placed,
  place: Along,
  axis: Axis,
): Expression | undefined {
  const slope = axis === 'x' ? p.cos : p.sin;
  const total = Math.abs(p.start[axis] + place.at * slope - from[axis]);
  if (near(total, 0)) return undefined;
  for (const found of candidates(ctx, from, p, place, axis, slope)) {
    if (near(evaluate(found), total)) return found;
  }
  return undefined;
}

function candidates(
  ctx: Context,
  from: Joint,
  p: Placed,
  place: Along,
  axis: Axis,
  slope: number,
): Expression[] {
  if (Math.abs(slope) < 1e-12) {
    const whole = jointDistance(ctx, from, p.start, axis);
    return whole ? [whole] : [];
  }
  const whole = extent(ctx, p, axis);
  const parts: Expression[] = [];
  if (near(place.at, p.L / 2)) parts.push(quotient(whole, number(2)));
  else if (place.symbol) {
    const a = lengthValue(ctx, place.symbol, place.at);
    const [cos, sin] = [ctx.names.cos(p.member.id), ctx.names.sin(p.member.id)];
    const turned =
      p.lie === 'inclined' ? product(a, pureValue(Math.abs(slope), 5, axis === 'x' ? cos : sin)) : a;
    parts.push(turned, sum(whole, { kind: 'negative', of: turned }));
  }
  const [fromStart, fromEnd] = [p.start, p.end].map((j) => jointDistance(ctx, from, j, axis));
  const joined = parts.flatMap((part) => [
    part,
    ...[fromStart, fromEnd].flatMap((d) => (d ? [sum(d, part), sum(d, { kind: 'negative', of: part })] : [])),
  ]);
  return joined;
}
