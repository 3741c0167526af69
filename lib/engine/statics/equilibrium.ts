import type { Analysis } from '@/lib/model/analysis';
import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { Member } from '@/lib/model/structure';
import { type MemberAxis, memberAxis } from '../diagrams/local-loads';
import { type Stretch, stretches } from '../diagrams/stretches';
import type { SparseColumn } from './sparse-lu';

/** A member with what statics needs of it: its joints, and the columns of N, M0 and M1 (−1 where released). */
export interface Bar {
  member: Member;
  axis: MemberAxis;
  /** Lengths of one stiffness. */
  stretches: Stretch[];
  start: number;
  end: number;
  N: number;
  M0: number;
  M1: number;
}

/**
 * Joint equilibrium of a structure as a matrix: three rows a joint (x, y, turning), a row more for each shear release,
 * one column a force quantity. Moment rows and columns are divided by the mean member length, so that all entries are
 * pure numbers and one tolerance serves every scale.
 */
export interface Equilibrium {
  analysis: Analysis;
  bars: Bar[];
  quantities: Quantity[];
  indexOf: Map<string, number>;
  /** Member of every column, −1 for reactions. */
  barOf: number[];
  columns: SparseColumn[];
  rowCount: number;
  /** Rows that no force of the structure can enter: a hinge where nothing could turn. */
  trivialRows: Set<number>;
  /** What a moment quantity is divided by: true value = scaled value × scale. */
  scale: number[];
  length: number;
}

export const shearAt = (bar: Bar, end: 'start' | 'end') =>
  bar.member.releases?.[end].includes('shear') === true;

/** Builds the matrix; members and supports must refer to joints that exist. */
export function equilibrium(analysis: Analysis): Equilibrium {
  const place = new Map(analysis.joints.map((j, i) => [j.id, i]));
  const bars = analysis.members.map((member): Bar => {
    const start = place.get(member.start) as number;
    const end = place.get(member.end) as number;
    const [a, b] = [analysis.joints[start], analysis.joints[end]];
    if (!a || !b) throw new Error(`member ${member.id} has no joint`);
    const axis = memberAxis(a, b);
    return { member, axis, stretches: stretches(member, axis.L), start, end, N: -1, M0: -1, M1: -1 };
  });
  const length = bars.reduce((sum, b) => sum + b.axis.L, 0) / bars.length;
  const releases = bars.flatMap((b) =>
    (['start', 'end'] as const).filter((e) => shearAt(b, e)).map((e) => ({ b, e })),
  );
  const eq: Equilibrium = {
    analysis,
    bars,
    quantities: [],
    indexOf: new Map(),
    barOf: [],
    columns: [],
    rowCount: 3 * analysis.joints.length + releases.length,
    trivialRows: new Set(),
    scale: [],
    length,
  };
  const rowOf = new Map(
    releases.map(({ b, e }, i) => [`${b.member.id}:${e}`, 3 * analysis.joints.length + i]),
  );
  bars.forEach((_, b) => {
    addMember(eq, b, rowOf);
  });
  analysis.joints.forEach((joint, j) => {
    const s = joint.support;
    if (!s) return;
    const [c, n] = [Math.cos((s.angle * Math.PI) / 180), Math.sin((s.angle * Math.PI) / 180)];
    if (s.x !== 'free')
      push(eq, { kind: 'reaction', joint: joint.id, component: 'x' }, 1, [
        [3 * j, c],
        [3 * j + 1, n],
      ]);
    if (s.y !== 'free')
      push(eq, { kind: 'reaction', joint: joint.id, component: 'y' }, 1, [
        [3 * j, -n],
        [3 * j + 1, c],
      ]);
    if (s.turn !== 'free')
      push(eq, { kind: 'reaction', joint: joint.id, component: 'turn' }, length, [[3 * j + 2, 1]]);
  });
  const used = new Uint8Array(eq.rowCount);
  for (const { rows } of eq.columns) for (const r of rows) used[r] = 1;
  for (let r = 2; r < 3 * analysis.joints.length; r += 3) if (used[r] === 0) eq.trivialRows.add(r);
  return eq;
}

function push(
  eq: Equilibrium,
  quantity: Quantity,
  scale: number,
  entries: readonly [number, number][],
  bar = -1,
): number {
  const column = eq.quantities.length;
  const largest = entries.reduce((m, [, v]) => Math.max(m, Math.abs(v)), 0);
  const kept = entries.filter(([, v]) => Math.abs(v) > 1e-15 * largest);
  eq.indexOf.set(quantityKey(quantity), column);
  eq.quantities.push(quantity);
  eq.scale.push(scale);
  eq.barOf.push(bar);
  eq.columns.push({ rows: kept.map(([r]) => r), values: kept.map(([, v]) => v) });
  return column;
}

/**
 * Member forces on its joints. N pulls both joints together; the shear (M1 − M0)/L that end moments bring acts on the
 * start by −V and on the end by +V across; M0 turns the start by +M0 and M1 the end by −M1.
 */
function addMember(eq: Equilibrium, b: number, rowOf: ReadonlyMap<string, number>): void {
  const bar = eq.bars[b] as Bar;
  const { member, axis, start, end } = bar;
  const { c, s, L } = axis;
  const released = (at: 'start' | 'end', what: 'moment' | 'axial') =>
    member.releases?.[at].includes(what) === true;
  if (!released('start', 'axial') && !released('end', 'axial')) {
    const entries: [number, number][] = [
      [3 * start, c],
      [3 * start + 1, s],
      [3 * end, -c],
      [3 * end + 1, -s],
    ];
    bar.N = push(eq, { kind: 'axial', member: member.id }, 1, entries, b);
  }
  const shear = eq.length / L;
  for (const at of ['start', 'end'] as const) {
    if (released(at, 'moment')) continue;
    const v = at === 'start' ? -shear : shear;
    const entries: [number, number][] = [
      [3 * start, v * s],
      [3 * start + 1, -v * c],
      [3 * end, -v * s],
      [3 * end + 1, v * c],
      at === 'start' ? [3 * start + 2, 1] : [3 * end + 2, -1],
    ];
    for (const e of ['start', 'end'] as const) {
      const row = rowOf.get(`${member.id}:${e}`);
      if (row !== undefined) entries.push([row, v]);
    }
    const column = push(eq, { kind: 'moment', member: member.id, end: at }, eq.length, entries, b);
    if (at === 'start') bar.M0 = column;
    else bar.M1 = column;
  }
}
