import type { Load } from '@/lib/model/load';
import { type Deformation, type Element, type EndTriple, type Part, partsOf } from './element';

/** What the loads of a case do to one member that is a simple span, held lengthwise at its start. */
export interface ElementLoad {
  deformation: Deformation;
  /** Shears at both ends and the whole of the load along. */
  V0: number;
  V1: number;
  along: number;
  /** End forces that a release fixes by itself: it lets no shear or no axial force pass. */
  given: EndTriple;
  /** Load along on the very start, couples on the very ends: what lies between joint and member. */
  atStart: { along: number; couple: number };
  atEnd: { couple: number };
}

/** Forces along and across that a span has met from its start to s, and their moment about s. */
interface Passed {
  along: number;
  across: number;
  moment: number;
}

type Action = { cuts: readonly number[]; passed: (s: number) => Passed; total: Passed };

/** Gauss points on [0, 1] that integrate polynomials to degree five. Abramowitz and Stegun, table 25.4. */
const gauss = [
  { at: (1 - Math.sqrt(0.6)) / 2, weight: 5 / 18 },
  { at: 0.5, weight: 8 / 18 },
  { at: (1 + Math.sqrt(0.6)) / 2, weight: 5 / 18 },
] as const;

export function elementLoad(e: Element, loads: readonly Load[]): ElementLoad {
  const sum: ElementLoad = {
    deformation: [0, 0, 0],
    V0: 0,
    V1: 0,
    along: 0,
    given: [0, 0, 0],
    atStart: { along: 0, couple: 0 },
    atEnd: { couple: 0 },
  };
  const parts = partsOf(e.member, e.L);
  for (const load of loads) {
    const action = actionOf(e, load, sum);
    if (action) addAction(sum, e.L, parts, action);
  }
  const at = (end: 'start' | 'end') => e.member.releases?.[end] ?? [];
  if (at('end').includes('axial')) sum.given[0] = sum.along;
  const sliding = at('end').includes('shear') ? sum.V1 : at('start').includes('shear') ? sum.V0 : 0;
  if (at('end').includes('moment')) sum.given[1] = sliding * e.L;
  else sum.given[2] = -sliding * e.L;
  return sum;
}

/** The load in the axes of the member, or nothing when it acts elsewhere or only strains the member. */
function actionOf(e: Element, load: Load, sum: ElementLoad): Action | undefined {
  const { member, L } = e;
  switch (load.kind) {
    case 'self-weight': {
      const w = load.members?.includes(member.id) === false ? undefined : member.weight;
      return w === undefined ? undefined : spread(e, 'y', 0, L, -w, -w);
    }
    case 'distributed': {
      if (load.member !== member.id) return undefined;
      const shadow =
        load.per === 'length' ? 1 : load.direction === 'y' ? e.c : load.direction === 'x' ? e.s : 1;
      const plan = Math.abs(shadow);
      return spread(e, load.direction, load.from ?? 0, load.to ?? L, load.w1 * plan, load.w2 * plan);
    }
    case 'point': {
      if (load.member !== member.id) return undefined;
      const [a, t] = directed(e, load.direction);
      if (load.at === 0) sum.atStart.along += a * load.value;
      return pointed(load.at, L, a * load.value, t * load.value, 0);
    }
    case 'couple':
      if (load.member !== member.id) return undefined;
      if (load.at === 0) sum.atStart.couple += load.value;
      if (load.at === L) sum.atEnd.couple += load.value;
      return pointed(load.at, L, 0, 0, load.value);
    case 'temperature': {
      if (load.member !== member.id || member.alpha === undefined) return undefined;
      const bent = member.depth === undefined ? 0 : (-member.alpha * load.difference) / member.depth;
      strain(sum, [member.alpha * load.rise * L, (bent * L) / 2, (bent * L) / 2]);
      return undefined;
    }
    case 'misfit':
      if (load.member === member.id) strain(sum, [load.value, 0, 0]);
      return undefined;
    case 'joint':
    case 'settlement':
      return undefined;
  }
}

function directed({ c, s }: Element, direction: 'x' | 'y' | 'along' | 'across'): [number, number] {
  return { x: [c, -s], y: [s, c], along: [1, 0], across: [0, 1] }[direction] as [number, number];
}

function strain(sum: ElementLoad, by: Deformation): void {
  for (const i of [0, 1, 2] as const) sum.deformation[i] += by[i];
}

function spread(
  e: Element,
  direction: 'x' | 'y' | 'along' | 'across',
  from: number,
  to: number,
  w1: number,
  w2: number,
): Action {
  const [a, t] = directed(e, direction);
  const slope = (w2 - w1) / (to - from);
  const passed = (s: number): Passed => {
    const x = Math.min(Math.max(s - from, 0), to - from);
    const force = x * (w1 + (slope * x) / 2);
    const ownMoment = x * x * (w1 / 2 + (slope * x) / 6);
    return { along: a * force, across: t * force, moment: t * (ownMoment + force * Math.max(s - to, 0)) };
  };
  return { cuts: [from, to], passed, total: passed(e.L) };
}

function pointed(at: number, L: number, along: number, across: number, couple: number): Action {
  const passed = (s: number): Passed =>
    s < at ? { along: 0, across: 0, moment: 0 } : { along, across, moment: across * (s - at) - couple };
  return { cuts: [at], passed, total: passed(L) };
}

/** Work of the simple span's N, V and M along the unit end forces, piece by piece. */
function addAction(
  sum: ElementLoad,
  L: number,
  parts: readonly Part[],
  { cuts, passed, total }: Action,
): void {
  const V0 = -total.moment / L;
  sum.V0 += V0;
  sum.V1 += V0 + total.across;
  sum.along += total.along;
  for (const part of parts) {
    const inner = cuts.filter((s) => s > part.from && s < part.to);
    const places = [part.from, ...inner, part.to];
    for (let i = 1; i < places.length; i++) {
      const from = places[i - 1] as number;
      const h = (places[i] as number) - from;
      for (const { at, weight } of gauss) {
        const s = from + at * h;
        const met = passed(s);
        const [N, V, M] = [-met.along, V0 + met.across, V0 * s + met.moment];
        const bent = M * part.perEI;
        const sheared = (V * part.perGAs) / L;
        const w = weight * h;
        strain(sum, [w * N * part.perEA, w * ((1 - s / L) * bent - sheared), w * ((s / L) * bent + sheared)]);
      }
    }
  }
}
