import type { MemberDiagrams } from '../diagrams/member-diagrams';
import { valueAt } from '../diagrams/piecewise';
import { type Context, placedMember } from './context';

/** N, V, M at one end of a member. */
export interface EndForces {
  member: string;
  end: 'start' | 'end';
  joint: string;
  N: number;
  V: number;
  M: number;
}

type Three = Pick<MemberDiagrams, 'N' | 'V' | 'M'>;

/** Forces at both ends of every member of a state, in the order of its diagrams: that of the analysis. Worked out once. */
export function endForcesOf(ctx: Context, members: Readonly<Record<string, Three>>): EndForces[] {
  const known = ctx.ends.get(members);
  if (known) return known;
  const ends: EndForces[] = [];
  for (const id of Object.keys(members)) {
    const { L, start, end } = placedMember(ctx, id);
    const { N, V, M } = members[id] as Three;
    const [n, v, m] = [endsOf(N, L), endsOf(V, L), endsOf(M, L)];
    ends.push({ member: id, end: 'start', joint: start.id, N: n.start, V: v.start, M: m.start });
    ends.push({ member: id, end: 'end', joint: end.id, N: n.end, V: v.end, M: m.end });
  }
  ctx.ends.set(members, ends);
  return ends;
}

function endsOf(f: Three['M'], L: number): { start: number; end: number } {
  const size = sizeOf(f, L);
  return { start: clean(valueAt(f, 0), size), end: clean(valueAt(f, L, 'left'), size) };
}

function sizeOf(f: Three['M'], L: number): number {
  let size = 0;
  for (const { c } of f)
    for (let k = 0; k < c.length; k++) size = Math.max(size, Math.abs(c[k] as number) * L ** k);
  return size;
}

/** Rounding of the arithmetic is zero. */
const clean = (v: number, size: number): number => (Math.abs(v) <= 1e-12 * size ? 0 : v);
