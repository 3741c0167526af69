import type { Load } from '@/lib/model/load';
import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { Equilibrium } from './equilibrium';
import type { StaticsTerm } from './statics-line';

/** A force on a body: along (ux, uy) at (x, y), or a couple; its value known or yet to be found. */
export interface BodyForce {
  key: string;
  of: StaticsTerm['of'];
  x: number;
  y: number;
  ux: number;
  uy: number;
  /** Couples have no place: coefficient in a moment sum. */
  couple?: number;
  value?: number;
}

/** A rigid piece of the primary structure between hinges, with all forces on it. */
export interface Body {
  members: string[];
  forces: BodyForce[];
}

/** What acts: loads of a case by their place in it, or one redundant of value 1. */
export type Action = { kind: 'loads'; loads: readonly Load[] } | { kind: 'unit'; redundant: number };

const directions = { x: [1, 0], y: [0, 1] } as const;

/** Splits the structure at its hinges and at the moments among the redundants. Undefined where a release along or across a member needs another way of cutting. */
export function rigidBodies(
  eq: Equilibrium,
  redundants: readonly Quantity[],
  action: Action,
): Body[] | undefined {
  const other = (q: Quantity) => q.kind === 'axial';
  const cut = eq.bars.some((b) =>
    (['start', 'end'] as const).some((e) => b.member.releases?.[e].some((r) => r !== 'moment') === true),
  );
  if (cut || redundants.some(other)) return undefined;
  const released = new Set(redundants.map(quantityKey));
  const hinged = (b: number, end: 'start' | 'end') => {
    const m = eq.bars[b]?.member;
    return m?.releases?.[end].includes('moment') === true || released.has(`moment:${m?.id}:${end}`);
  };
  const ends = new Map<number, { b: number; end: 'start' | 'end' }[]>();
  eq.bars.forEach((bar, b) => {
    for (const end of ['start', 'end'] as const)
      ends.set(bar[end], [...(ends.get(bar[end]) ?? []), { b, end }]);
  });
  const of = eq.bars.map((_, b) => b);
  const root = (b: number): number => (of[b] === b ? b : root(of[b] as number));
  for (const list of ends.values()) {
    const rigid = list.filter((e) => !hinged(e.b, e.end));
    for (const e of rigid) of[root(e.b)] = root((rigid[0] as { b: number }).b);
  }
  const bodies = new Map<number, Body>();
  eq.bars.forEach((bar, b) => {
    const body = bodies.get(root(b)) ?? { members: [], forces: [] };
    body.members.push(bar.member.id);
    bodies.set(root(b), body);
  });
  const bodyOf = (b: number) => bodies.get(root(b)) as Body;
  eq.analysis.joints.forEach((joint, j) => {
    const list = ends.get(j) ?? [];
    const owner = bodyOf((list.find((e) => !hinged(e.b, e.end)) ?? (list[0] as { b: number })).b);
    addReactions(eq, joint, owner, released, redundants, action);
    for (const e of list) {
      const body = bodyOf(e.b);
      const member = eq.bars[e.b]?.member.id as string;
      addRedundantMoment(eq, member, e.end, body, owner, redundants, action);
      if (body === owner) continue;
      for (const component of ['x', 'y'] as const) {
        const [ux, uy] = directions[component];
        const key = `interface:${member}:${e.end}:${component}`;
        const common = {
          key,
          of: { kind: 'interface' as const, member, end: e.end, component },
          x: joint.x,
          y: joint.y,
        };
        body.forces.push({ ...common, ux, uy });
        owner.forces.push({ ...common, ux: -ux, uy: -uy });
      }
    }
    if (action.kind === 'loads') addJointLoads(joint, action.loads, owner);
  });
  if (action.kind === 'loads') {
    eq.bars.forEach((_, b) => {
      bodyOf(b).forces.push(...memberLoads(eq, b, action.loads));
    });
  }
  return [...bodies.values()];
}

function addReactions(
  _eq: Equilibrium,
  joint: Equilibrium['analysis']['joints'][number],
  owner: Body,
  released: ReadonlySet<string>,
  redundants: readonly Quantity[],
  action: Action,
): void {
  const s = joint.support;
  if (!s) return;
  const [c, n] = [Math.cos((s.angle * Math.PI) / 180), Math.sin((s.angle * Math.PI) / 180)];
  const axes = { x: [c, n], y: [-n, c], turn: [0, 0] } as const;
  for (const component of ['x', 'y', 'turn'] as const) {
    if (s[component] === 'free') continue;
    const quantity: Quantity = { kind: 'reaction', joint: joint.id, component };
    const key = quantityKey(quantity);
    const [ux, uy] = axes[component];
    const force: BodyForce = {
      key,
      of: { kind: 'quantity', quantity },
      x: joint.x,
      y: joint.y,
      ux,
      uy,
      couple: component === 'turn' ? 1 : undefined,
    };
    if (!released.has(key)) {
      owner.forces.push(force);
      continue;
    }
    const index = redundants.findIndex((q) => quantityKey(q) === key);
    if (action.kind === 'unit' && action.redundant === index)
      owner.forces.push({ ...force, of: { kind: 'unit', redundant: index }, value: 1 });
  }
}

