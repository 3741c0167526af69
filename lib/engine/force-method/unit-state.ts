import type { Bar, Equilibrium } from '../statics/equilibrium';
import { endForces } from './member-state';

/** What one unit state does: forces of the members it reaches, reactions it calls up. Order of members and columns. */
export interface UnitState {
  members: Map<number, { N: number; V: number; m0: number; m1: number }>;
  reactions: Map<number, number>;
}

/** True (not scaled) forces of a state of scaled quantities, for the members it reaches. */
export function unitState(eq: Equilibrium, scaled: ReadonlyMap<number, number>, factor: number): UnitState {
  const state: UnitState = { members: new Map(), reactions: new Map() };
  const value = (q: number) => {
    const v = scaled.get(q);
    return v === undefined ? 0 : v * factor;
  };
  const reached = new Set<number>();
  for (const [q, v] of scaled) {
    const b = eq.barOf[q] as number;
    if (b === -1) state.reactions.set(q, v * (eq.scale[q] as number) * factor);
    else reached.add(b);
  }
  for (const b of [...reached].sort((x, y) => x - y)) {
    const e = endForces(eq, b, value);
    const { L } = (eq.bars[b] as Bar).axis;
    state.members.set(b, { N: e.N, V: (e.M1 - e.M0) / L, m0: e.M0, m1: e.M1 });
  }
  return state;
}
