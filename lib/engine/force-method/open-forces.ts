import type { Quantity } from '@/lib/model/quantity';
import type { Equilibrium } from '../statics/equilibrium';
import { endJoint } from '../statics/name-force';
import { tolerance } from '../tolerance';
import type { PrimaryBasis } from './self-stress';

/**
 * Columns that some redundant changes. Moments at one joint that are one moment (their values in all self-stress states
 * stand in one ratio) form a group, led by a redundant where there is one.
 */
export function openForces(eq: Equilibrium, { states, redundants }: PrimaryBasis): number[][] {
  const rows = new Map<number, [number, number][]>();
  states.forEach((state, i) => {
    let top = 0;
    for (const v of state.values()) top = Math.max(top, Math.abs(v));
    for (const [q, v] of state) {
      if (Math.abs(v) <= tolerance.fixed * top) continue;
      const row = rows.get(q);
      if (row) row.push([i, v]);
      else rows.set(q, [[i, v]]);
    }
  });
  const first = new Set(redundants);
  const columns = [...rows.keys()].sort((a, b) => Number(first.has(b)) - Number(first.has(a)) || a - b);
  const groups = new Map<string, number[]>();
  for (const q of columns) {
    const row = rows.get(q) as [number, number][];
    const lead = (row[0] as [number, number])[1];
    const joint = turningAt(eq, eq.quantities[q] as Quantity);
    const key =
      joint === undefined
        ? `${q}`
        : `${joint}|${row.map(([i, v]) => `${i}:${(v / lead).toPrecision(8)}`).join()}`;
    const group = groups.get(key);
    if (group) group.push(q);
    else groups.set(key, [q]);
  }
  return [...groups.values()];
}

/** The joint that a moment turns; undefined for forces. */
function turningAt(eq: Equilibrium, q: Quantity): string | undefined {
  if (q.kind === 'moment') return endJoint(eq, q);
  return q.kind === 'reaction' && q.component === 'turn' ? q.joint : undefined;
}
