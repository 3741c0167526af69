import { breaks, sum } from '../diagrams/piecewise';
import type { Piece, PiecewisePolynomial } from '../diagrams/piecewise-polynomial';
import { add, derive, evaluate, shift } from '../diagrams/polynomial';
import { rootsBetween } from '../diagrams/roots';
import type { InfluenceLine } from './influence-line';

/** Point loads that keep their distances: `behind` is how far each runs behind the first. Forces downward positive. */
export interface MovingLoad {
  force: number;
  behind: number;
}

/** Place of the first load on the path, and the effect of all that stand on it. */
export interface Position {
  at: number;
  effect: number;
}

/**
 * Influence of a unit downward force along a path of members that follow one another, each drawn from left to right, as one
 * function of the distance travelled. `slope` gives cosine and sine of each member.
 */
export function alongPath(
  line: InfluenceLine,
  path: readonly { member: string; c: number; s: number }[],
): PiecewisePolynomial {
  let start = 0;
  return path.flatMap(({ member, c, s }) => {
    const own = line.members[member];
    if (!own) throw new Error(`the influence line has no member ${member}`);
    const pieces = sum([
      { f: own.across, factor: -c },
      { f: own.along, factor: -s },
    ]).map((p): Piece => ({ from: start + p.from, to: start + p.to, c: p.c }));
    start = (pieces.at(-1) as Piece).to;
    return pieces;
  });
}

/**
 * Greatest and least effect of a train of point loads that runs along an influence line from before its start to beyond
 * its end. Exact: while no load passes a break of the line the effect is one polynomial of the position, so it is
 * greatest where a load stands on a break (either side of a jump) or where that polynomial has its turning points.
 */
export function worstPosition(
  line: PiecewisePolynomial,
  train: readonly MovingLoad[],
): { max: Position; min: Position } {
  const places = breaks(line);
  const critical = new Set(train.flatMap((load) => places.map((s) => s + load.behind)));
  const sorted = [...critical].sort((a, b) => a - b);
  const nothing: Position = { at: sorted[0] ?? 0, effect: 0 };
  let [max, min] = [nothing, nothing];
  for (let i = 1; i < sorted.length; i++) {
    const [from, to] = [sorted[i - 1] as number, sorted[i] as number];
    const middle = (from + to) / 2;
    let effect: number[] = [];
    for (const { force, behind } of train) {
      const piece = line.find((p) => p.from <= middle - behind && middle - behind <= p.to);
      if (!piece) continue;
      const own = shift(piece.c, from - behind - piece.from).map((k) => k * force);
      effect = add(effect, own);
    }
    for (const x of [0, ...rootsBetween(derive(effect), 0, to - from), to - from]) {
      const position = { at: from + x, effect: evaluate(effect, x) };
      if (position.effect > max.effect) max = position;
      if (position.effect < min.effect) min = position;
    }
  }
  return { max, min };
}
