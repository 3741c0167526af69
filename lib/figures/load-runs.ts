import type { Load } from '@/lib/model/load';
import type { Prepared } from './draw-structure';
import { dot } from './vector';

/** Loads that only go on with the same value along the same line: one label, on the longest, serves the whole run. */
export function goingOn({ axes }: Prepared, loads: readonly Load[]): Set<number> {
  const muted = new Set<number>();
  let told: number | undefined;
  loads.forEach((load, i) => {
    const before = loads[i - 1];
    if (!before || !goesOn(axes, before, load)) {
      told = i;
      return;
    }
    const lengthOf = (k: number) => {
      const l = loads[k];
      return l?.kind === 'distributed' ? (axes.get(l.member)?.length ?? 0) : 0;
    };
    const shorter = told !== undefined && lengthOf(i) > lengthOf(told) ? told : i;
    if (shorter === told) told = i;
    muted.add(shorter);
  });
  return muted;
}

function goesOn(axes: Prepared['axes'], a: Load, b: Load): boolean {
  if (a.kind !== 'distributed' || b.kind !== 'distributed') return false;
  const whole = [a.from, a.to, b.from, b.to].every((s) => s === undefined);
  const same = a.direction === b.direction && a.per === b.per && new Set([a.w1, a.w2, b.w1, b.w2]).size === 1;
  const [p, q] = [axes.get(a.member), axes.get(b.member)];
  return whole && same && !!p && !!q && p.member.end === q.member.start && dot(p.along, q.along) > 0.999;
}
