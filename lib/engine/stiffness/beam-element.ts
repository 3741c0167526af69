import type { Load } from '@/lib/model/load';
import type { Member } from '@/lib/model/structure';

/**
 * One member for the stiffness way, from Simpson- and Gauss-free exact integrals of its own: bending flexibility of the
 * simple span (end moments → end rotations), rotations and stretch its loads cause, and end shears of the simple span.
 */
export interface BeamElement {
  L: number;
  c: number;
  s: number;
  /** Rotations (ψ − θ0, θ1 − ψ) = F (M0, M1) + load. */
  F: [number, number, number];
  /** L/EA in all; zero when it does not stretch. */
  stretch: number;
  hasAxial: boolean;
  /** Combinations of (M0, M1) that the releases leave free. */
  modes: [number, number][];
}

export interface ElementLoad {
  rotation: [number, number];
  elongation: number;
  V0: number;
  V1: number;
  /** ∫ of the load along. */
  along: number;
  /** Moments that a shear release needs to balance its end shear, and N where an axial release at the end fixes it. */
  M: [number, number];
  N0: number;
}

/** Three Gauss points integrate the polynomials met here (degree five at most) exactly. */
const gauss: [number, number][] = [
  [-Math.sqrt(0.6), 5 / 9],
  [0, 8 / 9],
  [Math.sqrt(0.6), 5 / 9],
];

export function integrate(f: (s: number) => number, cuts: readonly number[]): number {
  let total = 0;
  for (let i = 1; i < cuts.length; i++) {
    const a = cuts[i - 1] as number;
    const h = (cuts[i] as number) - a;
    for (const [x, w] of gauss) total += (w * h * f(a + (h * (1 + x)) / 2)) / 2;
  }
  return total;
}

export function beamElement(member: Member, L: number, c: number, s: number): BeamElement {
  const cuts = [0, ...(member.steps ?? []).map((step) => step.from), L];
  const own = (x: number) => (member.steps ?? []).filter((step) => step.from <= x).at(-1) ?? member;
  const shear = integrate((x) => 1 / ((own(x).GAs ?? Number.POSITIVE_INFINITY) * L * L), cuts);
  const bend = (f: (x: number) => number) => integrate((x) => f(x) / own(x).EI, cuts);
  const released = (end: 'start' | 'end', what: 'moment' | 'axial' | 'shear') =>
    member.releases?.[end].includes(what) === true;
  return {
    L,
    c,
    s,
    F: [
      bend((x) => (1 - x / L) ** 2) + shear,
      bend((x) => (1 - x / L) * (x / L)) - shear,
      bend((x) => (x / L) ** 2) + shear,
    ],
    stretch: integrate((x) => 1 / (own(x).EA ?? Number.POSITIVE_INFINITY), cuts),
    hasAxial: !released('start', 'axial') && !released('end', 'axial'),
    modes: freeModes(
      released('start', 'moment'),
      released('end', 'moment'),
      released('start', 'shear') || released('end', 'shear'),
    ),
  };
}

function freeModes(start: boolean, end: boolean, shear: boolean): [number, number][] {
  if (shear) return start || end ? [] : [[1, 1]];
  const modes: [number, number][] = [];
  if (!start) modes.push([1, 0]);
  if (!end) modes.push([0, 1]);
  return modes;
}

