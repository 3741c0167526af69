import { type Context, lengthValue, placedMember } from './context';
import type { Value } from './expression';

/** A length over which a load acts that is not a whole member: l, or l_1, l_2 … */
export interface LoadedLength {
  member: string;
  from: number;
  to: number;
  value: Value;
}

/** Loaded lengths of the sheet that are parts of members, each length once. */
export function loadedParts(ctx: Context): LoadedLength[] {
  const found: { member: string; from: number; to: number; length: number }[] = [];
  for (const c of ctx.analysis.cases) {
    for (const load of c.loads) {
      if (load.kind !== 'distributed') continue;
      const p = placedMember(ctx, load.member);
      const [from, to] = [load.from ?? 0, load.to ?? p.L];
      if (from <= 0 && to >= p.L) continue;
      const slope = load.direction === 'y' ? Math.abs(p.cos) : load.direction === 'x' ? Math.abs(p.sin) : 1;
      for (const length of [to - from, (to - from) * (load.per === 'projection' ? slope : 1)]) {
        if (!found.some((f) => near(f.length, length))) found.push({ member: load.member, from, to, length });
      }
    }
  }
  return found.map(({ length, ...place }, i) => {
    const symbol = { letter: 'l', sub: found.length === 1 ? undefined : [`${i + 1}`] };
    return { ...place, value: lengthValue(ctx, symbol, length) };
  });
}

const near = (a: number, b: number) => Math.abs(a - b) <= 1e-9 * Math.max(a, b);

/** A loaded length in symbols: that of the member, its plan length or rise, or a part of it. */
export function loadedLength(ctx: Context, id: string, length: number): Value {
  const p = placedMember(ctx, id);
  if (near(p.L, length)) return lengthValue(ctx, ctx.names.length(id), p.L);
  if (near(Math.abs(p.dx), length)) return lengthValue(ctx, ctx.names.plan(id), Math.abs(p.dx));
  if (near(Math.abs(p.dy), length)) return lengthValue(ctx, ctx.names.rise(id), Math.abs(p.dy));
  const part = loadedParts(ctx).find((l) => near(l.value.value, length));
  return part?.value ?? lengthValue(ctx, undefined, length);
}
