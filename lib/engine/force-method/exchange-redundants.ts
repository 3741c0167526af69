import type { PrimaryBasis, SelfStress } from './self-stress';

/** A force beyond so many times its redundant (moments over the mean member length) may speak of a primary structure near instability. */
const suspicious = 30;

/** Exchanges go on until no unit state calls up more than this. */
const settled = 2;

const mostExchanges = 100;

/** Whether a unit state calls up forces many times its own. */
export const callsUpMuch = ({ states }: PrimaryBasis): boolean => largestOf(states).size > suspicious;

/**
 * The same structure with better redundants, where a unit state calls up forces many times its own: the largest of them
 * takes the place of that redundant, again and again. Each exchange enlarges the determinant of the kept columns, so the
 * search ends (Goreinov, Tyrtyshnikov and others on submatrices of maximal volume, as recalled).
 */
export function exchangeRedundants(basis: PrimaryBasis): PrimaryBasis {
  const states = basis.states.map((s) => new Map(s));
  const redundants = [...basis.redundants];
  for (let k = 0; k < mostExchanges; k++) {
    const { i, q, size } = largestOf(states);
    if (size <= settled) break;
    const pivot = states[i]?.get(q) as number;
    const own = new Map([...(states[i] as SelfStress)].map(([c, v]) => [c, v / pivot]));
    own.set(q, 1);
    states.forEach((state, j) => {
      const factor = state.get(q);
      if (j !== i && factor !== undefined) subtract(state, own, factor, q);
    });
    states[i] = own;
    redundants[i] = q;
  }
  return { ...basis, redundants, states };
}

function subtract(state: SelfStress, other: SelfStress, factor: number, gone: number): void {
  for (const [c, v] of other) {
    const before = state.get(c);
    const value = before === undefined ? -factor * v : before - factor * v;
    const size = Math.max(Math.abs(factor * v), before === undefined ? 0 : Math.abs(before));
    if (c === gone || Math.abs(value) <= 1e-14 * size) state.delete(c);
    else state.set(c, value);
  }
}

function largestOf(states: readonly SelfStress[]): { i: number; q: number; size: number } {
  let [i, q, size] = [-1, -1, 0];
  states.forEach((state, k) => {
    for (const [c, v] of state) if (Math.abs(v) > size) [i, q, size] = [k, c, Math.abs(v)];
  });
  return { i, q, size };
}
