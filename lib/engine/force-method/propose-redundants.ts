import type { Quantity } from '@/lib/model/quantity';
import type { Equilibrium } from '../statics/equilibrium';
import { writeStatics } from '../statics/write-statics';
import { type PrimaryBasis, primaryBasis, proposalOrder } from './self-stress';

/**
 * The set that the engine proposes. Continuous beams: moments over the supports, so that the three-moment equation
 * appears by itself. A frame with one redundant: the thrust at its last base, as it is done by hand. Other frames:
 * hinges. Every set is checked to leave a stable primary structure.
 */
export function proposeRedundants(eq: Equilibrium): PrimaryBasis {
  const hinges = primaryBasis(eq, proposalOrder(eq));
  if (isBeam(eq) || hinges.redundants.length === 0) return hinges;
  const bases = primaryBasis(eq, basesLast(eq));
  const thrust = hinges.redundants.length === 1 ? lastThrust(eq) : undefined;
  return [thrust, hinges, bases].find((b) => b !== undefined && canBeWritten(eq, b)) ?? hinges;
}

/** Whether a person could find the forces of the primary structure one unknown at a time. */
function canBeWritten(eq: Equilibrium, basis: PrimaryBasis): boolean {
  if (basis.redundants.length > 12) return true;
  const names = basis.redundants.map((q) => eq.quantities[q] as Quantity);
  return basis.redundants.every(
    (_, redundant) => writeStatics(eq, names, { kind: 'unit', redundant }).length > 0,
  );
}

function lastThrust(eq: Equilibrium): PrimaryBasis | undefined {
  const thrust = eq.quantities.findLastIndex((q) => q.kind === 'reaction' && q.component === 'x');
  if (thrust === -1) return undefined;
  const basis = primaryBasis(eq, [...proposalOrder(eq).filter((q) => q !== thrust), thrust]);
  return basis.redundants[0] === thrust ? basis : undefined;
}

/** Reactions from the last support backwards are left over first: the frame stands as a cantilever on its first base. */
function basesLast(eq: Equilibrium): number[] {
  const all = eq.quantities.map((q, i) => ({ q, i }));
  const members = all.filter(({ q }) => q.kind !== 'reaction').map(({ i }) => i);
  const reactions = all.filter(({ q }) => q.kind === 'reaction').map(({ i }) => i);
  return [...members, ...reactions];
}

function isBeam(eq: Equilibrium): boolean {
  return eq.bars.every((b) => Math.abs(b.axis.s) < 1e-12);
}
