import type { Quantity } from '@/lib/model/quantity';

/** One force of an equilibrium equation: `coefficient` is its arm (with sign) in a moment sum, its direction cosine in a force sum. */
export interface StaticsTerm {
  coefficient: number;
  value: number;
  /** What the force is: a force quantity found before or sought now, a load of the case, or the unit redundant. */
  of:
    | { kind: 'quantity'; quantity: Quantity }
    /** Shear or axial force passed at a cut or hinge between two pieces, in global x or y. */
    | { kind: 'interface'; member: string; end: 'start' | 'end'; component: 'x' | 'y' }
    /** Resultant of load `index` of the case (or a part of it): intensity × length for distributed loads. */
    | { kind: 'load'; index: number; intensity?: number; length?: number }
    | { kind: 'unit'; redundant: number };
}

/** How a person finds the forces of a statically determinate structure, one line after another. */
export type StaticsLine =
  | {
      kind: 'equation';
      /** Members of the piece that is in equilibrium. */
      piece: string[];
      sum: { kind: 'moment'; x: number; y: number; joint?: string } | { kind: 'force'; x: number; y: number };
      terms: StaticsTerm[];
      /** The one unknown and its value. */
      unknown: StaticsTerm['of'];
      value: number;
    }
  | {
      /** What resists one-at-a-time: a small system, equations as above without `unknown`. */
      kind: 'simultaneous';
      equations: {
        piece: string[];
        sum:
          | { kind: 'moment'; x: number; y: number; joint?: string }
          | { kind: 'force'; x: number; y: number };
        terms: StaticsTerm[];
      }[];
      unknowns: { of: StaticsTerm['of']; value: number }[];
    }
  /** An equation left over, printed as a check: its terms sum to zero. */
  | {
      kind: 'check';
      piece: string[];
      sum: { kind: 'moment'; x: number; y: number; joint?: string } | { kind: 'force'; x: number; y: number };
      terms: StaticsTerm[];
      residual: number;
    };
