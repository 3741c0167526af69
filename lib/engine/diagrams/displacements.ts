import type { LocalLoads } from './local-loads';
import type { MemberDiagrams } from './member-diagrams';
import { cutAt, integral, sum } from './piecewise';
import type { Piece, PiecewisePolynomial } from './piecewise-polynomial';
import { evaluate } from './polynomial';
import type { Stretch } from './stretches';

/**
 * What is known of the ends of a member. Along: one end. Across: both ends, or one end and a rotation where a shear
 * release lets the other slide. A rotation is that of the member itself, as where it is rigidly joined.
 */
export interface KnownEnds {
  along0?: number;
  along1?: number;
  across0?: number;
  across1?: number;
  rotation0?: number;
  rotation1?: number;
}

/**
 * Rotation and displacements of a member from its forces: θ' = M/EI + κ, v' = θ − V/GAs, u' = N/EA + αT + d/L, started
 * so that they meet what is known of the ends. Rotation is that of the section (Timoshenko), not the slope.
 */
export function memberDisplacements(
  forces: Pick<MemberDiagrams, 'N' | 'V' | 'M'>,
  own: readonly Stretch[],
  loads: Pick<LocalLoads, 'strain' | 'curvature' | 'misfit'>,
  ends: KnownEnds,
  L: number,
): Pick<MemberDiagrams, 'rotation' | 'across' | 'along'> {
  const even = (value: number): PiecewisePolynomial => [{ from: 0, to: L, c: [value] }];
  const bend = sum([
    { f: divide(forces.M, own, (s) => s.EI), factor: 1 },
    { f: even(loads.curvature), factor: 1 },
  ]);
  const sheared = divide(forces.V, own, (s) => s.GAs);
  const stretched = sum([
    { f: divide(forces.N, own, (s) => s.EA), factor: 1 },
    { f: even(loads.strain + loads.misfit / L), factor: 1 },
  ]);
  const path = (theta0: number, across0: number) =>
    integral(
      sum([
        { f: integral(bend, theta0), factor: 1 },
        { f: sheared, factor: -1 },
      ]),
      across0,
    );
  const { theta0, across0 } = startOf(ends, L, last(integral(bend, 0)), last(path(0, 0)));
  const along = ends.along0 ?? required(ends.along1) - last(integral(stretched, 0));
  return {
    rotation: integral(bend, theta0),
    across: path(theta0, across0),
    along: integral(stretched, along),
  };
}

/** Rotation and displacement at the start, given what the member turns and drifts by itself on its length. */
function startOf(
  ends: KnownEnds,
  L: number,
  turn: number,
  drift: number,
): { theta0: number; across0: number } {
  const { across0, across1 } = ends;
  if (across0 !== undefined && across1 !== undefined) {
    return { theta0: (across1 - across0 - drift) / L, across0 };
  }
  const theta0 = ends.rotation0 ?? required(ends.rotation1) - turn;
  return { theta0, across0: across0 ?? required(across1) - drift - theta0 * L };
}

function required(value: number | undefined): number {
  if (value === undefined) throw new Error('too little is known of the ends of a member');
  return value;
}

function last(f: PiecewisePolynomial): number {
  const piece = f[f.length - 1] as Piece;
  return evaluate(piece.c, piece.to - piece.from);
}

/** f over the stiffness of each stretch; zero where the stiffness is absent (it does not give way). */
function divide(
  f: PiecewisePolynomial,
  own: readonly Stretch[],
  stiffness: (s: Stretch) => number | undefined,
): Piece[] {
  const places = own.map((s) => s.from);
  return cutAt(f, places).map((p) => {
    const k = stiffness(own.find((s) => p.from >= s.from && p.to <= s.to) as Stretch);
    return { ...p, c: k === undefined ? [0] : p.c.map((c) => c / k) };
  });
}
