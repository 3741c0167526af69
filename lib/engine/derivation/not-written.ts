import { unitStatesUpTo } from '../force-method/self-stress';
import type { Context } from './context';

/** Why a part of the calculation is given by its results alone. */
export type NotWritten =
  /** The unit states reach across a structure with too many redundants: states around single cells took their place. */
  | { why: 'cells'; redundants: number; upTo: number }
  /** So many lines that no person would follow them. */
  | { why: 'size'; redundants: number; members: number }
  /** The same lines as those of the cases or states before it. */
  | { why: 'alike' }
  /** No order of equations in which a few unknowns at a time come out. */
  | { why: 'order' }
  /** A load that the lines do not write: one whose resultant is a couple, or one on a bar that is cut. */
  | { why: 'couple' };

/** Where states around single cells stand for the unit states: no step that is made of unit states can be written. */
export function cellsInstead({ solution }: Context): NotWritten | undefined {
  if (solution.primary.written !== 'results') return undefined;
  return { why: 'cells', redundants: solution.redundants.length, upTo: unitStatesUpTo };
}

/** The size of a sheet as the reason. */
export function tooLong({ solution, analysis }: Context): NotWritten {
  return { why: 'size', redundants: solution.redundants.length, members: analysis.members.length };
}
