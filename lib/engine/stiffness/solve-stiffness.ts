import type { Analysis } from '@/lib/model/analysis';
import type { Load } from '@/lib/model/load';
import { deformationRow, dot, type Element, type EndTriple, times } from './element';
import { type ElementLoad, elementLoad } from './element-load';
import { loadsByMember } from './loads-by-member';
import type { Numbering } from './number-unknowns';
import { placesOf, stiffnessModel } from './stiffness-model';

/** One case. Member forces stand just inside the joints, in the order of the members; signs as in Solution. */
export interface StiffnessCase {
  /** "A:x" → value, in the support's own axes. */
  reactions: Map<string, number>;
  members: { N: number; M0: number; M1: number }[];
  /** Rotation is absent where nothing could turn the joint. */
  joints: { x: number; y: number; rotation?: number }[];
  /** Reactions ("A:x") and axial forces (member ids) that members which do not stretch leave open; given as zero or with others zero. */
  open: ReadonlySet<string>;
}

/**
 * The independent second way: displacements of all joints from equilibrium of the joints and stiffness of the members.
 * Member forces stay in the equations beside the displacements, so that a member that does not stretch is a constraint
 * and not a large number, and a stiff one costs no figures. Stiffness is taken as the members state it; in multiples of
 * EI0 displacements come out times EI0. Undefined when the structure moves freely or no finite forces could answer.
 */
export function solveStiffness(analysis: Analysis): Map<string, StiffnessCase> | undefined {
  const model = stiffnessModel(analysis);
  if (!model) return undefined;
  const { elements, numbering, system } = model;
  const loads = analysis.cases.map((c) => {
    const mine = loadsByMember(c.loads);
    return elements.map((e) => elementLoad(e, mine(e.member.id)));
  });
  const rights = analysis.cases.map((c, k) =>
    rightSide(analysis, c.loads, elements, loads[k] as ElementLoad[], numbering),
  );
  if (rights.includes(undefined)) return undefined;
  const solved = system.solve(rights as Float64Array[]);
  if (!solved || solved.open.some((o) => o.touches.some((i) => numbering.moves[i] === 1))) return undefined;
  const open = namesOf(analysis, elements, numbering, new Set(solved.open.flatMap((o) => o.touches)));
  return new Map(
    analysis.cases.map((c, k) => {
      const x = solved.x[k] as Float64Array;
      return [c.id, { ...resultOf(analysis, elements, loads[k] as ElementLoad[], numbering, x), open }];
    }),
  );
}

/** Undefined for a couple on a joint that nothing keeps from turning. */
function rightSide(
  analysis: Analysis,
  loads: readonly Load[],
  elements: readonly Element[],
  own: readonly ElementLoad[],
  numbering: Numbering,
): Float64Array | undefined {
  const right = new Float64Array(numbering.count);
  const put = (i: number, v: number) => {
    right[i] = (right[i] as number) + v;
  };
  elements.forEach((e, i) => {
    const l = own[i] as ElementLoad;
    const strained = times(e.flexibility, l.given).map(
      (v, k) => v + (l.deformation[k] as number),
    ) as EndTriple;
    e.modes.forEach((mode, m) => {
      put((numbering.modes[i] as number[])[m] as number, dot(mode, strained));
    });
    const needed = deformationRow(e, l.given);
    const { V0, V1, along } = l;
    const span = [V0 * e.s, -V0 * e.c, 0, along * e.c - V1 * e.s, along * e.s + V1 * e.c, 0];
    placesOf(e, numbering).forEach((place, k) => {
      if (place !== undefined) put(place, (span[k] as number) - (needed[k] as number));
    });
  });
  const joint = new Map(analysis.joints.map((j, i) => [j.id, i]));
  for (const load of loads) {
    if (load.kind !== 'joint' && load.kind !== 'settlement') continue;
    const j = joint.get(load.joint);
    const places = numbering.joints[j ?? -1];
    if (j === undefined || !places) throw new Error(`no joint ${load.joint}`);
    if (load.kind === 'settlement') {
      const reaction = numbering.reactions[j]?.find((r) => r.component === load.component);
      if (reaction) put(reaction.index, -load.value);
      continue;
    }
    put(places.x, load.x);
    put(places.y, load.y);
    if (places.turn !== undefined) put(places.turn, load.couple);
    else if (load.couple !== 0) return undefined;
  }
  return right;
}

function resultOf(
  analysis: Analysis,
  elements: readonly Element[],
  own: readonly ElementLoad[],
  numbering: Numbering,
  x: Float64Array,
): Omit<StiffnessCase, 'open'> {
  const at = (i: number) => x[i] as number;
  const members = elements.map((e, i) => {
    const { given, atStart, atEnd } = own[i] as ElementLoad;
    const [N, M0, M1] = e.modes.reduce<EndTriple>(([n, a, b], mode, m) => {
      const f = at((numbering.modes[i] as number[])[m] as number);
      return [n + f * mode[0], a + f * mode[1], b + f * mode[2]];
    }, given);
    return { N: N - atStart.along, M0: M0 - atStart.couple, M1: M1 + atEnd.couple };
  });
  const reactions = new Map<string, number>();
  analysis.joints.forEach((joint, j) => {
    for (const r of numbering.reactions[j] ?? []) reactions.set(`${joint.id}:${r.component}`, at(r.index));
  });
  const joints = numbering.joints.map(({ x: right, y: up, turn }) => ({
    x: at(right),
    y: at(up),
    rotation: turn === undefined ? undefined : at(turn),
  }));
  return { reactions, members, joints };
}

function namesOf(
  analysis: Analysis,
  elements: readonly Element[],
  numbering: Numbering,
  touched: ReadonlySet<number>,
): ReadonlySet<string> {
  const members = elements.filter((_, i) => numbering.modes[i]?.some((u) => touched.has(u)));
  const reactions = analysis.joints.flatMap((joint, j) =>
    (numbering.reactions[j] ?? [])
      .filter((r) => touched.has(r.index))
      .map((r) => `${joint.id}:${r.component}`),
  );
  return new Set([...members.map((e) => e.member.id), ...reactions]);
}
