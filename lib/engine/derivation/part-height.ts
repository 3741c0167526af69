import type { Load } from '@/lib/model/load';
import type { MomentPart } from '../force-method/work';
import { type Context, lengthValue, loadValue, placedMember, pureValue } from './context';
import { type Expression, evaluate, negative, number, power, product, quotient, sum } from './expression';
import type { Placed } from './geometry';
import { placeSymbol } from './load-place';
import { loadedLength } from './loaded-length';
import { sectionMoment } from './section-moment';

/**
 * The formula for the height of a part: w l²/8 of a parabola, P a (l − a)/l of a triangle under a load, the moment of
 * the forces on one side of a member's end. Undefined where none of the usual ones gives the height.
 */
export function heightFormula(ctx: Context, id: string, part: MomentPart): Expression | undefined {
  const { due } = part;
  if (due.kind === 'end-moment') return sectionMoment(ctx, id, part.member, due.end, part.height);
  const load = ctx.analysis.cases.find((c) => c.id === id)?.loads[due.index];
  if (!load) return undefined;
  const p = placedMember(ctx, part.member);
  const close = (e: Expression) =>
    Math.abs(evaluate(e) - Math.abs(part.height)) <= 1e-9 * Math.abs(part.height);
  const found = candidates(ctx, id, due.index, load, p, part).find(close);
  return found && part.height < 0 ? negative(found) : found;
}

function candidates(
  ctx: Context,
  id: string,
  index: number,
  load: Load,
  p: Placed,
  part: MomentPart,
): Expression[] {
  const span = lengthValue(ctx, ctx.names.length(p.member.id), p.L);
  if (load.kind === 'point' || load.kind === 'couple') {
    const a = lengthValue(ctx, placeSymbol(ctx, load.member, load.at), load.at);
    const rest = sum(span, negative(a));
    const size = loadValue(ctx, id, index, 'only');
    if (load.kind === 'couple') {
      return [quotient(product(size, a), span), quotient(product(size, rest), span)];
    }
    const plain = quotient(product(size, a, rest), span);
    return [plain, ...slopes(ctx, p).map((c) => quotient(product(size, a, rest, c), span))];
  }
  const intensities = intensitiesOf(ctx, id, index, load, p);
  const l = part.to - part.from;
  const whole = Math.abs(l - p.L) <= 1e-9 * p.L;
  const base = loadedLength(ctx, p.member.id, l);
  const divisor =
    part.shape === 'parabola' ? 8 : part.shape === 'spandrel' ? 2 : part.shape === 'cubic' ? 6 : undefined;
  if (divisor === undefined) return [];
  const plans = whole ? plansOf(ctx, p) : [];
  return intensities.flatMap((w) => [
    quotient(product(w, power(base, 2)), number(divisor)),
    ...plans.flatMap((plan) => [
      quotient(product(w, span, plan), number(divisor)),
      quotient(product(w, power(plan, 2)), number(divisor)),
    ]),
  ]);
}

/** Magnitudes that a distributed load can enter with: its own, or the difference of its ends. */
function intensitiesOf(ctx: Context, id: string, index: number, load: Load, p: Placed): Expression[] {
  if (load.kind === 'self-weight') return [loadValue(ctx, id, index, 'only', p.member.weight)];
  if (load.kind !== 'distributed') return [];
  if (load.w1 === load.w2) return [loadValue(ctx, id, index, 'only')];
  const ends = (
    [
      ['from', load.w1],
      ['to', load.w2],
    ] as const
  ).flatMap(([part, w]) => (w === 0 ? [] : [loadValue(ctx, id, index, part)]));
  const [a, b] = ends;
  return a && b ? [a, b, sum(a, negative(b)), sum(b, negative(a))] : ends;
}

function plansOf(ctx: Context, p: Placed): Expression[] {
  if (p.lie !== 'inclined') return [];
  return [
    lengthValue(ctx, ctx.names.plan(p.member.id), Math.abs(p.dx)),
    lengthValue(ctx, ctx.names.rise(p.member.id), Math.abs(p.dy)),
  ];
}

function slopes(ctx: Context, p: Placed): Expression[] {
  if (p.lie !== 'inclined') return [];
  return [
    pureValue(Math.abs(p.cos), 5, ctx.names.cos(p.member.id)),
    pureValue(Math.abs(p.sin), 5, ctx.names.sin(p.member.id)),
  ];
}
