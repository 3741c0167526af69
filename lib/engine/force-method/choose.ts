import type { Analysis } from '@/lib/model/analysis';
import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { Choice } from '../solution';
import { describeMechanism } from '../statics/describe-mechanism';
import { type Equilibrium, equilibrium } from '../statics/equilibrium';
import { mechanismOf } from '../statics/mechanism';
import { leftNullVector } from '../statics/sparse-lu';
import { referenceStiffness, withReference } from './reference';
import { fixedQuantities, type PrimaryBasis, primaryBasis, proposalOrder } from './self-stress';
import { solveRedundants } from './solve-redundants';

/** The primary structure that a choice of redundants leaves, or why it cannot be used. */
export type ChosenBasis = { good: true; basis: PrimaryBasis } | Extract<Choice, { good: false }>;

const bad = (code: string, message: string): ChosenBasis => ({ good: false, code, message });

/** Tries a set of redundants: each must be a force of the structure that equilibrium leaves open, and all together must leave it stable. */
export function chooseBasis(
  eq: Equilibrium,
  proposed: PrimaryBasis,
  quantities: readonly Quantity[],
): ChosenBasis {
  const degree = proposed.redundants.length;
  const columns: number[] = [];
  const fixed = new Set(fixedQuantities(eq, proposed));
  for (const q of quantities) {
    const column = eq.indexOf.get(quantityKey(q));
    if (column === undefined)
      return bad('nothing-released', `There is no ${nameOf(q)} to release: it is free already.`);
    if (columns.includes(column)) return bad('same-twice', `The ${nameOf(q)} stands twice in the set.`);
    if (fixed.has(column))
      return bad('fixed', `The ${nameOf(q)} is fixed by equilibrium alone. It cannot be a redundant.`);
    columns.push(column);
  }
  if (columns.length < degree)
    return bad(
      'too-few',
      `${count(degree - columns.length)} needed: the primary structure would still be indeterminate.`,
    );
  if (columns.length > degree)
    return bad(
      'too-many',
      `${columns.length} are released, ${degree === 1 ? 'one is' : `${degree} are`} free: restore ${columns.length - degree}.`,
    );
  const others = proposalOrder(eq).filter((q) => !columns.includes(q));
  const basis = primaryBasis(eq, [...others, ...columns]);
  const kept = columns.filter((c) => !basis.redundants.includes(c));
  if (kept.length > 0) return refuse(eq, others, quantities);
  const order = columns.map((c) => basis.redundants.indexOf(c));
  return {
    good: true,
    basis: { ...basis, redundants: columns, units: order.map((i) => basis.units[i] as Map<number, number>) },
  };
}

function refuse(eq: Equilibrium, others: readonly number[], quantities: readonly Quantity[]): ChosenBasis {
  const remaining = primaryBasis(eq, others);
  const free = remaining.lu.freeRows.find((r) => !eq.trivialRows.has(r));
  if (free === undefined) throw new Error('a refused set that leaves nothing free');
  const mechanism = mechanismOf(eq, leftNullVector(remaining.lu, free));
  const twin = quantities.some((q) => q.kind === 'moment') && mechanism.pieces.length === 0;
  if (twin)
    return {
      good: false,
      code: 'same-force',
      message:
        'Two of these are one force: where only two members meet, the moments at their ends are the same. Release one of them.',
      mechanism,
    };
  const said = describeMechanism(eq, mechanism);
  return { good: false, code: said.code, message: said.message, mechanism };
}

/** The answer about a set of redundants, for a form: whether it leaves a stable primary structure, and how well conditioned it is. */
export function choose(analysis: Analysis, quantities: readonly Quantity[]): Choice {
  const reference = referenceStiffness(analysis);
  const eq = equilibrium(withReference(analysis, reference));
  const proposed = primaryBasis(eq, proposalOrder(eq));
  const chosen = chooseBasis(eq, proposed, quantities);
  if (!chosen.good) return chosen;
  const solved = solveRedundants(eq, chosen.basis, [], reference.EI0);
  if (!solved)
    return {
      good: false,
      code: 'open-axial',
      message: 'This set leaves a force along the members open that bending cannot determine.',
    };
  return { good: true, condition: solved.condition };
}

function nameOf(q: Quantity): string {
  switch (q.kind) {
    case 'reaction':
      return q.component === 'turn' ? `fixing moment at ${q.joint}` : `reaction ${q.component} at ${q.joint}`;
    case 'axial':
      return `axial force of ${q.member}`;
    case 'moment':
      return `moment at the ${q.end} of ${q.member}`;
  }
}

function count(n: number): string {
  return n === 1 ? 'One more release is' : `${n} more releases are`;
}
