import type { Analysis } from '@/lib/model/analysis';
import { dot, type Element, type EndTriple } from './element';
import type { Numbering } from './number-unknowns';
import { stiffnessModel } from './stiffness-model';

/**
 * A unit movement that only one force does work on: the support gives way against its reaction component, or the member
 * is kinked (M), slips (V) or parts (N) at a section, as the positive force would make it.
 */
export type Dislocation =
  | { kind: 'reaction'; joint: string; component: 'x' | 'y' | 'turn' }
  | { kind: 'M' | 'V' | 'N'; member: string; at: number };

/** Forces and joint displacements that the structure answers with. */
export interface Dislocated {
  members: { N: number; M0: number; M1: number }[];
  joints: { x: number; y: number; rotation?: number }[];
}

/** Undefined when the structure moves freely, a force is not one of its own, or no finite forces could answer. */
export function dislocate(analysis: Analysis, list: readonly Dislocation[]): Dislocated[] | undefined {
  const model = stiffnessModel(analysis);
  if (!model) return undefined;
  const { elements, numbering, system } = model;
  const rights = list.map((d) => rightSide(analysis, elements, numbering, d));
  if (rights.includes(undefined)) return undefined;
  const solved = system.solve(rights as Float64Array[]);
  if (!solved || solved.open.some((o) => o.touches.some((i) => numbering.moves[i] === 1))) return undefined;
  return solved.x.map((x): Dislocated => {
    const at = (i: number) => x[i] as number;
    const members = elements.map((e, i) => {
      const [N, M0, M1] = e.modes.reduce<EndTriple>(
        ([n, a, b], mode, m) => {
          const f = at((numbering.modes[i] as number[])[m] as number);
          return [n + f * mode[0], a + f * mode[1], b + f * mode[2]];
        },
        [0, 0, 0],
      );
      return { N, M0, M1 };
    });
    const joints = numbering.joints.map(({ x: right, y: up, turn }) => ({
      x: at(right),
      y: at(up),
      rotation: turn === undefined ? undefined : at(turn),
    }));
    return { members, joints };
  });
}

function rightSide(
  analysis: Analysis,
  elements: readonly Element[],
  numbering: Numbering,
  d: Dislocation,
): Float64Array | undefined {
  const right = new Float64Array(numbering.count);
  if (d.kind === 'reaction') {
    const j = analysis.joints.findIndex((joint) => joint.id === d.joint);
    const reaction = numbering.reactions[j]?.find((r) => r.component === d.component);
    if (!reaction) return undefined;
    right[reaction.index] = 1;
    return right;
  }
  const i = elements.findIndex((e) => e.member.id === d.member);
  const e = elements[i];
  if (!e || d.at < 0 || d.at > e.L) return undefined;
  const t = d.at / e.L;
  const work = { M: [0, 1 - t, t], V: [0, -1 / e.L, 1 / e.L], N: [1, 0, 0] } as const;
  e.modes.forEach((mode, m) => {
    right[(numbering.modes[i] as number[])[m] as number] = dot(mode, [...work[d.kind]]);
  });
  return right;
}
