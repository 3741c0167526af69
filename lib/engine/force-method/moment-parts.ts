import type { LocalLoads } from '../diagrams/local-loads';
import { memberForces } from '../diagrams/member-forces';
import { valueAt } from '../diagrams/piecewise';
import type { Bar } from '../statics/equilibrium';
import type { EndForces } from './member-state';
import type { MomentPart } from './work';

type Shape = Omit<MomentPart, 'member' | 'due'>;

/** Areas and centroids: triangle 1/2, parabola 2/3, spandrel 1/3 (AISC Manual, Table 17-27 as recalled; integrated). */
function triangle(from: number, to: number, height: number, tall: 'start' | 'end'): Shape {
  const l = to - from;
  const centroid = tall === 'start' ? from + l / 3 : to - l / 3;
  return {
    shape: 'triangle',
    from,
    to,
    tall,
    height,
    factor: { n: 1, d: 2 },
    area: (l * height) / 2,
    centroid,
  };
}

function parabola(from: number, to: number, height: number): Shape {
  const l = to - from;
  return {
    shape: 'parabola',
    from,
    to,
    tall: 'peak',
    height,
    factor: { n: 2, d: 3 },
    area: (2 * l * height) / 3,
    centroid: from + l / 2,
  };
}

/** Simple span under a load rising from 0 to w: M = (w l²/6)(x − x³), x = s/l; height w l²/6, area 1/4, centroid 8/15. */
function cubic(from: number, to: number, height: number, tall: 'start' | 'end'): Shape {
  const l = to - from;
  const centroid = tall === 'end' ? from + (8 / 15) * l : to - (8 / 15) * l;
  return { shape: 'cubic', from, to, tall, height, factor: { n: 1, d: 4 }, area: (l * height) / 4, centroid };
}

function spandrel(from: number, to: number, height: number, tall: 'start' | 'end'): Shape {
  const l = to - from;
  const centroid = tall === 'end' ? to - l / 4 : from + l / 4;
  return {
    shape: 'spandrel',
    from,
    to,
    tall,
    height,
    factor: { n: 1, d: 3 },
    area: (l * height) / 3,
    centroid,
  };
}

/**
 * The primary moment diagram of one member as a sum of named shapes: what the end moments draw, and for each load what
 * it draws on the simple span; a uniform load on a member with a free end is one spandrel from the support.
 */
export function momentParts(bar: Bar, ends: EndForces, loads: LocalLoads): MomentPart[] {
  const { L } = bar.axis;
  const member = bar.member.id;
  const free = freeEndSpandrel(ends, loads, L);
  if (free) return [{ member, ...free.shape, due: { kind: 'load', index: free.index } }];
  const parts: MomentPart[] = [];
  const size = Math.max(Math.abs(ends.M0), Math.abs(ends.M1), largest(loads, L));
  const small = 1e-11 * size;
  if (Math.abs(ends.M0) > small)
    parts.push({ member, ...triangle(0, L, ends.M0, 'start'), due: { kind: 'end-moment', end: 'start' } });
  if (Math.abs(ends.M1) > small)
    parts.push({ member, ...triangle(0, L, ends.M1, 'end'), due: { kind: 'end-moment', end: 'end' } });
  for (const w of loads.spread) {
    for (const shape of spreadShapes(w, L))
      parts.push({ member, ...shape, due: { kind: 'load', index: w.index } });
  }
  for (const p of loads.points) {
    for (const shape of pointShapes(p, L))
      parts.push({ member, ...shape, due: { kind: 'load', index: p.index } });
  }
  return parts.filter((p) => Math.abs(p.height) > small);
}

function spreadShapes(w: LocalLoads['spread'][number], L: number): Shape[] {
  const { M } = memberForces({ N: 0, M0: 0, M1: 0 }, { spread: [w], points: [] }, L);
  const l = w.to - w.from;
  const shapes: Shape[] = [];
  const [a, b] = [valueAt(M, w.from), valueAt(M, w.to, 'left')];
  if (w.from > 0) shapes.push(triangle(0, w.from, a, 'end'));
  if (w.from > 0) shapes.push(triangle(w.from, w.to, a, 'start'));
  if (w.to < L) shapes.push(triangle(w.from, w.to, b, 'end'));
  if (w.to < L) shapes.push(triangle(w.to, L, b, 'start'));
  const [q1, q2] = w.across;
  const even = Math.abs(q1) < Math.abs(q2) ? q1 : q2;
  if (q1 * q2 > 0 || q1 === q2) {
    if (even !== 0) shapes.push(parabola(w.from, w.to, (-even * l * l) / 8));
    if (q2 - even !== 0) shapes.push(cubic(w.from, w.to, (-(q2 - even) * l * l) / 6, 'end'));
    if (q1 - even !== 0) shapes.push(cubic(w.from, w.to, (-(q1 - even) * l * l) / 6, 'start'));
    return shapes;
  }
  if (q2 !== 0) shapes.push(cubic(w.from, w.to, (-q2 * l * l) / 6, 'end'));
  if (q1 !== 0) shapes.push(cubic(w.from, w.to, (-q1 * l * l) / 6, 'start'));
  return shapes;
}

function pointShapes(p: LocalLoads['points'][number], L: number): Shape[] {
  const shapes: Shape[] = [];
  const { at: a } = p;
  const force = (-p.across * a * (L - a)) / L;
  if (force !== 0) {
    shapes.push({
      shape: 'triangle',
      from: 0,
      to: L,
      tall: 'peak',
      height: force,
      factor: { n: 1, d: 2 },
      area: (L * force) / 2,
      centroid: (L + a) / 3,
    });
  }
  if (p.couple !== 0) {
    if (a > 0) shapes.push(triangle(0, a, (p.couple * a) / L, 'end'));
    if (a < L) shapes.push(triangle(a, L, (-p.couple * (L - a)) / L, 'start'));
  }
  return shapes;
}

function freeEndSpandrel(
  ends: EndForces,
  loads: LocalLoads,
  L: number,
): { shape: Shape; index: number } | undefined {
  const [w, ...more] = loads.spread;
  if (!w || more.length > 0 || loads.points.length > 0 || w.from > 0 || w.to < L) return undefined;
  const q = w.across[0];
  if (q === 0 || w.across[1] !== q) return undefined;
  const full = (q * L * L) / 2;
  const near = (x: number, y: number) => Math.abs(x - y) <= 1e-11 * Math.abs(full);
  if (near(ends.M1, 0) && near(ends.M0, full))
    return { shape: spandrel(0, L, full, 'start'), index: w.index };
  if (near(ends.M0, 0) && near(ends.M1, full)) return { shape: spandrel(0, L, full, 'end'), index: w.index };
  return undefined;
}

function largest(loads: LocalLoads, L: number): number {
  const spread = loads.spread.map((w) => Math.max(Math.abs(w.across[0]), Math.abs(w.across[1])) * L * L);
  const points = loads.points.map((p) => Math.abs(p.across) * L + Math.abs(p.couple));
  return Math.max(0, ...spread, ...points);
}
