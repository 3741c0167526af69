import type { Mechanism } from '@/lib/model/refusal';
import type { Equilibrium } from './equilibrium';

/** Parts of the largest movement below which a joint or member stands still. */
const still = 1e-7;

/**
 * The small motion that a left null vector of the equilibrium matrix describes: what each joint does, and the rigid
 * pieces that move, each with the centre it turns about. Scaled so that the largest movement is one member length.
 */
export function mechanismOf(eq: Equilibrium, y: Float64Array): Mechanism {
  const { joints } = eq.analysis;
  const moves = joints.map((_, j) => ({ x: y[3 * j] as number, y: y[3 * j + 1] as number }));
  const turns = eq.bars.map(({ start, end, axis }) => {
    const [a, b] = [moves[start], moves[end]];
    return a && b ? ((b.y - a.y) * axis.c - (b.x - a.x) * axis.s) / axis.L : 0;
  });
  const size = Math.max(
    ...moves.map((m) => Math.hypot(m.x, m.y)),
    ...turns.map((t) => Math.abs(t) * eq.length),
  );
  const moving = (v: number) => Math.abs(v) > still * size;
  const factor = eq.length / size;
  const pieces = rigidPieces(eq, turns, (a, b) => Math.abs(a - b) * eq.length <= still * size);
  return {
    joints: Object.fromEntries(
      joints.flatMap((joint, j) => {
        const m = moves[j];
        return m && (moving(m.x) || moving(m.y)) ? [[joint.id, { x: m.x * factor, y: m.y * factor }]] : [];
      }),
    ),
    members: Object.fromEntries(
      eq.bars.flatMap((bar, b) => {
        const t = turns[b] as number;
        return moving(t * eq.length) ? [[bar.member.id, { rotation: t * factor }]] : [];
      }),
    ),
    pieces: pieces.flatMap((members): Mechanism['pieces'] => {
      const bar = eq.bars[members[0] as number];
      const turn = turns[members[0] as number] as number;
      if (!bar) return [];
      const at = joints[bar.start];
      const m = moves[bar.start];
      if (!at || !m) return [];
      const names = members.map((b) => eq.bars[b]?.member.id as string);
      if (!moving(turn * eq.length)) {
        if (!moving(m.x) && !moving(m.y)) return [];
        return [{ members: names, rotation: 0, slide: { x: m.x * factor, y: m.y * factor } }];
      }
      const centre = { x: at.x - m.y / turn, y: at.y + m.x / turn };
      const joint = joints.find((j) => Math.hypot(j.x - centre.x, j.y - centre.y) <= 1e-6 * eq.length)?.id;
      return [{ members: names, rotation: turn * factor, centre: { ...centre, joint } }];
    }),
  };
}

/** Members that share a joint and turn alike move as one. */
function rigidPieces(
  eq: Equilibrium,
  turns: readonly number[],
  alike: (a: number, b: number) => boolean,
): number[][] {
  const of = eq.bars.map((_, b) => b);
  const root = (b: number): number => (of[b] === b ? b : root(of[b] as number));
  const at = new Map<number, number[]>();
  eq.bars.forEach((bar, b) => {
    for (const j of [bar.start, bar.end]) at.set(j, [...(at.get(j) ?? []), b]);
  });
  for (const list of at.values()) {
    for (const a of list)
      for (const b of list) if (alike(turns[a] as number, turns[b] as number)) of[root(a)] = root(b);
  }
  const pieces = new Map<number, number[]>();
  eq.bars.forEach((_, b) => {
    pieces.set(root(b), [...(pieces.get(root(b)) ?? []), b]);
  });
  return [...pieces.values()];
}
