import type { MemberDiagrams } from '../diagrams/member-diagrams';
import { extremes, valueAt } from '../diagrams/piecewise';
import { type Context, placedMember } from './context';

/** Stretches of a member on which the transverse load is zero: M is straight. */
export interface StraightStretch {
  member: string;
  from: number;
  to: number;
  startM: number;
  V: number;
  endM: number;
  zero?: number;
}

/** Stretches under a uniform load w (positive towards the right of the walk): M is a parabola. */
export interface LoadedStretch {
  member: string;
  from: number;
  to: number;
  startM: number;
  V: number;
  w: number;
  /** Distance from `from` to where V is zero, or would be, and M there. */
  x: number;
  top: number;
  /** V is zero on the stretch itself. */
  inside: boolean;
  /** Distance of the zeros of M from that place. */
  e?: number;
  /** Zeros of M before and after it, where they lie on the stretch. */
  before?: number;
  after?: number;
}

/** Extremes of M on members whose load varies: found from the exact curve. */
export interface OtherStretch {
  member: string;
  s: number;
  M: number;
}

/** The moments of one member, stretch by stretch. */
export interface Stretches {
  straight: StraightStretch[];
  loaded: LoadedStretch[];
  other: OtherStretch[];
}

/** Cuts a member where its load changes. Rounding beside the largest moment is zero. */
export function stretchesOf(
  ctx: Context,
  member: string,
  diagrams: Pick<MemberDiagrams, 'V' | 'M'> | undefined,
): Stretches {
  const found: Stretches = { straight: [], loaded: [], other: [] };
  if (!diagrams) return found;
  const { L } = placedMember(ctx, member);
  const { max, min } = extremes(diagrams.M);
  const size = Math.max(Math.abs(max.value), Math.abs(min.value));
  if (size === 0) return found;
  const tidy = (v: number, scale: number) => (Math.abs(v) <= 1e-10 * scale ? 0 : v);
  for (const piece of diagrams.M) {
    const length = piece.to - piece.from;
    const [, , c2 = 0, c3 = 0] = piece.c;
    const startM = tidy(valueAt([piece], piece.from), size);
    const endM = tidy(valueAt([piece], piece.to, 'left'), size);
    const V = tidy(piece.c[1] ?? 0, size / L);
    const common = { member, from: piece.from, to: piece.to, startM, V };
    if (Math.abs(c3) * length ** 3 > 1e-9 * size) {
      for (const place of [extremes([piece]).max, extremes([piece]).min]) {
        found.other.push({ member, s: place.s, M: tidy(place.value, size) });
      }
      continue;
    }
    const w = -2 * c2;
    if (Math.abs(w) * length * length > 1e-9 * size) found.loaded.push(underLoad(common, w));
    else if (startM !== 0 || endM !== 0) {
      const crosses = startM * endM < 0;
      found.straight.push({ ...common, endM, zero: crosses ? piece.from - startM / V : undefined });
    }
  }
  return found;
}

function underLoad(
  common: Pick<LoadedStretch, 'member' | 'from' | 'to' | 'startM' | 'V'>,
  w: number,
): LoadedStretch {
  const length = common.to - common.from;
  const x = common.V / w;
  const top = common.startM + common.V ** 2 / (2 * w);
  const within = (d: number) => d > 1e-9 * length && d < length * (1 - 1e-9);
  const inside = within(x);
  const square = (2 * top) / w;
  if (square <= 0) return { ...common, w, x, top, inside };
  const e = Math.sqrt(square);
  const [before, after] = [x - e, x + e].map((d) => (within(d) ? common.from + d : undefined));
  return { ...common, w, x, top, inside, e, before, after };
}
