import type { Analysis } from '@/lib/model/analysis';
import type { BeamElement } from './beam-element';

interface Element {
  a: number;
  b: number;
  e: BeamElement;
}

export interface SupportUnknown {
  component: 'x' | 'y' | 'turn';
  index: number;
  /** Its direction in x, y and turning. */
  axis: [number, number, number];
  spring?: number;
}

/**
 * Numbers joint displacements, member axial forces and reactions so that what belongs together stands together: joints
 * in breadth-first order (Cuthill and McKee, 1969), each followed by its reactions and the members that it completes.
 */
export function numberUnknowns(analysis: Analysis, elements: readonly Element[]) {
  const n = analysis.joints.length;
  const neighbours = Array.from({ length: n }, (): number[] => []);
  for (const { a, b } of elements) {
    neighbours[a]?.push(b);
    neighbours[b]?.push(a);
  }
  const order = breadthFirst(neighbours);
  const rank = new Array<number>(n);
  order.forEach((j, i) => {
    rank[j] = i;
  });
  const completed = Array.from({ length: n }, (): number[] => []);
  elements.forEach(({ a, b, e }, i) => {
    if (e.hasAxial) completed[(rank[a] as number) > (rank[b] as number) ? a : b]?.push(i);
  });
  let count = 0;
  const first = new Array<number>(n);
  const axial = new Map<number, number>();
  const reactions = Array.from({ length: n }, (): SupportUnknown[] => []);
  for (const j of order) {
    first[j] = count;
    count += 3;
    const s = analysis.joints[j]?.support;
    if (s) {
      const [c, t] = [Math.cos((s.angle * Math.PI) / 180), Math.sin((s.angle * Math.PI) / 180)];
      const axes = { x: [c, t, 0], y: [-t, c, 0], turn: [0, 0, 1] } as const;
      for (const component of ['x', 'y', 'turn'] as const) {
        const r = s[component];
        if (r === 'free') continue;
        reactions[j]?.push({
          component,
          index: count++,
          axis: [...axes[component]],
          spring: r === 'held' ? undefined : r.spring,
        });
      }
    }
    for (const i of completed[j] as number[]) axial.set(i, count++);
  }
  const turned = new Set(
    elements.flatMap(({ a, b, e }) => [
      ...(e.modes.some((m) => m[0] !== 0) ? [a] : []),
      ...(e.modes.some((m) => m[1] !== 0) ? [b] : []),
    ]),
  );
  const held = (j: number) => reactions[j]?.some((r) => r.component === 'turn') === true;
  return {
    count,
    joint: (j: number, i: number) => (first[j] as number) + i,
    axial: (i: number) => axial.get(i),
    reactions: (j: number) => reactions[j] as SupportUnknown[],
    /** Rotations of joints that nothing could turn: they stay zero. */
    unused: () => order.filter((j) => !turned.has(j) && !held(j)).map((j) => (first[j] as number) + 2),
  };
}

function breadthFirst(neighbours: readonly number[][]): number[] {
  const seen = new Set<number>();
  const order: number[] = [];
  for (let start = 0; start < neighbours.length; start++) {
    if (seen.has(start)) continue;
    const queue = [start];
    seen.add(start);
    for (let head = 0; head < queue.length; head++) {
      const j = queue[head] as number;
      order.push(j);
      const next = (neighbours[j] as number[]).filter((k) => !seen.has(k));
      for (const k of new Set(next)) {
        seen.add(k);
        queue.push(k);
      }
    }
  }
  return order;
}
