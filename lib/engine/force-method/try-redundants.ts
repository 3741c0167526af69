import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { Choice } from '../solution';
import type { Equilibrium } from '../statics/equilibrium';
import { forceName } from '../statics/name-force';
import { leftNullVector } from '../statics/solve-lu';
import { factorColumns, type SparseLu } from '../statics/sparse-lu';
import { tolerance } from '../tolerance';
import { releasesNothing } from './idle-release';
import { refuseRelease } from './refuse-release';
import { fixedQuantities, type PrimaryBasis } from './self-stress';

/** A good set as columns, with the factor of its values in the known self-stress states; or why it is refused. */
export type TriedSet = { good: true; columns: number[]; lu: SparseLu } | Extract<Choice, { good: false }>;

/**
 * Tries a set of redundants: each must be a force of the structure that equilibrium leaves open, and all together must
 * leave it stable. The set is good when its values in the self-stress states of another good set form a regular matrix.
 */
export function tryRedundants(
  eq: Equilibrium,
  proposed: PrimaryBasis,
  quantities: readonly Quantity[],
  fixed: ReadonlySet<number> = new Set(fixedQuantities(eq, proposed)),
): TriedSet {
  const columns: number[] = [];
  for (const q of quantities) {
    const column = eq.indexOf.get(quantityKey(q));
    const alone = column === undefined ? missing(eq, q) : faultOf(eq, proposed, column, columns, fixed);
    if (alone) return alone;
    columns.push(column as number);
  }
  const degree = proposed.redundants.length;
  if (columns.length < degree) return bad('too-few', tooFew(degree - columns.length, degree));
  const place = new Map(columns.map((c, i) => [c, i]));
  const inSet = proposed.states.map((state) => {
    const hits = [...state].filter(([q]) => place.has(q));
    return { rows: hits.map(([q]) => place.get(q) as number), values: hits.map(([, v]) => v) };
  });
  const lu = factorColumns(
    inSet,
    inSet.map((_, i) => i),
    columns.length,
    tolerance.pivot,
  );
  const [free] = lu.freeRows;
  if (free !== undefined) {
    const opened = leftNullVector(lu, free);
    const refusal = refuseRelease(eq, proposed, columns, opened);
    if (columns.length > degree && refusal.code !== 'same-force')
      return {
        ...refusal,
        code: 'too-many',
        message: `${tooMany(columns.length, degree)} ${refusal.message}`,
      };
    return refusal;
  }
  return { good: true, columns, lu };
}

const bad = (code: string, message: string): Extract<Choice, { good: false }> => ({
  good: false,
  code,
  message,
});

function faultOf(
  eq: Equilibrium,
  proposed: PrimaryBasis,
  column: number,
  before: readonly number[],
  fixed: ReadonlySet<number>,
): Extract<Choice, { good: false }> | undefined {
  const q = eq.quantities[column] as Quantity;
  const name = forceName(eq, q);
  if (before.includes(column)) return bad('same-force', `${name} stands twice in the set.`);
  if (proposed.open.some((o) => o.state.has(column)) && !proposed.states.some((s) => s.has(column)))
    return bad(
      'open-axial',
      `${name} is not determined by bending: the members along it are held lengthwise and do not stretch, and it is taken as zero. Leave it out, or state EA.`,
    );
  if (!fixed.has(column)) return undefined;
  const idle = releasesNothing(eq, q);
  if (idle) return bad('nothing-released', idle);
  const opened = refuseRelease(eq, proposed, [column], Float64Array.of(1));
  return { ...opened, code: 'fixed', message: `${opened.message} Equilibrium alone gives ${name}.` };
}

function missing(eq: Equilibrium, q: Quantity): Extract<Choice, { good: false }> {
  const idle = releasesNothing(eq, q);
  return bad('nothing-released', idle ?? `There is no force ${forceName(eq, q)} in this structure.`);
}

function tooFew(n: number, degree: number): string {
  const more = n === 1 ? 'One more release is needed' : `${n} more releases are needed`;
  return `${more}: the primary structure is still indeterminate${degree === 1 ? ' to the first degree' : ''}.`;
}

function tooMany(chosen: number, degree: number): string {
  const free = degree === 0 ? 'none is' : degree === 1 ? 'one is' : `${degree} are`;
  return `${chosen === 1 ? 'One is' : `${chosen} are`} released, ${free} free: restore ${chosen - degree === 1 ? 'one' : chosen - degree}.`;
}
