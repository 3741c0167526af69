import type { Load } from '@/lib/model/load';
import type { Bar, Equilibrium } from './equilibrium';
import type { BodyForce } from './rigid-body';

/**
 * Resultants of the loads of a case on one member. A distributed load whose ends cancel has none, only a couple: see
 * `withoutResultant`.
 */
export function memberLoadForces(eq: Equilibrium, bar: Bar, loads: readonly Load[]): BodyForce[] {
  const start = eq.analysis.joints[bar.start];
  if (!start) return [];
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

/** Distributed loads that change sign in their middle: their sum is a couple, which no line of statics here states. */
export function withoutResultant(load: Load): boolean {
  return load.kind === 'distributed' && load.w1 !== 0 && load.w1 + load.w2 === 0;
}
