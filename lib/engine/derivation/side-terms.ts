import type { Load } from '@/lib/model/load';
import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { StaticsLine, StaticsTerm } from '../statics/statics-line';
import { type Context, placedMember } from './context';
import { resultantOf } from './load-place';

type Sum = Extract<StaticsLine, { kind: 'equation' }>['sum'];

/** A part of the structure: its joints and members. */
export interface Side {
  joints: ReadonlySet<string>;
  members: ReadonlySet<string>;
}

/** What a force of direction (ux, uy) at (x, y) counts for in a sum. */
function counts(sum: Sum, x: number, y: number, ux: number, uy: number): number {
  return sum.kind === 'moment' ? (x - sum.x) * uy - (y - sum.y) * ux : ux * sum.x + uy * sum.y;
}

/** Reactions on a part of the structure; those released are left out on the primary structure. */
export function reactionTerms(
  ctx: Context,
  reactions: readonly { quantity: Quantity; value: number }[],
  side: Side,
  sum: Sum,
  primary: boolean,
): StaticsTerm[] {
  const released = new Set(primary ? ctx.solution.redundants.map(quantityKey) : []);
  return reactions.flatMap(({ quantity, value }): StaticsTerm[] => {
    if (quantity.kind !== 'reaction' || !side.joints.has(quantity.joint)) return [];
    if (released.has(quantityKey(quantity))) return [];
    const at = ctx.analysis.joints.find((j) => j.id === quantity.joint);
    if (!at) return [];
    const angle = ((at.support?.angle ?? 0) * Math.PI) / 180;
    const [c, s] = [Math.cos(angle), Math.sin(angle)];
    const axes = { x: [c, s], y: [-s, c] } as const;
    const couple = sum.kind === 'moment' ? 1 : 0;
    const coefficient =
      quantity.component === 'turn' ? couple : counts(sum, at.x, at.y, ...axes[quantity.component]);
    return [{ coefficient, value, of: { kind: 'quantity', quantity } }];
  });
}

/** Loads of a case on a part of the structure, each as its resultant. */
export function loadTerms(ctx: Context, id: string, side: Side, sum: Sum): StaticsTerm[] {
  const loads = ctx.analysis.cases.find((c) => c.id === id)?.loads ?? [];
  return loads.flatMap((load, index): StaticsTerm[] => {
    if (load.kind === 'joint') return jointTerms(ctx, load, index, side, sum);
    return [...side.members].flatMap((m) => memberTerms(ctx, load, index, m, sum));
  });
}

function jointTerms(
  ctx: Context,
  load: Extract<Load, { kind: 'joint' }>,
  index: number,
  side: Side,
  sum: Sum,
): StaticsTerm[] {
  const at = ctx.analysis.joints.find((j) => j.id === load.joint);
  if (!at || !side.joints.has(load.joint)) return [];
  const of = { kind: 'load', index } as const;
  return [
    { coefficient: counts(sum, at.x, at.y, 1, 0), value: load.x, of },
    { coefficient: counts(sum, at.x, at.y, 0, 1), value: load.y, of },
    { coefficient: sum.kind === 'moment' ? 1 : 0, value: load.couple, of },
  ];
}

function memberTerms(ctx: Context, load: Load, index: number, member: string, sum: Sum): StaticsTerm[] {
  const p = placedMember(ctx, member);
  if (load.kind === 'joint' || load.kind === 'settlement') return [];
  if (load.kind === 'self-weight') {
    const named = load.members === undefined || load.members.includes(member);
    if (!named || p.member.weight === undefined) return [];
  } else if (load.member !== member) return [];
  const r = resultantOf(ctx, load, p);
  if (!r) return [];
  const place = [p.start.x + p.cos * r.place.at, p.start.y + p.sin * r.place.at] as const;
  const coefficient = counts(sum, ...place, r.ux, r.uy);
  switch (load.kind) {
    case 'point':
      return [{ coefficient, value: load.value, of: { kind: 'load', index } }];
    case 'couple':
      return [{ coefficient: sum.kind === 'moment' ? 1 : 0, value: load.value, of: { kind: 'load', index } }];
    case 'self-weight': {
      const intensity = -(p.member.weight as number);
      return [{ coefficient, value: intensity * p.L, of: { kind: 'load', index, intensity, length: p.L } }];
    }
    case 'distributed': {
      const along = (load.to ?? p.L) - (load.from ?? 0);
      const slope = load.direction === 'y' ? Math.abs(p.cos) : load.direction === 'x' ? Math.abs(p.sin) : 1;
      const length = along * (load.per === 'projection' ? slope : 1);
      const value = ((load.w1 + load.w2) / 2) * length;
      const even = load.w1 === load.w2 ? { intensity: load.w1, length } : {};
      return [{ coefficient, value, of: { kind: 'load', index, ...even } }];
    }
    default:
      return [];
  }
}