/** Effects of the loads of a case on the simple span, each load integrated on its own. */
export function elementLoad(member: Member, e: BeamElement, loads: readonly Load[]): ElementLoad {
  const { L, c, s } = e;
  const own = (x: number) => (member.steps ?? []).filter((step) => step.from <= x).at(-1) ?? member;
  const steps = (member.steps ?? []).map((step) => step.from);
  const sum: ElementLoad = { rotation: [0, 0], elongation: 0, V0: 0, V1: 0, along: 0, M: [0, 0], N0: 0 };
  let bendings: {
    cuts: number[];
    M: (x: number) => number;
    V: (x: number) => number;
    N: (x: number) => number;
  }[] = [];
  for (const load of loads) {
    switch (load.kind) {
      case 'distributed':
      case 'self-weight': {
        const weight = load.kind === 'self-weight';
        const mine = weight
          ? (load.members === undefined || load.members.includes(member.id)) && member.weight !== undefined
          : load.member === member.id;
        if (!mine) break;
        const d = weight
          ? {
              direction: 'y' as const,
              per: 'length' as const,
              w1: -(member.weight as number),
              w2: -(member.weight as number),
              from: 0,
              to: L,
            }
          : { ...load, from: load.from ?? 0, to: load.to ?? L };
        const plan =
          d.per === 'projection'
            ? d.direction === 'y'
              ? Math.abs(c)
              : d.direction === 'x'
                ? Math.abs(s)
                : 1
            : 1;
        const w = (x: number) => (d.w1 + ((d.w2 - d.w1) * (x - d.from)) / (d.to - d.from)) * plan;
        const [ax, tx] = part(d.direction, c, s);
        bendings.push(
          spread(
            d.from,
            d.to,
            (x) => w(x) * ax,
            (x) => w(x) * tx,
            L,
            steps,
          ),
        );
        break;
      }
      case 'point':
        if (load.member === member.id) {
          const [ax, tx] = part(load.direction, c, s);
          bendings.push(pointed(load.at, load.value * ax, load.value * tx, 0, L, steps));
        }
        break;
      case 'couple':
        if (load.member === member.id) bendings.push(pointed(load.at, 0, 0, load.value, L, steps));
        break;
      case 'temperature':
        if (load.member === member.id && member.alpha !== undefined) {
          sum.elongation += member.alpha * load.rise * L;
          const kappa = member.depth === undefined ? 0 : (-member.alpha * load.difference) / member.depth;
          sum.rotation[0] += (kappa * L) / 2;
          sum.rotation[1] += (kappa * L) / 2;
        }
        break;
      case 'misfit':
        if (load.member === member.id) sum.elongation += load.value;
        break;
      case 'joint':
      case 'settlement':
        break;
    }
  }
  bendings = bendings.filter((b) => b.cuts.length > 1);
  for (const b of bendings) {
    const inside = (f: (x: number) => number) => integrate(f, b.cuts);
    sum.rotation[0] += inside(
      (x) => ((1 - x / L) * b.M(x)) / own(x).EI - b.V(x) / ((own(x).GAs ?? Number.POSITIVE_INFINITY) * L),
    );
    sum.rotation[1] += inside(
      (x) => ((x / L) * b.M(x)) / own(x).EI + b.V(x) / ((own(x).GAs ?? Number.POSITIVE_INFINITY) * L),
    );
    sum.elongation += inside((x) => b.N(x) / (own(x).EA ?? Number.POSITIVE_INFINITY));
    sum.V0 += b.V(0);
    sum.V1 += b.V(L);
    sum.along -= b.N(L);
  }
  const shearEnd = member.releases?.end.includes('shear')
    ? sum.V1
    : member.releases?.start.includes('shear')
      ? sum.V0
      : 0;
  if (shearEnd !== 0) {
    if (member.releases?.end.includes('moment')) sum.M = [shearEnd * L, 0];
    else sum.M = [0, -shearEnd * L];
  }
  if (member.releases?.end.includes('axial')) sum.N0 = sum.along;
  return sum;
}

function part(direction: 'x' | 'y' | 'along' | 'across', c: number, s: number): [number, number] {
  return direction === 'along'
    ? [1, 0]
    : direction === 'across'
      ? [0, 1]
      : direction === 'x'
        ? [c, -s]
        : [s, c];
}

function ordered(inner: readonly number[], L: number): number[] {
  return [...new Set([0, ...inner.filter((x) => x > 0 && x < L), L])].sort((a, b) => a - b);
}

/** Simple span under a spread load: resultants of what lies left of x. */
function spread(
  from: number,
  to: number,
  p: (x: number) => number,
  q: (x: number) => number,
  L: number,
  steps: readonly number[],
) {
  const left = (f: (x: number) => number, x: number) =>
    x <= from ? 0 : integrate(f, [from, Math.min(x, to)]);
  const R = -left((u) => q(u) * (L - u), L) / L;
  return {
    cuts: ordered([from, to, ...steps], L),
    V: (x: number) => R + left(q, x),
    M: (x: number) => R * x + left((u) => q(u) * (x - u), x),
    N: (x: number) => -left(p, x),
  };
}

function pointed(at: number, P: number, Q: number, couple: number, L: number, steps: readonly number[]) {
  const R = (couple - Q * (L - at)) / L;
  const past = (x: number) => x > at || (x === L && at === L);
  return {
    cuts: ordered([at, ...steps], L),
    V: (x: number) => R + (past(x) || (at === 0 && x === 0) ? Q : 0),
    M: (x: number) => R * x + (past(x) ? Q * (x - at) - couple : 0),
    N: (x: number) => (past(x) ? -P : 0),
  };
}
