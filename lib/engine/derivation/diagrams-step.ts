import type { MemberDiagrams } from '../diagrams/member-diagrams';
import { extremes, valueAt } from '../diagrams/piecewise';
import type { Context } from './context';
import { placedMember } from './context';
import { fitColumns } from './precision';

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

/** Step 12: where N, V and M are greatest and where M is zero. */
export interface DiagramsStep {
  kind: 'diagrams';
  cases: { id: string; straight: StraightStretch[]; loaded: LoadedStretch[]; other: OtherStretch[] }[];
  decimals: Record<Column, number>;
}

type Column = 'from' | 'length' | 'M' | 'V' | 'w' | 'x' | 'top' | 'e' | 'zero' | 'before' | 'after';

export function deriveDiagrams(ctx: Context): DiagramsStep {
  const cases = ctx.analysis.cases.map(({ id }) => {
    const members = ctx.solution.cases[id]?.members ?? {};
    const all = ctx.analysis.members.map((m) => stretchesOf(ctx, m.id, members[m.id]));
    return {
      id,
      straight: all.flatMap((s) => s.straight),
      loaded: all.flatMap((s) => s.loaded),
      other: all.flatMap((s) => s.other),
    };
  });
  const { figures } = ctx;
  const straight = cases.flatMap((c) => c.straight);
  const loaded = cases.flatMap((c) => c.loaded);
  const start: Record<Column, number> = {
    from: figures.length,
    length: figures.length,
    M: figures.moment,
    V: figures.force,
    w: 2,
    x: figures.length,
    top: figures.moment,
    e: figures.length,
    zero: figures.length,
    before: figures.length,
    after: figures.length,
  };
  // The two kinds of table share their columns, so what one asks for is looked over again in the other.
  let decimals = start;
  let before: string;
  do {
    before = JSON.stringify(decimals);
    decimals = fitStraight(straight, fitLoaded(loaded, decimals));
  } while (JSON.stringify(decimals) !== before);
  return { kind: 'diagrams', cases, decimals };
}

type Decimals = Record<Column, number>;

function fitLoaded(loaded: readonly LoadedStretch[], start: Decimals): Decimals {
  const rows = loaded.map((s) => ({
    from: s.from,
    M: s.startM,
    V: s.V,
    w: s.w,
    x: s.x,
    top: s.top,
    e: s.e,
    before: s.before,
    after: s.after,
  }));
  return fitColumns<Column>(rows, start, [
    { column: 'before', from: ['from', 'x', 'e'], work: (r) => r.from + r.x - r.e },
    { column: 'after', from: ['from', 'x', 'e'], work: (r) => r.from + r.x + r.e },
    { column: 'e', from: ['top', 'w'], work: (r) => Math.sqrt((2 * r.top) / r.w) },
    { column: 'top', from: ['M', 'V', 'w'], work: (r) => r.M + r.V ** 2 / (2 * r.w) },
    { column: 'x', from: ['V', 'w'], work: (r) => r.V / r.w },
  ]);
}

function fitStraight(straight: readonly StraightStretch[], start: Decimals): Decimals {
  const rows = straight.map((s) => ({
    from: s.from,
    M: s.startM,
    V: s.V,
    length: s.to - s.from,
    top: s.endM,
    zero: s.zero,
  }));
  return fitColumns<Column>(rows, start, [
    { column: 'zero', from: ['from', 'M', 'V'], work: (r) => r.from - r.M / r.V },
    { column: 'top', from: ['M', 'V', 'length'], work: (r) => r.M + r.V * r.length },
  ]);
}

interface Stretches {
  straight: StraightStretch[];
  loaded: LoadedStretch[];
  other: OtherStretch[];
}

function stretchesOf(
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
