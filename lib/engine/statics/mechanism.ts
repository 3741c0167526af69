import type { Mechanism } from '@/lib/model/refusal';
import type { Bar, Equilibrium } from './equilibrium';

/** Parts of the largest movement below which a joint or member stands still. */
const still = 1e-7;

/** A centre of rotation nearer to a joint than this, in mean member lengths, is that joint. */
const same = 1e-6;

interface Vector {
  x: number;
  y: number;
}

/** Small motion of a member: what its start does, and its rotation. */
interface Motion extends Vector {
  turn: number;
}

/**
 * The small motion that a left null vector of the equilibrium matrix describes: what each joint does, and the rigid
 * pieces that move, each with the centre it turns about. Scaled so that the largest movement is one mean member length.
 */
export function mechanismOf(eq: Equilibrium, y: Float64Array): Mechanism {
  const { joints } = eq.analysis;
  const moves = joints.map((_, j): Vector => ({ x: y[3 * j] as number, y: y[3 * j + 1] as number }));
  const motions = memberMotions(eq, moves, y);
  let size = 0;
  for (const m of moves) size = Math.max(size, Math.hypot(m.x, m.y));
  for (const m of motions) size = Math.max(size, Math.abs(m.turn) * eq.length);
  const factor = size === 0 ? 0 : eq.length / size;
  const none = still * size;
  const moving = (v: number) => Math.abs(v) > none;
  const mechanism: Mechanism = { joints: {}, members: {}, pieces: [] };
  joints.forEach((joint, j) => {
    const m = moves[j] as Vector;
    if (moving(m.x) || moving(m.y)) mechanism.joints[joint.id] = { x: m.x * factor, y: m.y * factor };
  });
  eq.bars.forEach((bar, b) => {
    const { turn } = motions[b] as Motion;
    if (moving(turn * eq.length)) mechanism.members[bar.member.id] = { rotation: turn * factor };
  });
  for (const piece of rigidPieces(eq, motions, none)) {
    const first = piece[0] as number;
    const at = joints[(eq.bars[first] as Bar).start];
    const m = motions[first] as Motion;
    if (!at) continue;
    const names = piece.map((b) => (eq.bars[b] as Bar).member.id);
    if (moving(m.turn * eq.length)) {
      const centre = { x: at.x - m.y / m.turn, y: at.y + m.x / m.turn };
      const joint = joints.find((j) => Math.hypot(j.x - centre.x, j.y - centre.y) <= same * eq.length)?.id;
      mechanism.pieces.push({ members: names, rotation: m.turn * factor, centre: { ...centre, joint } });
    } else if (moving(m.x) || moving(m.y)) {
      mechanism.pieces.push({ members: names, rotation: 0, slide: { x: m.x * factor, y: m.y * factor } });
    }
  }
  return mechanism;
}

/**
 * Members as rigid bodies. A shear release slips across by the null vector's entry in its row, and an axial release
 * along, so there the member follows its other end.
 */
function memberMotions(eq: Equilibrium, moves: readonly Vector[], y: Float64Array): Motion[] {
  let row = 3 * eq.analysis.joints.length;
  return eq.bars.map(({ member, axis: { c, s, L }, start, end }): Motion => {
    const [a, b] = [moves[start] as Vector, moves[end] as Vector];
    const slides = (at: 'start' | 'end', what: 'shear' | 'axial') =>
      member.releases?.[at].includes(what) === true;
    let slip = 0;
    for (const at of ['start', 'end'] as const) if (slides(at, 'shear')) slip += y[row++] as number;
    const [across0, across1] = [a.y * c - a.x * s, b.y * c - b.x * s];
    const turn = (across1 - across0 + slip) / L;
    const across = slides('start', 'shear') ? across1 - turn * L : across0;
    const along = slides('start', 'axial') ? b.x * c + b.y * s : a.x * c + a.y * s;
    return { x: along * c - across * s, y: along * s + across * c, turn };
  });
}

/** Members that share a joint and move alike there are one piece. */
function rigidPieces(eq: Equilibrium, motions: readonly Motion[], none: number): number[][] {
  const of = eq.bars.map((_, b) => b);
  const root = (b: number): number => {
    let r = b;
    while (of[r] !== r) r = of[r] as number;
    of[b] = r;
    return r;
  };
  const at = new Map<number, number[]>();
  eq.bars.forEach((bar, b) => {
    for (const j of [bar.start, bar.end]) {
      const list = at.get(j);
      if (list) list.push(b);
      else at.set(j, [b]);
    }
  });
  for (const [j, list] of at) {
    for (const a of list)
      for (const b of list) if (a < b && movesAlike(eq, motions, a, b, j, none)) of[root(b)] = root(a);
  }
  const pieces = new Map<number, number[]>();
  eq.bars.forEach((_, b) => {
    const list = pieces.get(root(b));
    if (list) list.push(b);
    else pieces.set(root(b), [b]);
  });
  return [...pieces.values()];
}

function movesAlike(
  eq: Equilibrium,
  motions: readonly Motion[],
  a: number,
  b: number,
  j: number,
  none: number,
): boolean {
  const [m, n] = [motions[a] as Motion, motions[b] as Motion];
  if (Math.abs(m.turn - n.turn) * eq.length > none) return false;
  const [p, q] = [motionAt(eq, a, m, j), motionAt(eq, b, n, j)];
  return Math.hypot(p.x - q.x, p.y - q.y) <= none;
}

/** Motion of a member at one of its joints. */
function motionAt(eq: Equilibrium, b: number, m: Motion, j: number): Vector {
  const { start, axis } = eq.bars[b] as Bar;
  return j === start ? m : { x: m.x - m.turn * axis.L * axis.s, y: m.y + m.turn * axis.L * axis.c };
}
