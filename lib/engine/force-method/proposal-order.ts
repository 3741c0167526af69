import type { Quantity } from '@/lib/model/quantity';
import type { Equilibrium } from '../statics/equilibrium';

/** Whether a column is a force that bends, stretches and presses on nothing: a held reaction, or N of a member that does not stretch. */
export function isRigidAlong(eq: Equilibrium): (column: number) => boolean {
  const stretching = new Set(
    eq.analysis.members
      .filter((m) => m.EA !== undefined || m.steps?.some((s) => s.EA !== undefined))
      .map((m) => m.id),
  );
  const supports = new Map(eq.analysis.joints.map((j) => [j.id, j.support]));
  return (column) => {
    const q = eq.quantities[column];
    if (!q || q.kind === 'moment') return false;
    if (q.kind === 'axial') return !stretching.has(q.member);
    return supports.get(q.joint)?.[q.component] === 'held';
  };
}

/**
 * The order in which quantities are kept when the engine proposes the redundants. Forces that nothing gives way to come
 * first, reactions before members, so that purely axial self-stress shows by itself and in a member; then springs and
 * members that stretch; then end moments, those at supports late and fixing moments last: what is left over are, as far
 * as possible, hinges over inner supports, at corners and at bases.
 */
export function proposalOrder(eq: Equilibrium): number[] {
  const rigid = isRigidAlong(eq);
  const held = new Set(eq.analysis.joints.filter((j) => j.support !== undefined).map((j) => j.id));
  const ends = new Map(eq.analysis.members.map((m) => [m.id, { start: m.start, end: m.end }]));
  const rank = (q: Quantity, column: number): number => {
    if (q.kind === 'reaction') return q.component === 'turn' ? 6 : rigid(column) ? 0 : 3;
    if (q.kind === 'axial') return rigid(column) ? 1 : 2;
    return held.has(ends.get(q.member)?.[q.end] as string) ? 5 : 4;
  };
  return eq.quantities
    .map((q, i) => ({ i, rank: rank(q, i) }))
    .sort((a, b) => a.rank - b.rank || a.i - b.i)
    .map((e) => e.i);
}

/** The same for large structures: from the ground up, joint by joint, so that every self-stress closes near by. */
export function sweepOrder(eq: Equilibrium): number[] {
  const rigid = isRigidAlong(eq);
  const level = levels(eq);
  const bars = new Map(eq.bars.map((b) => [b.member.id, b]));
  const joints = new Map(eq.analysis.joints.map((j, i) => [j.id, i]));
  const key = (q: Quantity): [number, number] => {
    if (q.kind === 'reaction') return [level[joints.get(q.joint) as number] as number, 0];
    const bar = bars.get(q.member);
    const ends = bar ? [level[bar.start] as number, level[bar.end] as number] : [0, 0];
    return [Math.max(...ends), 1 + Math.min(...ends)];
  };
  return eq.quantities
    .map((q, i) => ({
      i,
      first: q.kind !== 'moment' && !(q.kind === 'reaction' && q.component === 'turn') && rigid(i) ? 0 : 1,
      key: key(q),
    }))
    .sort((a, b) => a.first - b.first || a.key[0] - b.key[0] || a.key[1] - b.key[1] || a.i - b.i)
    .map((e) => e.i);
}

/** Members to pass between a joint and the nearest support. */
function levels(eq: Equilibrium): number[] {
  const level = eq.analysis.joints.map((j): number => (j.support ? 0 : -1));
  const near = eq.analysis.joints.map((): number[] => []);
  for (const { start, end } of eq.bars) {
    near[start]?.push(end);
    near[end]?.push(start);
  }
  const queue = level.flatMap((l, j) => (l === 0 ? [j] : []));
  for (const j of queue) {
    for (const other of near[j] ?? []) {
      if (level[other] !== -1) continue;
      level[other] = (level[j] as number) + 1;
      queue.push(other);
    }
  }
  return level;
}