/** A unit moment acts on both sides of its hinge. */
function addRedundantMoment(
  _eq: Equilibrium,
  member: string,
  end: 'start' | 'end',
  body: Body,
  owner: Body,
  redundants: readonly Quantity[],
  action: Action,
): void {
  if (action.kind !== 'unit') return;
  const index = redundants.findIndex((q) => q.kind === 'moment' && q.member === member && q.end === end);
  if (index !== action.redundant) return;
  const sign = end === 'start' ? -1 : 1;
  const force = {
    key: `unit:${index}`,
    of: { kind: 'unit' as const, redundant: index },
    x: 0,
    y: 0,
    ux: 0,
    uy: 0,
    value: 1,
  };
  body.forces.push({ ...force, couple: sign });
  if (owner !== body) owner.forces.push({ ...force, couple: -sign });
}

function addJointLoads(
  joint: Equilibrium['analysis']['joints'][number],
  loads: readonly Load[],
  owner: Body,
): void {
  loads.forEach((load, index) => {
    if (load.kind !== 'joint' || load.joint !== joint.id) return;
    const at = { of: { kind: 'load' as const, index }, x: joint.x, y: joint.y };
    if (load.x !== 0) owner.forces.push({ ...at, key: `load:${index}:x`, ux: 1, uy: 0, value: load.x });
    if (load.y !== 0) owner.forces.push({ ...at, key: `load:${index}:y`, ux: 0, uy: 1, value: load.y });
    if (load.couple !== 0)
      owner.forces.push({ ...at, key: `load:${index}:couple`, ux: 0, uy: 0, couple: 1, value: load.couple });
  });
}

/** Resultants of the loads of a case on one member. */
function memberLoads(eq: Equilibrium, b: number, loads: readonly Load[]): BodyForce[] {
  const bar = eq.bars[b];
  const start = bar && eq.analysis.joints[bar.start];
  if (!bar || !start) return [];
  const { c, s, L } = bar.axis;
  const axes = { x: [1, 0], y: [0, 1], along: [c, s], across: [-s, c] } as const;
  const place = (at: number) => ({ x: start.x + c * at, y: start.y + s * at });
  return loads.flatMap((load, index): BodyForce[] => {
    const key = `load:${index}:${bar.member.id}`;
    if (load.kind === 'self-weight') {
      if (bar.member.weight === undefined || (load.members && !load.members.includes(bar.member.id)))
        return [];
      return [
        {
          key,
          of: { kind: 'load', index, intensity: -bar.member.weight, length: L },
          ...place(L / 2),
          ux: 0,
          uy: 1,
          value: -bar.member.weight * L,
        },
      ];
    }
    if (load.kind === 'joint' || load.kind === 'settlement' || load.member !== bar.member.id) return [];
    if (load.kind === 'couple')
      return [
        { key, of: { kind: 'load', index }, ...place(load.at), ux: 0, uy: 0, couple: 1, value: load.value },
      ];
    if (load.kind === 'point') {
      const [ux, uy] = axes[load.direction];
      return [{ key, of: { kind: 'load', index }, ...place(load.at), ux, uy, value: load.value }];
    }
    if (load.kind !== 'distributed') return [];
    const [ux, uy] = axes[load.direction];
    const [from, to] = [load.from ?? 0, load.to ?? L];
    const plan =
      load.per === 'projection'
        ? load.direction === 'y'
          ? Math.abs(c)
          : load.direction === 'x'
            ? Math.abs(s)
            : 1
        : 1;
    const length = (to - from) * plan;
    const sum = load.w1 + load.w2;
    if (sum === 0) return [];
    const at = from + ((to - from) * (load.w1 + 2 * load.w2)) / (3 * sum);
    const even = load.w1 === load.w2;
    return [
      {
        key,
        of: { kind: 'load', index, ...(even ? { intensity: load.w1, length } : {}) },
        ...place(at),
        ux,
        uy,
        value: (sum / 2) * length,
      },
    ];
  });
}
