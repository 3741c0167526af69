import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { Bar, Equilibrium } from './equilibrium';
import type { StaticsTerm } from './statics-line';

/** A force on a body along (ux, uy) at (x, y), or a couple: then its coefficient in a moment sum. */
export interface BodyForce {
  key: string;
  of: StaticsTerm['of'];
  x: number;
  y: number;
  ux: number;
  uy: number;
  couple?: number;
  /** Known from the start: a load, or a redundant of value 1. */
  value?: number;
}

/** A rigid piece between hinges, with the forces on it that statics has to find. */
export interface Body {
  members: string[];
  forces: BodyForce[];
}

/** A primary structure as rigid pieces. */
export interface Bodies {
  eq: Equilibrium;
  list: Body[];
  redundants: readonly Quantity[];
  /** Body of every member by number; undefined for bars that are cut lengthwise. */
  ofMember: (Body | undefined)[];
  /** Body that carries the forces at every joint. */
  ofJoint: (Body | undefined)[];
}

interface End {
  b: number;
  end: 'start' | 'end';
}

/**
 * Splits a structure at its hinges and at the redundants. Undefined where a member slides at a release, or where one
 * that bends is cut lengthwise: there the pieces do not hold together by hinges alone.
 */
export function rigidBodies(eq: Equilibrium, redundants: readonly Quantity[]): Bodies | undefined {
  const released = new Set(redundants.map(quantityKey));
  const hinged = ({ b, end }: End) => {
    const m = (eq.bars[b] as Bar).member;
    return m.releases?.[end].includes('moment') === true || released.has(`moment:${m.id}:${end}`);
  };
  const cut = eq.bars.map((bar) => released.has(`axial:${bar.member.id}`));
  const bends = (b: number) => !hinged({ b, end: 'start' }) || !hinged({ b, end: 'end' });
  if (eq.bars.some((bar, b) => slides(bar) || (cut[b] && bends(b)))) return undefined;
  const ends: End[][] = eq.analysis.joints.map(() => []);
  eq.bars.forEach((bar, b) => {
    if (!cut[b]) for (const end of ['start', 'end'] as const) ends[bar[end]]?.push({ b, end });
  });
  const root = joinRigid(eq.bars.length, ends, hinged);
  const list = new Map<number, Body>();
  eq.bars.forEach((bar, b) => {
    if (cut[b]) return;
    const body = list.get(root(b)) ?? { members: [], forces: [] };
    body.members.push(bar.member.id);
    list.set(root(b), body);
  });
  const ofMember = eq.bars.map((_, b) => (cut[b] ? undefined : list.get(root(b))));
  const ofJoint = ends.map((at) => ofMember[(at.find((e) => !hinged(e)) ?? at[0])?.b as number]);
  const bodies: Bodies = { eq, list: [...list.values()], redundants, ofMember, ofJoint };
  addInterfaces(bodies, ends);
  addReactions(bodies, released);
  return bodies;
}

const slides = ({ member }: Bar) =>
  (['start', 'end'] as const).some((e) => member.releases?.[e].some((r) => r !== 'moment') === true);

/** Members that meet at a joint without a hinge between them are one piece. */
function joinRigid(n: number, ends: readonly End[][], hinged: (e: End) => boolean): (b: number) => number {
  const of = Array.from({ length: n }, (_, b) => b);
  const root = (b: number): number => {
    let r = b;
    while (of[r] !== r) r = of[r] as number;
    of[b] = r;
    return r;
  };
  for (const at of ends) {
    const [first, ...others] = at.filter((e) => !hinged(e));
    for (const e of others) of[root(e.b)] = root((first as End).b);
  }
  return root;
}

const axes = { x: [1, 0], y: [0, 1] } as const;

function addInterfaces({ eq, ofMember, ofJoint }: Bodies, ends: readonly End[][]): void {
  ends.forEach((at, j) => {
    const joint = eq.analysis.joints[j];
    const owner = ofJoint[j];
    for (const { b, end } of at) {
      const body = ofMember[b];
      if (!joint || !owner || !body || body === owner) continue;
      const member = (eq.bars[b] as Bar).member.id;
      for (const component of ['x', 'y'] as const) {
        const [ux, uy] = axes[component];
        const of = { kind: 'interface' as const, member, end, component };
        const force = { key: `interface:${member}:${end}:${component}`, of, x: joint.x, y: joint.y };
        body.forces.push({ ...force, ux, uy });
        owner.forces.push({ ...force, ux: -ux, uy: -uy });
      }
    }
  });
}

function addReactions({ eq, ofJoint }: Bodies, released: ReadonlySet<string>): void {
  eq.analysis.joints.forEach((joint, j) => {
    for (const component of ['x', 'y', 'turn'] as const) {
      const force = reactionForce(joint, component);
      if (force && !released.has(force.key)) ofJoint[j]?.forces.push(force);
    }
  });
}

/** The reaction component of a support as a force on what it holds; undefined where it is free. */
export function reactionForce(
  joint: Equilibrium['analysis']['joints'][number],
  component: 'x' | 'y' | 'turn',
): BodyForce | undefined {
  const s = joint.support;
  if (!s || s[component] === 'free') return undefined;
  const [c, n] = [Math.cos((s.angle * Math.PI) / 180), Math.sin((s.angle * Math.PI) / 180)];
  const [ux, uy] = { x: [c, n], y: [-n, c], turn: [0, 0] }[component] as [number, number];
  const quantity: Quantity = { kind: 'reaction', joint: joint.id, component };
  const force = {
    key: quantityKey(quantity),
    of: { kind: 'quantity' as const, quantity },
    x: joint.x,
    y: joint.y,
    ux,
    uy,
  };
  return component === 'turn' ? { ...force, couple: 1 } : force;
}
