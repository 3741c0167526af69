import type { AnalysisInput } from '@/lib/model/analysis';

const fixed = { x: 'held', y: 'held', turn: 'held' } as const;
const pinned = { x: 'held', y: 'held', turn: 'free' } as const;
const roller = { x: 'free', y: 'held', turn: 'free' } as const;
type Loads = AnalysisInput['cases'][number]['loads'];

function wrap(part: Pick<AnalysisInput, 'joints' | 'members' | 'cases' | 'combinations'>): AnalysisInput {
  return { form: 'fairhand.analysis/1', units: 'SI', basis: { kind: 'absolute' }, ...part };
}

/** Spans of 5 to 8 m, alternately stiff, under an even load. */
export function beam(spans: number): AnalysisInput {
  let x = 0;
  const joints: AnalysisInput['joints'] = [{ id: '0', x, y: 0, support: pinned }];
  const members: AnalysisInput['members'] = [];
  const loads: Loads = [];
  for (let i = 0; i < spans; i++) {
    x += 5 + (i % 4);
    joints.push({ id: `${i + 1}`, x, y: 0, support: roller });
    members.push({ id: `s${i}`, start: `${i}`, end: `${i + 1}`, EI: i % 2 === 0 ? 16_000 : 24_000 });
    loads.push({ kind: 'distributed', member: `s${i}`, direction: 'y', w1: -20, w2: -20 });
  }
  return wrap({ joints, members, cases: [{ id: 'D', title: 'Dead', nature: 'dead', loads }] });
}

/** Storeys of 3.5 m and bays of 6 m on fixed feet; beams loaded, every storey pushed. Stretching members if EA is given. */
export function frame(storeys: number, bays: number, EA?: number): AnalysisInput {
  const joints: AnalysisInput['joints'] = [];
  const members: AnalysisInput['members'] = [];
  const loads: Loads = [];
  const name = (i: number, k: number) => `${i}.${k}`;
  for (let i = 0; i <= storeys; i++) {
    for (let k = 0; k <= bays; k++) {
      joints.push({ id: name(i, k), x: 6 * k, y: 3.5 * i, support: i === 0 ? fixed : undefined });
      if (i === 0) continue;
      members.push({ id: `c${name(i, k)}`, start: name(i - 1, k), end: name(i, k), EI: 20_000, EA });
      if (k === 0) continue;
      members.push({ id: `b${name(i, k)}`, start: name(i, k - 1), end: name(i, k), EI: 32_000, EA });
      loads.push({ kind: 'distributed', member: `b${name(i, k)}`, direction: 'y', w1: -24, w2: -24 });
    }
    if (i > 0) loads.push({ kind: 'joint', joint: name(i, 0), x: 10 });
  }
  return wrap({ joints, members, cases: [{ id: 'D', title: 'Dead', nature: 'dead', loads }] });
}

/** A fixed portal with dead, live, snow and wind loads and the seven combinations of a strength check. */
export function portal(): AnalysisInput {
  const { joints, members } = frame(1, 1);
  const over = (w: number): Loads => [{ kind: 'distributed', member: 'b1.1', direction: 'y', w1: w, w2: w }];
  const cases: AnalysisInput['cases'] = [
    { id: 'D', title: 'Dead', nature: 'dead', loads: over(-12) },
    {
      id: 'L',
      title: 'Live',
      nature: 'live',
      loads: [...over(-9), { kind: 'point', member: 'b1.1', at: 2, direction: 'y', value: -20 }],
    },
    { id: 'S', title: 'Snow', nature: 'snow', loads: over(-6) },
    {
      id: 'W',
      title: 'Wind',
      nature: 'wind',
      loads: [{ kind: 'distributed', member: 'c1.0', direction: 'x', w1: 4, w2: 6 }],
    },
  ];
  const sums: Record<string, number>[] = [
    { D: 1.4 },
    { D: 1.2, L: 1.6, S: 0.5 },
    { D: 1.2, L: 1, S: 1.6 },
    { D: 1.2, S: 1.6, W: 0.5 },
    { D: 1.2, L: 1, S: 0.5, W: 1 },
    { D: 0.9, W: 1 },
    { D: 0.9, W: -1 },
  ];
  const combinations = sums.map((factors, i) => ({ id: `${i + 1}`, purpose: 'strength' as const, factors }));
  return wrap({ joints, members, cases, combinations });
}

/** The same structure in other units of force and length, its distributed and joint loads with it. */
export function inUnits(input: AnalysisInput, force: number, length: number): AnalysisInput {
  const load = (l: Loads[number]): Loads[number] => {
    if (l.kind === 'distributed') return { ...l, w1: (l.w1 * force) / length, w2: (l.w2 * force) / length };
    if (l.kind === 'joint') return { ...l, x: (l.x ?? 0) * force, y: (l.y ?? 0) * force };
    throw new Error(`a load of kind ${l.kind} is not scaled here`);
  };
  return {
    ...input,
    joints: input.joints.map((j) => ({ ...j, x: j.x * length, y: j.y * length })),
    members: input.members.map((m) => ({ ...m, EI: m.EI * force * length ** 2 })),
    cases: input.cases.map((c) => ({ ...c, loads: c.loads.map(load) })),
  };
}
