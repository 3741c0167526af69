import type { Analysis } from '@/lib/model/analysis';
import type { Quantity } from '@/lib/model/quantity';
import type { Joint } from '@/lib/model/structure';
import { isBeam, type Placed } from './geometry';
import type { SymbolName } from './symbol-name';

/** The symbols of one sheet. */
export interface Names {
  beam: boolean;
  /** A–B, as it is printed for a member that joins A and B; its own name where two members join the same joints. */
  member(id: string): readonly string[];
  length(id: string): SymbolName;
  /** Plan length and rise of an inclined member. */
  plan(id: string): SymbolName;
  rise(id: string): SymbolName;
  cos(id: string): SymbolName;
  sin(id: string): SymbolName;
  reaction(joint: string, component: 'x' | 'y' | 'turn'): SymbolName;
  /** Bending moment at an end of a member: M_B over an inner support of a beam, M_AB elsewhere (at A of A–B). */
  moment(member: string, end: 'start' | 'end'): SymbolName;
  shear(member: string, end: 'start' | 'end'): SymbolName;
  axial(member: string, end: 'start' | 'end'): SymbolName;
  quantity(q: Quantity): SymbolName;
}

export function nameQuantities(analysis: Analysis, placed: ReadonlyMap<string, Placed>): Names {
  const beam = isBeam(placed);
  const long = analysis.joints.some((j) => j.id.length > 1);
  const pairs = new Map<string, number>();
  const pairOf = (p: Placed) => [p.start.id, p.end.id].sort().join('\u0001');
  for (const p of placed.values()) pairs.set(pairOf(p), (pairs.get(pairOf(p)) ?? 0) + 1);
  const at = (id: string): Placed => {
    const p = placed.get(id);
    if (!p) throw new Error(`there is no member ${id}`);
    return p;
  };
  const joined = (a: string, b: string) => (long ? [a, '–', b] : [a, b]);
  const single = (p: Placed) => pairs.get(pairOf(p)) === 1;
  const member = (id: string) => (single(at(id)) ? joined(at(id).start.id, at(id).end.id) : [id]);
  const endOf = (id: string, end: 'start' | 'end') => {
    const p = at(id);
    const [near, far] = end === 'start' ? [p.start.id, p.end.id] : [p.end.id, p.start.id];
    return single(p) ? joined(near, far) : [id, ',', near];
  };
  const continuous = beam ? continuousJoints(analysis, placed) : new Set<string>();
  const names: Names = {
    beam,
    member,
    length: (id) => ({ letter: 'L', sub: member(id) }),
    plan: (id) => ({ letter: 'ℓ', sub: member(id) }),
    rise: (id) => ({ letter: 'h', sub: member(id) }),
    cos: (id) => ({ letter: 'cosα', sub: member(id) }),
    sin: (id) => ({ letter: 'sinα', sub: member(id) }),
    reaction: (joint, component) => {
      const turned = analysis.joints.find((j) => j.id === joint)?.support?.angle ?? 0;
      const [x, y] = turned === 0 ? ['x', 'y'] : ["x'", "y'"];
      if (beam && component === 'y' && turned === 0) return { letter: 'R', sub: [joint] };
      return { letter: 'R', sub: [joint, component === 'x' ? x : component === 'y' ? y : 'φ'] };
    },
    moment: (id, end) => {
      const joint = end === 'start' ? at(id).start.id : at(id).end.id;
      return { letter: 'M', sub: continuous.has(joint) ? [joint] : endOf(id, end) };
    },
    shear: (id, end) => ({ letter: 'V', sub: endOf(id, end) }),
    axial: (id, end) => ({ letter: 'N', sub: endOf(id, end) }),
    quantity: (q) => {
      if (q.kind === 'reaction') return names.reaction(q.joint, q.component);
      return q.kind === 'axial' ? names.axial(q.member, 'start') : names.moment(q.member, q.end);
    },
  };
  return names;
}

/** Joints of a beam where one moment stands on both sides: two members, no hinge, no fixing, no couple. */
function continuousJoints(analysis: Analysis, placed: ReadonlyMap<string, Placed>): Set<string> {
  const coupled = new Set<string>();
  for (const c of analysis.cases) {
    for (const load of c.loads) if (load.kind === 'joint' && load.couple !== 0) coupled.add(load.joint);
  }
  const through = (j: Joint) => {
    const meeting = [...placed.values()].filter((p) => p.start === j || p.end === j);
    const fixed = j.support !== undefined && j.support.turn !== 'free';
    return meeting.length === 2 && !fixed && !coupled.has(j.id);
  };
  return new Set(analysis.joints.filter(through).map((j) => j.id));
}
