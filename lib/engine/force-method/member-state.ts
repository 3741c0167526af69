import { type Quantity, quantityKey } from '@/lib/model/quantity';
import { memberForces } from '../diagrams/member-forces';
import type { Equilibrium, LoadState } from '../statics/equilibrium';

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
  const get = (q: Quantity, released: number) => {
    const index = eq.indexOf.get(quantityKey(q));
    return index === undefined ? released : value(index) * (eq.scale[index] as number);
  };
  const member = bar.member.id;
  return {
    N: get({ kind: 'axial', member }, load === undefined ? 0 : (load.startAxial[b] as number)),
    M0: get({ kind: 'moment', member, end: 'start' }, 0),
    M1: get({ kind: 'moment', member, end: 'end' }, 0),
  };
}

const nothing = { spread: [], points: [] };

/** N, V, M of member `b` under end forces and, if given, its loads. */
export function memberDiagram(eq: Equilibrium, b: number, ends: EndForces, load?: LoadState) {
  const bar = eq.bars[b];
  if (!bar) throw new Error('no such member');
  return memberForces(ends, load?.local[b] ?? nothing, bar.axis.L);
}
