/** Shapes of moment diagrams by parts, named as the trade names them. */
export type PartShape =
  | 'rectangle'
  | 'triangle'
  | 'parabola'
  | 'half-parabola'
  | 'spandrel'
  | 'cubic'
  | 'cubic-spandrel';

/**
 * One named shape of a primary moment diagram on one member.
 * `height` is the signed ordinate at the tall end (triangle, spandrels), the middle (parabola) or the peak.
 * area = factor × (to − from) × height; `centroid` is measured along the member from its start.
 */
export interface MomentPart {
  member: string;
  shape: PartShape;
  from: number;
  to: number;
  tall: 'start' | 'end' | 'peak';
  height: number;
  factor: { n: number; d: number };
  area: number;
  centroid: number;
  /** What draws it: a load of the case, or a moment at an end of the member. */
  due: { kind: 'load'; index: number } | { kind: 'end-moment'; end: 'start' | 'end' };
}

/** One row of a virtual-work table; `value` adds to EI0 δ or EI0 f. */
export type WorkRow =
  /** area × ordinate ÷ k, k = EI/EI0. In a flexibility row the area is that of m̄_j on the stretch. */
  | {
      kind: 'bending';
      member: string;
      from: number;
      to: number;
      shape: PartShape;
      /** Height and area of the one diagram, its centroid, and the ordinate of the straight other one there. */
      height: number;
      area: number;
      centroid: number;
      ordinate: number;
      k: number;
      value: number;
      due?: MomentPart['due'];
    }
  /** EI0 Σ N̄ N L/EA */
  | { kind: 'axial'; member: string; unit: number; force: number; length: number; EA: number; value: number }
  /** EI0 Σ V̄ V L/GAs */
  | { kind: 'shear'; member: string; unit: number; force: number; length: number; GAs: number; value: number }
  /** EI0 R̄ R/k at a spring support */
  | {
      kind: 'spring';
      joint: string;
      component: 'x' | 'y' | 'turn';
      unit: number;
      force: number;
      stiffness: number;
      value: number;
    }
  /** EI0 N̄ α T L */
  | {
      kind: 'temperature';
      member: string;
      unit: number;
      alpha: number;
      rise: number;
      length: number;
      value: number;
    }
  /** EI0 (area of m̄) κ, κ = −α ΔT/h */
  | { kind: 'gradient'; member: string; area: number; curvature: number; value: number }
  /** EI0 N̄ d */
  | { kind: 'misfit'; member: string; unit: number; misfit: number; value: number }
  /** −EI0 R̄ Δ */
  | {
      kind: 'settlement';
      joint: string;
      component: 'x' | 'y' | 'turn';
      unit: number;
      movement: number;
      value: number;
    };
