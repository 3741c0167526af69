import type { Context } from './context';
import { fitColumns } from './precision';
import { type LoadedStretch, type OtherStretch, type StraightStretch, stretchesOf } from './stretches-of';

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
