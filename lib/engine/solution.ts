import type { Analysis } from '@/lib/model/analysis';
import type { Quantity } from '@/lib/model/quantity';
import type { Mechanism } from '@/lib/model/refusal';
import type { MemberDiagrams } from './diagrams/member-diagrams';
import type { MomentPart, WorkRow } from './force-method/work';
import type { StaticsLine } from './statics/statics-line';

/**
 * Everything the engine found about one analysis, as numbers and references, in the sheet's coherent units.
 *
 * Signs. Bending moment positive with tension on the right-hand face when walking a member from start to end: the
 * underside of a beam drawn left to right, the inner face of a frame drawn up, across and down. V = dM/ds. N tension
 * positive. Global x right, y up; couples and rotations counter-clockwise. Reactions are forces of the support on the
 * structure. Member coordinate s runs from start to end; `across` is to the left of the walk.
 */
export interface Solution {
  /** Engine version; part of what a revision freezes. */
  engine: string;
  analysis: Analysis;
  /** Units of EI0 the work integrals are multiplied by; `value` is absent when forces need no EI0 and none is given. */
  reference: { value?: number; member?: string };
  determinacy: Determinacy;
  /** Quantities that equilibrium alone fixes, whatever the redundants: value per case id. */
  fixed: { quantity: Quantity; values: Record<string, number> }[];
  /** In order X1, X2, …; `proposed` tells whether it is the engine's own set. */
  redundants: Quantity[];
  proposed: boolean;
  /** 2-norm condition of the flexibility matrix scaled to a unit diagonal (1 when n = 0); of the local states' own where those took the place of unit states. */
  condition: number;
  primary: PrimaryStructure;
  work: VirtualWork;
  /** Redundants per case id, in the order of `redundants`. */
  X: Record<string, number[]>;
  cases: Record<string, CaseResult>;
  combinations: CombinationResult[];
  envelopes: Envelope[];
  displacements: DisplacementResult[];
  checks: Check[];
  /** The redundants of the second solution that checks the first, where it was asked for. */
  other?: { redundants: Quantity[]; condition: number };
}

export interface Determinacy {
  members: number;
  joints: number;
  /** Reaction components, springs included. */
  reactions: number;
  releases: number;
  /** Columns and non-trivial rows of the equilibrium matrix. */
  unknowns: number;
  equations: number;
  rank: number;
  degree: number;
  /** Degree less the purely axial self-stress states that bending cannot determine. */
  bendingDegree: number;
  /** Members whose axial force is open and taken as zero (inextensible, nothing loads them along). */
  openAxial: string[];
  /** Smallest accepted pivot of the scaled matrix, and the tolerance it was held against. */
  smallestPivot: number;
  tolerance: number;
}

export interface PrimaryStructure {
  /**
   * `lines`: every line of statics and every row of work. `tables`, with more than 30 redundants or 150 members: states
   * and totals without lines and rows. `results`, with more than 150 redundants where unit states would reach far (frames
   * of many storeys): the compatibility equations are set for self-stress states around single cells, and pieces, states,
   * parts, flexibility and gaps are all empty.
   */
  written: 'lines' | 'tables' | 'results';
  /** Rigid pieces between hinges and cuts: member ids of each. */
  pieces: string[][];
  /** Member forces and reactions under each case, redundants zero, and how a person finds them. */
  loaded: Record<string, StaticState>;
  /** Under Xi = 1, in the order of the redundants. */
  units: StaticState[];
}

export interface StaticState {
  reactions: { quantity: Quantity; value: number }[];
  /** N, V, M only; displacement diagrams are left out. */
  members: Record<string, Pick<MemberDiagrams, 'N' | 'V' | 'M'>>;
  lines: StaticsLine[];
}

export interface VirtualWork {
  /** Named shapes the primary moment diagram is made of, per case id. */
  parts: Record<string, MomentPart[]>;
  /** EI0 f_ij, j ≤ i (symmetric; zero entries left out). */
  flexibility: { i: number; j: number; rows: WorkRow[]; total: number }[];
  /** EI0 δ_i0 per case, and the prescribed movement of the released support (right-hand side, times EI0). */
  gaps: { i: number; case: string; rows: WorkRow[]; total: number; rightSide: number }[];
}

export interface CaseResult {
  reactions: { quantity: Quantity; value: number }[];
  members: Record<string, MemberDiagrams>;
  /** Joint displacements x, y (length) and rotation of the joint where members are rigidly joined; over EI0 when EI0 has no value. */
  joints: Record<string, { x: number; y: number; rotation?: number }>;
  /** True when displacements are EI0 times the true ones, since EI0 has no value. */
  displacementsTimesEI0: boolean;
}

export interface CombinationResult {
  id: string;
  reactions: { quantity: Quantity; value: number }[];
  members: Record<string, Pick<MemberDiagrams, 'N' | 'V' | 'M'>>;
}

/** Greatest and least of N, V, M at stations of a member, each with the combination that gives it. */
export interface Envelope {
  member: string;
  purpose: 'strength' | 'service';
  stations: {
    s: number;
    N: Extreme;
    V: Extreme;
    M: Extreme;
  }[];
}

export interface Extreme {
  max: number;
  maxBy: string;
  min: number;
  minBy: string;
}

export interface DisplacementResult {
  /** Index into analysis.displacements. */
  ask: number;
  /** The unit load on the primary structure. */
  unit: StaticState;
  /** Per case: EI0 times the displacement with its rows, and the displacement itself when EI0 has a value. */
  cases: Record<string, { rows: WorkRow[]; total: number; value?: number }>;
  combinations: { id: string; value?: number; ratio?: number }[];
}

/** A check with its residual against a named relative tolerance; `holds` false never leaves the engine. */
export interface Check {
  kind: 'equilibrium' | 'second-way' | 'reciprocity' | 'gap' | 'other-redundants';
  subject: string;
  case?: string;
  residual: number;
  tolerance: number;
  holds: boolean;
}

/** Answer about one choice of redundants, without solving. */
export type Choice =
  | { good: true; condition: number }
  | { good: false; code: string; message: string; mechanism?: Mechanism };
