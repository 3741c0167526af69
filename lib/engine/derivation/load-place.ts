import type { Load } from '@/lib/model/load';
import type { Context } from './context';
import type { Along } from './distance';
import type { Placed } from './geometry';
import type { SymbolName } from './symbol-name';

/** Places of point loads and couples along their members: a, or a_1, a_2 … where there are several. */
export function placeSymbol(ctx: Context, member: string, at: number): SymbolName | undefined {
  const places: string[] = [];
  for (const c of ctx.analysis.cases) {
    for (const load of c.loads) {
      if (load.kind !== 'point' && load.kind !== 'couple') continue;
      const key = `${load.member}\u0001${load.at}`;
      if (!places.includes(key)) places.push(key);
    }
  }
  const n = places.indexOf(`${member}\u0001${at}`);
  if (n === -1) return undefined;
  return { letter: 'a', sub: places.length === 1 ? undefined : [`${n + 1}`] };
}

/** The resultant of a load on a member: where it acts and which way (unit vector; none for a couple). */
export interface Resultant {
  place: Along;
  ux: number;
  uy: number;
}

export function resultantOf(ctx: Context, load: Load, p: Placed): Resultant | undefined {
  const axes = { x: [1, 0], y: [0, 1], along: [p.cos, p.sin], across: [-p.sin, p.cos] } as const;
  switch (load.kind) {
    case 'self-weight':
      return { place: { at: p.L / 2 }, ux: 0, uy: 1 };
    case 'point': {
      const [ux, uy] = axes[load.direction];
      return { place: { at: load.at, symbol: placeSymbol(ctx, load.member, load.at) }, ux, uy };
    }
    case 'couple':
      return { place: { at: load.at, symbol: placeSymbol(ctx, load.member, load.at) }, ux: 0, uy: 0 };
    case 'distributed': {
      const [ux, uy] = axes[load.direction];
      const [from, to] = [load.from ?? 0, load.to ?? p.L];
      const total = load.w1 + load.w2;
      const at = total === 0 ? (from + to) / 2 : from + ((to - from) * (load.w1 + 2 * load.w2)) / (3 * total);
      return { place: { at }, ux, uy };
    }
    case 'joint':
    case 'temperature':
    case 'misfit':
    case 'settlement':
      return undefined;
  }
}
