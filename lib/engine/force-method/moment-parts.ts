import type { LocalLoads } from '../diagrams/local-loads';
import type { memberForces } from '../diagrams/member-forces';
import { valueAt } from '../diagrams/piecewise';
import type { Bar } from '../statics/equilibrium';
import { cantileverShapes } from './cantilever-shapes';
import { type Shape, triangle } from './part-shapes';
import { pointShapes, spreadShapes } from './span-shapes';
import type { MomentPart } from './work';

type Due = MomentPart['due'];

/** Below this part of the largest moment a shape is rounding. */
const negligible = 1e-11;

/**
 * The primary moment diagram of one member as a sum of named shapes. A member that hangs from one end: what each load
 * draws on the cantilever. Any other, and each length of a stepped member for itself: the moments at its ends as two
 * triangles, and what each load draws on the simple span.
 */
export function momentParts(
  bar: Bar,
  forces: ReturnType<typeof memberForces>,
  loads: LocalLoads,
): MomentPart[] {
  const { L } = bar.axis;
  const { M, V } = forces;
  const size = largest(M, loads, L);
  if (size === 0) return [];
  const named = (shapes: { shape: Shape; due: Due }[]): MomentPart[] =>
    shapes.flatMap(({ shape, due }) =>
      Math.abs(shape.height) > negligible * size ? [{ member: bar.member.id, ...shape, due }] : [],
    );
  if (bar.member.steps === undefined) {
    const free = (end: 'start' | 'end') => {
      const [s, side] = end === 'start' ? ([0, 'right'] as const) : ([L, 'left'] as const);
      const small = negligible * size;
      return Math.abs(valueAt(M, s, side)) <= small && Math.abs(valueAt(V, s, side)) * L <= small;
    };
    // A load on the very end that leaves no force behind it goes into the joint and bends nothing.
    const beyond = (end: number) => ({ ...loads, points: loads.points.filter((p) => p.at !== end) });
    if (free('start')) return named(cantileverShapes(beyond(0), L, 'end'));
    if (free('end')) return named(cantileverShapes(beyond(L), L, 'start'));
  }
  return bar.stretches.flatMap(({ from, to }) => named(shapesBetween(M, loads, from, to)));
}

/** A moment diagram between two places: its end values as two triangles, and what the loads add on a simple span. */
export function shapesBetween(
  M: ReturnType<typeof memberForces>['M'],
  loads: LocalLoads,
  from: number,
  to: number,
): { shape: Shape; due: Due }[] {
  return [...endShapes(M, from, to), ...loadShapes(loads, from, to)];
}

function endShapes(M: ReturnType<typeof memberForces>['M'], from: number, to: number) {
  const start = { kind: 'end-moment', end: 'start' } as const;
  const end = { kind: 'end-moment', end: 'end' } as const;
  return [
    { shape: triangle(from, to, valueAt(M, from), 'start'), due: start },
    { shape: triangle(from, to, valueAt(M, to, 'left'), 'end'), due: end },
  ];
}

/** What the loads between two places draw on a simple span between them. */
function loadShapes(loads: LocalLoads, from: number, to: number): { shape: Shape; due: Due }[] {
  const spread = loads.spread.flatMap((w) => {
    const [a, b] = [Math.max(w.from, from), Math.min(w.to, to)];
    if (a >= b) return [];
    const at = (s: number) => w.across[0] + ((w.across[1] - w.across[0]) * (s - w.from)) / (w.to - w.from);
    const ends: [number, number] = [a === w.from ? w.across[0] : at(a), b === w.to ? w.across[1] : at(b)];
    return spreadShapes({ from: a, to: b, across: ends }, from, to).map((shape) => ({
      shape,
      due: { kind: 'load' as const, index: w.index },
    }));
  });
  const points = loads.points
    .filter((p) => p.at > from && p.at < to)
    .flatMap((p) =>
      pointShapes(p, from, to).map((shape) => ({ shape, due: { kind: 'load' as const, index: p.index } })),
    );
  return [...spread, ...points];
}

function largest(M: ReturnType<typeof memberForces>['M'], loads: LocalLoads, L: number): number {
  let size = 0;
  for (const p of M) size = Math.max(size, Math.abs(p.c[0] as number), Math.abs(valueAt([p], p.to, 'left')));
  for (const w of loads.spread) {
    const l = Math.min(L, w.to) - w.from;
    size = Math.max(size, Math.max(Math.abs(w.across[0]), Math.abs(w.across[1])) * l * l);
  }
  for (const p of loads.points) size = Math.max(size, Math.abs(p.across) * L, Math.abs(p.couple));
  return size;
}
