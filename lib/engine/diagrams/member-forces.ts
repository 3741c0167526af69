import type { LocalLoads } from './local-loads';
import type { Piece, PiecewisePolynomial } from './piecewise-polynomial';
import { evaluate, integrate } from './polynomial';

/**
 * N, V and M of a member from its axial force at the start, its end moments and its loads.
 * dN/ds = −p, dV/ds = q, dM/ds = V; a point force raises V by itself, a counter-clockwise couple lowers M by itself.
 */
export function memberForces(
  ends: { N: number; M0: number; M1: number },
  loads: Pick<LocalLoads, 'spread' | 'points'>,
  L: number,
): { N: PiecewisePolynomial; V: PiecewisePolynomial; M: PiecewisePolynomial } {
  const places = breakPlaces(loads, L);
  const free = run(places, loads, { N: ends.N, V: 0, M: 0 });
  const V0 = (ends.M1 - ends.M0 - free.atEnd.M) / L;
  const { N, V, M } = run(places, loads, { N: ends.N, V: V0, M: ends.M0 });
  return { N, V, M };
}

/** Shear at both ends and axial force at the end of a member that only its loads act on (N = M = 0 at the ends). */
export function loadEndForces(
  loads: Pick<LocalLoads, 'spread' | 'points'>,
  L: number,
): { V0: number; V1: number; N1: number } {
  const places = breakPlaces(loads, L);
  const free = run(places, loads, { N: 0, V: 0, M: 0 }).atEnd;
  const V0 = -free.M / L;
  return { V0, V1: V0 + free.V, N1: free.N };
}

function breakPlaces(loads: Pick<LocalLoads, 'spread' | 'points'>, L: number): number[] {
  const inner = [...loads.spread.flatMap((w) => [w.from, w.to]), ...loads.points.map((p) => p.at)];
  return [...new Set([0, ...inner.filter((s) => s > 0 && s < L), L])].sort((a, b) => a - b);
}

function run(
  places: readonly number[],
  loads: Pick<LocalLoads, 'spread' | 'points'>,
  start: { N: number; V: number; M: number },
) {
  const N: Piece[] = [];
  const V: Piece[] = [];
  const M: Piece[] = [];
  let at = { ...start };
  const L = places[places.length - 1] as number;
  for (let i = 1; i < places.length; i++) {
    const from = places[i - 1] as number;
    const to = places[i] as number;
    at = jump(at, loads, from);
    const q = intensity(loads, from, to, 'across');
    const p = intensity(loads, from, to, 'along');
    const n = integrate(
      p.map((k) => -k),
      at.N,
    );
    const v = integrate(q, at.V);
    const m = integrate(v, at.M);
    N.push({ from, to, c: n });
    V.push({ from, to, c: v });
    M.push({ from, to, c: m });
    const h = to - from;
    at = { N: evaluate(n, h), V: evaluate(v, h), M: evaluate(m, h) };
  }
  return { N, V, M, atEnd: jump(at, loads, L) };
}

function jump(
  at: { N: number; V: number; M: number },
  loads: Pick<LocalLoads, 'points'>,
  s: number,
): { N: number; V: number; M: number } {
  return loads.points
    .filter((p) => p.at === s)
    .reduce((a, p) => ({ N: a.N - p.along, V: a.V + p.across, M: a.M - p.couple }), at);
}

/** Sum of the load intensities on a stretch without breaks, as a polynomial in s − from. */
function intensity(
  loads: Pick<LocalLoads, 'spread'>,
  from: number,
  to: number,
  part: 'along' | 'across',
): [number, number] {
  const total: [number, number] = [0, 0];
  for (const w of loads.spread) {
    if (w.from > from || w.to < to || w.to === w.from) continue;
    const slope = (w[part][1] - w[part][0]) / (w.to - w.from);
    total[0] += w[part][0] + slope * (from - w.from);
    total[1] += slope;
  }
  return total;
}
