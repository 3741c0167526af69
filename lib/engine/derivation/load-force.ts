import type { StaticsTerm } from '../statics/statics-line';
import type { Acting } from './acting';
import { isCouple } from './arm';
import { type Context, loadAt, loadValue } from './context';
import { type Expression, negative, number, product, quotient, sum } from './expression';
import { loadedLength } from './loaded-length';

/** A load in an equation by its magnitude: P, w L, ½ w l. */
export function loadForce(ctx: Context, term: StaticsTerm, acting: Acting): Expression {
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
