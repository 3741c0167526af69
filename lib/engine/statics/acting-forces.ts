import type { Load } from '@/lib/model/load';
import type { Quantity } from '@/lib/model/quantity';
import type { Bar } from './equilibrium';
import { memberLoadForces, withoutResultant } from './member-load-forces';
import { type Bodies, type Body, type BodyForce, reactionForce } from './rigid-body';

/** What acts: loads of a case by their place in it, or one redundant of value 1. */
export type Action = { kind: 'loads'; loads: readonly Load[] } | { kind: 'unit'; redundant: number };

/**
 * The known forces on every body. `outer` leaves out what a body gives another, so that the list serves the whole.
 * Undefined when a load stands on a bar that is cut lengthwise, or has no resultant.
 */
export function actingForces(
  bodies: Bodies,
  action: Action,
): Map<Body, (BodyForce & { outer: boolean })[]> | undefined {
  const forces = new Map<Body, (BodyForce & { outer: boolean })[]>(bodies.list.map((b) => [b, []]));
  const put = (body: Body | undefined, force: BodyForce, outer = true) => {
    if (body) forces.get(body)?.push({ ...force, outer });
  };
  if (action.kind === 'unit') {
    putRedundant(bodies, action.redundant, put);
    return forces;
  }
  if (action.loads.some(withoutResultant)) return undefined;
  const { eq, ofMember, ofJoint } = bodies;
  for (const [b, bar] of eq.bars.entries()) {
    const own = memberLoadForces(eq, bar, action.loads);
    if (own.length > 0 && !ofMember[b]) return undefined;
    for (const f of own) put(ofMember[b], f);
  }
  action.loads.forEach((load, index) => {
    if (load.kind !== 'joint') return;
    const j = eq.analysis.joints.findIndex((x) => x.id === load.joint);
    const joint = eq.analysis.joints[j];
    if (!joint) return;
    const at = { of: { kind: 'load' as const, index }, x: joint.x, y: joint.y };
    if (load.x !== 0) put(ofJoint[j], { ...at, key: `load:${index}:x`, ux: 1, uy: 0, value: load.x });
    if (load.y !== 0) put(ofJoint[j], { ...at, key: `load:${index}:y`, ux: 0, uy: 1, value: load.y });
    if (load.couple !== 0)
      put(ofJoint[j], { ...at, key: `load:${index}:turn`, ux: 0, uy: 0, couple: 1, value: load.couple });
  });
  return forces;
}

/** A unit reaction acts from outside; a unit moment on both sides of its hinge; a unit axial force on both joints. */
function putRedundant(
  bodies: Bodies,
  redundant: number,
  put: (body: Body | undefined, force: BodyForce, outer?: boolean) => void,
): void {
  const { eq, ofMember, ofJoint } = bodies;
  const q = bodies.redundants[redundant] as Quantity;
  const of = { kind: 'unit' as const, redundant };
  const common = { key: `unit:${redundant}`, of, value: 1 };
  if (q.kind === 'reaction') {
    const j = eq.analysis.joints.findIndex((x) => x.id === q.joint);
    const joint = eq.analysis.joints[j];
    const force = joint && reactionForce(joint, q.component);
    if (force) put(ofJoint[j], { ...force, ...common });
    return;
  }
  const b = eq.bars.findIndex((x) => x.member.id === q.member);
  const bar = eq.bars[b] as Bar;
  if (q.kind === 'moment') {
    const sign = q.end === 'start' ? -1 : 1;
    const owner = ofJoint[bar[q.end]];
    const turn = { ...common, x: 0, y: 0, ux: 0, uy: 0 };
    if (owner === ofMember[b]) return;
    put(ofMember[b], { ...turn, couple: sign }, false);
    put(owner, { ...turn, couple: -sign }, false);
    return;
  }
  for (const [j, sign] of [
    [bar.start, 1],
    [bar.end, -1],
  ] as const) {
    const joint = eq.analysis.joints[j];
    if (joint)
      put(
        ofJoint[j],
        { ...common, x: joint.x, y: joint.y, ux: sign * bar.axis.c, uy: sign * bar.axis.s },
        false,
      );
  }
}
