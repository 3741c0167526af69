import type { Equilibrium } from '../statics/equilibrium';
import { flexibilityMatrix } from './flexibility-matrix';
import { openForces } from './open-forces';
import { proposalOrder, sweepOrder } from './proposal-order';
import { type PrimaryBasis, primaryBasis, writtenRedundants } from './self-stress';

/** A set worse conditioned than this would check rounding rather than the first solution. */
const fair = 1e5;

/**
 * A primary structure that keeps the redundants of another, or every second of them where that would leave a poor one,
 * so that other forces must be released: of those that are fairly conditioned, the one with the fewest in common. A
 * moment that stands on both sides of a joint counts as one force. Undefined where there is no such set, and beyond the
 * redundants up to which statics is written.
 */
export function otherBasis(eq: Equilibrium, basis: PrimaryBasis): PrimaryBasis | undefined {
  const n = basis.redundants.length;
  if (basis.local || n === 0 || n > writtenRedundants) return undefined;
  const groups = openForces(eq, basis).filter((g) => g.some((q) => basis.redundants.includes(q)));
  const released = new Set(groups.flat());
  const every = [groups, groups.filter((_, i) => i % 2 === 0), groups.filter((_, i) => i % 2 === 1)];
  const orders = [proposalOrder(eq), sweepOrder(eq), proposalOrder(eq).reverse()];
  const tried = every.flatMap((kept) =>
    orders.flatMap((order) => {
      const found = primaryBasis(eq, keepFirst(eq, basis, order, new Set(kept.flat())));
      if (found?.redundants.length !== n) return [];
      const shared = found.redundants.filter((q) => released.has(q)).length;
      if (shared === n) return [];
      const { condition } = flexibilityMatrix(eq, found, 1);
      return condition <= fair ? [{ found, shared, condition }] : [];
    }),
  );
  return tried.sort((a, b) => a.shared - b.shared || a.condition - b.condition)[0]?.found;
}

/** An order that takes some columns before others, behind those of open axial states: what is open must show by itself. */
function keepFirst(
  eq: Equilibrium,
  basis: PrimaryBasis,
  order: readonly number[],
  kept: ReadonlySet<number>,
) {
  const open = new Set(basis.open.flatMap((o) => [...o.state.keys()]));
  const first = proposalOrder(eq).filter((q) => open.has(q));
  const others = order.filter((q) => !open.has(q));
  return [...first, ...others.filter((q) => kept.has(q)), ...others.filter((q) => !kept.has(q))];
}
