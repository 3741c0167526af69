import { memberForces } from '../diagrams/member-forces';
import type { Equilibrium } from '../statics/equilibrium';
import type { LoadState } from '../statics/load-state';

/** N at the start and both end moments of every member, true values, in the order of the members. */
export interface EndForces {
  N: number;
  M0: number;
  M1: number;
}

/** End forces of member `b` from scaled quantities; released ones are zero, or what the loads leave of N. */
export function endForces(
  eq: Equilibrium,
  b: number,
  value: (q: number) => number,
  load?: LoadState,
): EndForces {
  const bar = eq.bars[b];
  if (!bar) throw new Error('no such member');
  const get = (column: number, released: number) =>
    column === -1 ? released : value(column) * (eq.scale[column] as number);
  return {
    N: get(bar.N, load === undefined ? 0 : (load.startAxial[b] as number)),
    M0: get(bar.M0, 0),
    M1: get(bar.M1, 0),
  };
}

const nothing = { spread: [], points: [] };

/** N, V, M of member `b` under end forces and, if given, its loads. */
export function memberDiagram(eq: Equilibrium, b: number, ends: EndForces, load?: LoadState) {
  const bar = eq.bars[b];
  if (!bar) throw new Error('no such member');
  return memberForces(ends, load?.local[b] ?? nothing, bar.axis.L);
}
