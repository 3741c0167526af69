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

/** Forces at both ends of every member of a state, in the order of its diagrams: that of the analysis. */
export function endForcesOf(ctx: Context, members: Readonly<Record<string, Three>>): EndForces[] {
  return Object.entries(members).flatMap(([id, diagrams]) => {
    const { L, start, end } = placedMember(ctx, id);
    return (['start', 'end'] as const).map((which): EndForces => {
      const at = (f: Three['M']) =>
        clean(which === 'start' ? valueAt(f, 0) : valueAt(f, L, 'left'), sizeOf(f, L));
      return {
        member: id,
        end: which,
        joint: which === 'start' ? start.id : end.id,
        N: at(diagrams.N),
        V: at(diagrams.V),
        M: at(diagrams.M),
      };
    });
  });
}

const sizeOf = (f: Three['M'], L: number): number =>
  Math.max(...f.flatMap((p) => p.c.map((c, k) => Math.abs(c) * L ** k)), 0);

/** Rounding of the arithmetic is zero. */
const clean = (v: number, size: number): number => (Math.abs(v) <= 1e-12 * size ? 0 : v);
