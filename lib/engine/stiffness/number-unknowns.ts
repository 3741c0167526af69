import type { Analysis } from '@/lib/model/analysis';
import type { Element } from './element';
import { orderJoints } from './order-joints';

/** A reaction component with its direction in x, y and turning, positive as a force on the structure. */
export interface ReactionUnknown {
  index: number;
  component: 'x' | 'y' | 'turn';
  axis: readonly [number, number, number];
  spring?: number;
}

export interface Numbering {
  count: number;
  /** Unknowns of joint j: displacement x and y, and its turning where something could turn it. */
  joints: { x: number; y: number; turn?: number }[];
  reactions: ReactionUnknown[][];
  /** Unknown of every mode of every element. */
  modes: number[][];
  /** Marks displacements among the unknowns; the others are forces. */
  moves: Uint8Array;
}

/**
 * Numbers joint displacements, member forces and reactions in the order of elimination: of each joint first the forces
 * of its members that are not numbered yet, then its displacements and reactions.
 */
export function numberUnknowns(analysis: Analysis, elements: readonly Element[]): Numbering {
  const n = analysis.joints.length;
  const at = Array.from({ length: n }, (): number[] => []);
  const turned = new Set<number>();
  elements.forEach((e, i) => {
    const [a, b] = e.joints;
    at[a]?.push(i);
    at[b]?.push(i);
    if (e.modes.some((m) => m[1] !== 0)) turned.add(a);
    if (e.modes.some((m) => m[2] !== 0)) turned.add(b);
  });
  const order = orderJoints(
    n,
    elements.map((e) => e.joints),
  );
  let count = 0;
  const moves: number[] = [];
  const move = () => {
    moves.push(count);
    return count++;
  };
  const joints = new Array<Numbering['joints'][number]>(n);
  const reactions = new Array<ReactionUnknown[]>(n);
  const modes = new Array<number[] | undefined>(elements.length);
  for (const j of order) {
    for (const i of at[j] as number[]) modes[i] ??= (elements[i] as Element).modes.map(() => count++);
    const held = supportAxes(analysis, j);
    const turns = turned.has(j) || held.some((r) => r.component === 'turn');
    joints[j] = { x: move(), y: move(), turn: turns ? move() : undefined };
    reactions[j] = held.map((r) => ({ ...r, index: count++ }));
  }
  const marks = new Uint8Array(count);
  for (const i of moves) marks[i] = 1;
  return { count, joints, reactions, modes: modes.map((m) => m ?? []), moves: marks };
}

function supportAxes(analysis: Analysis, j: number): Omit<ReactionUnknown, 'index'>[] {
  const support = analysis.joints[j]?.support;
  if (!support) return [];
  const angle = (support.angle * Math.PI) / 180;
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  const axes = { x: [c, s, 0], y: [-s, c, 0], turn: [0, 0, 1] } as const;
  return (['x', 'y', 'turn'] as const).flatMap((component) => {
    const restraint = support[component];
    if (restraint === 'free') return [];
    const spring = restraint === 'held' ? undefined : restraint.spring;
    return [{ component, axis: axes[component], spring }];
  });
}
