import type { Quantity } from '@/lib/model/quantity';
import type { Equilibrium } from '../statics/equilibrium';
import { planStatics } from '../statics/plan-statics';
import { callsUpMuch, exchangeRedundants } from './exchange-redundants';
import { flexibilityMatrix } from './flexibility-matrix';
import { proposalOrder, sweepOrder } from './proposal-order';
import { type PrimaryBasis, primaryBasis, writtenRedundants } from './self-stress';

/**
 * The set that the engine proposes. Continuous beams: moments over the supports, so that the three-moment equation
 * appears by itself. A frame with one redundant: the thrust at its last base, as it is done by hand. Other frames:
 * hinges; where a person could not find the forces of that structure one at a time, reactions from the last base
 * backwards. Large frames: what is left over joint by joint from the ground up. A set whose unit states call up forces
 * many times their own is exchanged for a better one where that is much better conditioned.
 */
export function proposeRedundants(eq: Equilibrium): PrimaryBasis {
  const familiar = familiarRedundants(eq);
  if (familiar.local || !callsUpMuch(familiar)) return familiar;
  // Large forces alone say little (a moment in a short member has a large shear): the condition decides.
  const exchanged = exchangeRedundants(familiar);
  const conditionOf = (basis: PrimaryBasis) => flexibilityMatrix(eq, basis, 1).condition;
  return conditionOf(familiar) <= fair * conditionOf(exchanged) ? familiar : exchanged;
}

/** The familiar set is given up where another is conditioned so many times better. */
const fair = 30;

function familiarRedundants(eq: Equilibrium): PrimaryBasis {
  const hinges = primaryBasis(eq, proposalOrder(eq));
  if (!hinges) return primaryBasis(eq, sweepOrder(eq), true) as PrimaryBasis;
  const n = hinges.redundants.length;
  if (n === 0 || n > writtenRedundants || hinges.unstable || hinges.open.length > 0 || isBeam(eq))
    return hinges;
  const thrust = n === 1 ? lastThrust(eq) : undefined;
  if (thrust && canBeWritten(eq, thrust)) return thrust;
  if (canBeWritten(eq, hinges)) return hinges;
  const bases = primaryBasis(eq, basesLast(eq));
  return bases && canBeWritten(eq, bases) ? bases : hinges;
}

/** Whether a person could find the forces of the primary structure one unknown at a time. */
function canBeWritten(eq: Equilibrium, basis: PrimaryBasis): boolean {
  const names = basis.redundants.map((q) => eq.quantities[q] as Quantity);
  const plan = planStatics(eq, names);
  return plan?.steps.every((s) => s.kind === 'equation') === true;
}

function lastThrust(eq: Equilibrium): PrimaryBasis | undefined {
  const thrust = eq.quantities.findLastIndex((q) => q.kind === 'reaction' && q.component === 'x');
  if (thrust === -1) return undefined;
  const basis = primaryBasis(eq, [...proposalOrder(eq).filter((q) => q !== thrust), thrust]);
  return basis?.redundants[0] === thrust ? basis : undefined;
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
