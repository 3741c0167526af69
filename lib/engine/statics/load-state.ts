import type { Load } from '@/lib/model/load';
import { type LocalLoads, localLoads } from '../diagrams/local-loads';
import { loadEndForces } from '../diagrams/member-forces';
import { type Equilibrium, shearAt } from './equilibrium';

/** What a set of loads brings to every row (scaled as the rows), and what it does to each member on its own. */
export interface LoadState {
  rows: Float64Array;
  local: LocalLoads[];
  /** Axial force at the start where a release at the end fixes it. */
  startAxial: number[];
}

export function loadState(eq: Equilibrium, loads: readonly Load[]): LoadState {
  const rows = new Float64Array(eq.rowCount);
  const put = (r: number, v: number) => {
    rows[r] = (rows[r] as number) + v;
  };
  const byMember = groupLoads(loads);
  let next = 3 * eq.analysis.joints.length;
  const startAxial: number[] = [];
  const local = eq.bars.map((bar) => {
    const { member, axis, start, end } = bar;
    const mine = byMember(member.id);
    const l = localLoads(mine.loads, member, axis);
    for (const w of [...l.spread, ...l.points]) w.index = mine.places[w.index] as number;
    const { V0, V1, N1 } = loadEndForces(l, axis.L);
    const N = member.releases?.end.includes('axial') === true ? -N1 : 0;
    startAxial.push(N);
    put(3 * start, -V0 * -axis.s + N * axis.c);
    put(3 * start + 1, -V0 * axis.c + N * axis.s);
    put(3 * end, V1 * -axis.s - (N + N1) * axis.c);
    put(3 * end + 1, V1 * axis.c - (N + N1) * axis.s);
    if (shearAt(bar, 'start')) put(next++, V0);
    if (shearAt(bar, 'end')) put(next++, V1);
    return l;
  });
  eq.analysis.joints.forEach((joint, j) => {
    for (const load of byMember.joints(joint.id)) {
      put(3 * j, load.x);
      put(3 * j + 1, load.y);
      put(3 * j + 2, load.couple / eq.length);
    }
  });
  return { rows, local, startAxial };
}

/** Loads by the member or joint they stand on, with their places in the case; own weight is everybody's. */
function groupLoads(loads: readonly Load[]) {
  const members = new Map<string, number[]>();
  const joints = new Map<string, Extract<Load, { kind: 'joint' }>[]>();
  const everybody: number[] = [];
  loads.forEach((load, i) => {
    if (load.kind === 'self-weight') everybody.push(i);
    else if (load.kind === 'joint') joints.set(load.joint, [...(joints.get(load.joint) ?? []), load]);
    else if (load.kind !== 'settlement') members.set(load.member, [...(members.get(load.member) ?? []), i]);
  });
  const find = (id: string) => {
    const places = [...everybody, ...(members.get(id) ?? [])].sort((a, b) => a - b);
    return { places, loads: places.map((i) => loads[i] as Load) };
  };
  return Object.assign(find, { joints: (id: string) => joints.get(id) ?? [] });
}
