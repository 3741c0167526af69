import type { Joint, Member } from '@/lib/model/structure';

/** Axial force at the start and bending moments at both ends. */
export type EndTriple = [number, number, number];

/** Elongation, and the rotations (chord − start section) and (end section − chord) that N, M0 and M1 work on. */
export type Deformation = EndTriple;

/**
 * One member for the stiffness way: its direction, what a unit of each end force deforms, and the patterns of end
 * forces that its releases leave free.
 */
export interface Element {
  member: Member;
  /** Places of its joints in the analysis. */
  joints: [number, number];
  L: number;
  c: number;
  s: number;
  /** Deformation = flexibility · (N, M0, M1). */
  flexibility: [EndTriple, EndTriple, EndTriple];
  modes: EndTriple[];
}

/** Parts of a member with one stiffness; 1/EA and 1/GAs are zero where it neither stretches nor shears. */
export interface Part {
  from: number;
  to: number;
  perEI: number;
  perEA: number;
  perGAs: number;
}

export function partsOf(member: Member, L: number): Part[] {
  const all = [{ from: 0, EI: member.EI, EA: member.EA, GAs: member.GAs }, ...(member.steps ?? [])];
  return all.map((p, i) => ({
    from: p.from,
    to: all[i + 1]?.from ?? L,
    perEI: 1 / p.EI,
    perEA: p.EA === undefined ? 0 : 1 / p.EA,
    perGAs: p.GAs === undefined ? 0 : 1 / p.GAs,
  }));
}

/** Undefined when the releases leave the member loose in itself. */
export function elementOf(member: Member, joints: [number, number], a: Joint, b: Joint): Element | undefined {
  const [dx, dy] = [b.x - a.x, b.y - a.y];
  const L = Math.hypot(dx, dy);
  const modes = modesOf(member);
  if (!modes) return undefined;
  let [f00, f01, f11, axial, shear] = [0, 0, 0, 0, 0];
  for (const p of partsOf(member, L)) {
    const [x, y] = [p.from / L, p.to / L];
    const third = ((y ** 3 - x ** 3) * L) / 3;
    const fallen = (((1 - x) ** 3 - (1 - y) ** 3) * L) / 3;
    f00 += p.perEI * fallen;
    f01 += p.perEI * (((y * y - x * x) * L) / 2 - third);
    f11 += p.perEI * third;
    axial += p.perEA * (p.to - p.from);
    shear += (p.perGAs * (p.to - p.from)) / (L * L);
  }
  const flexibility: Element['flexibility'] = [
    [axial, 0, 0],
    [0, f00 + shear, f01 - shear],
    [0, f01 - shear, f11 + shear],
  ];
  return { member, joints, L, c: dx / L, s: dy / L, flexibility, modes };
}

/** A shear release ties both end moments together; a moment release strikes one out; an axial release strikes out N. */
function modesOf({ releases }: Member): EndTriple[] | undefined {
  const released = (end: 'start' | 'end', what: 'moment' | 'shear' | 'axial') =>
    releases?.[end].includes(what) === true;
  const twice = (what: 'shear' | 'axial') => released('start', what) && released('end', what);
  if (twice('shear') || twice('axial')) return undefined;
  const modes: EndTriple[] = [];
  if (!released('start', 'axial') && !released('end', 'axial')) modes.push([1, 0, 0]);
  const [hinge0, hinge1] = [released('start', 'moment'), released('end', 'moment')];
  if (released('start', 'shear') || released('end', 'shear')) {
    if (hinge0 && hinge1) return undefined;
    if (!hinge0 && !hinge1) modes.push([0, 1, 1]);
    return modes;
  }
  if (!hinge0) modes.push([0, 1, 0]);
  if (!hinge1) modes.push([0, 0, 1]);
  return modes;
}

/**
 * How the six end displacements (x, y, turn at start and end) deform the member along a pattern of end forces; turned
 * about, the forces at both ends that the pattern needs.
 */
export function deformationRow({ L, c, s }: Element, [n, m0, m1]: EndTriple): number[] {
  const v = (m1 - m0) / L;
  return [-n * c - v * s, -n * s + v * c, -m0, n * c + v * s, n * s - v * c, m1];
}

export function times(flexibility: Element['flexibility'], f: EndTriple): Deformation {
  const row = (i: 0 | 1 | 2) =>
    flexibility[i][0] * f[0] + flexibility[i][1] * f[1] + flexibility[i][2] * f[2];
  return [row(0), row(1), row(2)];
}

export function dot(a: EndTriple, b: EndTriple): number {
  return a[0] * b[0] + a[1] * b[1] + a[2] * b[2];
}
