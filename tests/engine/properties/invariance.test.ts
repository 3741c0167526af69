import fc from 'fast-check';
import { expect, test } from 'vitest';
import type { Solution } from '@/lib/engine/solution';
import type { AnalysisInput } from '@/lib/model/analysis';
import { difference, sizeOf, solveOrRefuse, toleranceOf, type Values, valuesOf } from './compare-results';
import { between, type Load, randomStructure } from './random-structure';

const numRuns = 150;

/** Solves both forms of one structure and compares every case, names of the second turned into those of the first. */
function expectSame(
  input: AnalysisInput,
  other: AnalysisInput,
  turned: (values: Values) => Values = (v) => v,
): Solution | undefined {
  const [one, two] = [solveOrRefuse(input), solveOrRefuse(other)];
  expect(two === undefined).toBe(one === undefined);
  if (!one || !two) return undefined;
  const open = openNames(one, two);
  for (const id of Object.keys(one.cases)) {
    const a = valuesOf(one, one.cases[id] as Solution['cases'][string], open);
    const b = turned(valuesOf(two, two.cases[id] as Solution['cases'][string]));
    const { force, motion } = sizeOf(one, id);
    const tolerance = Math.max(toleranceOf(one), toleranceOf(two));
    expect(difference(a.forces, b.forces, force)).toBeLessThan(tolerance);
    expect(difference(a.motions, b.motions, motion)).toBeLessThan(tolerance);
  }
  return one;
}

/** Members that may carry any axial force, with every reaction: which of them is taken as zero depends on the order. */
function openNames(...solutions: Solution[]): Set<string> {
  const members = solutions.flatMap((s) => s.determinacy.openAxial);
  if (members.length === 0) return new Set();
  const joints = solutions.flatMap((s) => s.analysis.joints.map((j) => j.id));
  const all = solutions.flatMap((s) => s.analysis.members.map((m) => m.id));
  return new Set([...all, ...joints.flatMap((j) => [`${j}:x`, `${j}:y`])]);
}

const mapValues = (m: ReadonlyMap<string, number>, f: (key: string, v: number) => [string, number]) =>
  new Map([...m].map(([key, v]) => f(key, v)));

test('other names and another order of joints and members change nothing', () => {
  fc.assert(
    fc.property(randomStructure, fc.infiniteStream(fc.nat(1e6)), (input, draws) => {
      const shuffled = <T>(list: readonly T[]): T[] =>
        list
          .map((item) => ({ item, key: draws.next().value }))
          .sort((a, b) => a.key - b.key)
          .map((x) => x.item);
      const joints = shuffled(input.joints).map((j) => ({ ...j, id: `n${j.id}` }));
      const members = shuffled(input.members).map((m) => ({
        ...m,
        id: `n${m.id}`,
        start: `n${m.start}`,
        end: `n${m.end}`,
      }));
      const cases = input.cases.map((c) => ({
        ...c,
        loads: c.loads.map((l): Load => {
          if ('joint' in l) return { ...l, joint: `n${l.joint}` };
          return 'member' in l ? { ...l, member: `n${l.member}` } : l;
        }),
      }));
      const bare = (v: Values): Values => ({
        forces: mapValues(v.forces, (k, x) => [k.slice(1), x]),
        motions: mapValues(v.motions, (k, x) => [k.slice(1), x]),
      });
      expectSame(input, { ...input, joints, members, cases }, bare);
    }),
    { numRuns },
  );
});

/** Mirrored about a vertical line: x, turning, V and M of a member walked the same way change sense. */
test('a structure seen from behind has the same forces, turned about', () => {
  fc.assert(
    fc.property(randomStructure, (input) => {
      const joints = input.joints.map((j) => ({
        ...j,
        x: -j.x,
        support: j.support && { ...j.support, angle: -(j.support.angle ?? 0) },
      }));
      const cases = input.cases.map((c) => ({ ...c, loads: c.loads.map(mirrored) }));
      const turns = (key: string) => /:(x|turn|rotation|M0|M1)$/.test(key);
      const back = (v: Values): Values => ({
        forces: mapValues(v.forces, (k, x) => [k, turns(k) ? -x : x]),
        motions: mapValues(v.motions, (k, x) => [k, turns(k) ? -x : x]),
      });
      expectSame(input, { ...input, joints, cases }, back);
    }),
    { numRuns },
  );
});

function mirrored(l: Load): Load {
  switch (l.kind) {
    case 'point':
      return l.direction === 'x' || l.direction === 'across' ? { ...l, value: -l.value } : l;
    case 'distributed':
      return l.direction === 'x' || l.direction === 'across' ? { ...l, w1: -l.w1, w2: -l.w2 } : l;
    case 'couple':
      return { ...l, value: -l.value };
    case 'joint':
      return { ...l, x: -(l.x ?? 0), couple: -(l.couple ?? 0) };
    case 'temperature':
      return { ...l, difference: -(l.difference ?? 0) };
    case 'settlement':
      return l.component === 'y' ? l : { ...l, value: -l.value };
    case 'misfit':
    case 'self-weight':
      return l;
  }
}

test('a member walked from its other end has the same forces', () => {
  fc.assert(
    fc.property(randomStructure, fc.nat(99), (input, pick) => {
      const index = pick % input.members.length;
      const m = input.members[index];
      if (!m || m.steps) return;
      const [a, b] = [m.start, m.end].map((id) => input.joints.find((j) => j.id === id));
      if (!a || !b) throw new Error('a member without joints');
      const L = Math.hypot(b.x - a.x, b.y - a.y);
      const releases = { start: m.releases?.end, end: m.releases?.start };
      const members = input.members.map((o) =>
        o === m ? { ...m, start: m.end, end: m.start, releases } : o,
      );
      const cases = input.cases.map((c) => ({ ...c, loads: c.loads.map((l) => walkedBack(l, m.id, L)) }));
      const back = (v: Values): Values => {
        const forces = new Map(v.forces);
        forces.set(`${m.id}:M0`, -(v.forces.get(`${m.id}:M1`) as number));
        forces.set(`${m.id}:M1`, -(v.forces.get(`${m.id}:M0`) as number));
        forces.delete(`${m.id}:N`);
        return { ...v, forces };
      };
      expectSame(input, { ...input, members, cases }, back);
    }),
    { numRuns },
  );
});

function walkedBack(l: Load, member: string, L: number): Load {
  if (!('member' in l) || l.member !== member) return l;
  const turned = 'direction' in l && (l.direction === 'along' || l.direction === 'across') ? -1 : 1;
  switch (l.kind) {
    case 'point':
      return { ...l, at: L - l.at, value: turned * l.value };
    case 'couple':
      return { ...l, at: L - l.at };
    case 'distributed': {
      const [from, to] = [L - (l.to ?? L), L - (l.from ?? 0)];
      return { ...l, from: Math.max(from, 0), to: Math.min(to, L), w1: turned * l.w2, w2: turned * l.w1 };
    }
    case 'temperature':
      return { ...l, difference: -(l.difference ?? 0) };
    default:
      return l;
  }
}

test('other units of force and length change nothing but the units', () => {
  const power = fc.integer({ min: -6, max: 6 }).map((k) => 10 ** k);
  fc.assert(
    fc.property(randomStructure, power, power, (input, f, l) => {
      const support = (j: AnalysisInput['joints'][number]) => {
        const s = j.support;
        if (!s) return undefined;
        const spring = (r: typeof s.x, k: number) => (typeof r === 'object' ? { spring: r.spring * k } : r);
        return { ...s, x: spring(s.x, f / l), y: spring(s.y, f / l), turn: spring(s.turn, f * l) };
      };
      const stiff = <T extends { EI: number; EA?: number; GAs?: number }>(m: T): T => ({
        ...m,
        EI: m.EI * f * l * l,
        ...(m.EA === undefined ? {} : { EA: m.EA * f }),
        ...(m.GAs === undefined ? {} : { GAs: m.GAs * f }),
      });
      const other: AnalysisInput = {
        ...input,
        joints: input.joints.map((j) => ({ ...j, x: j.x * l, y: j.y * l, support: support(j) })),
        members: input.members.map((m) => ({
          ...stiff(m),
          steps: m.steps?.map((s) => ({ ...stiff(s), from: s.from * l })),
          depth: (m.depth as number) * l,
          weight: ((m.weight as number) * f) / l,
        })),
        cases: input.cases.map((c) => ({ ...c, loads: c.loads.map((load) => inUnits(load, f, l)) })),
      };
      const back = (v: Values): Values => ({
        forces: mapValues(v.forces, (k, x) => [k, x / f]),
        motions: mapValues(v.motions, (k, x) => [k, x / l]),
      });
      expectSame(input, other, back);
    }),
    { numRuns },
  );
});

function inUnits(l: Load, force: number, length: number): Load {
  switch (l.kind) {
    case 'point':
      return { ...l, at: l.at * length, value: l.value * force };
    case 'couple':
      return { ...l, at: l.at * length, value: l.value * force * length };
    case 'distributed': {
      const ends = l.from === undefined ? {} : { from: l.from * length, to: (l.to as number) * length };
      return { ...l, ...ends, w1: (l.w1 * force) / length, w2: (l.w2 * force) / length };
    }
    case 'joint':
      return { ...l, x: (l.x ?? 0) * force, y: (l.y ?? 0) * force };
    case 'misfit':
    case 'settlement':
      return { ...l, value: l.value * length };
    case 'temperature':
    case 'self-weight':
      return l;
  }
}

test('effects of loads add up: a case that holds two others is their sum', () => {
  fc.assert(
    fc.property(randomStructure, between(-3, 3), (input, factor) => {
      const [A, B] = input.cases;
      if (!A || !B) throw new Error('two cases');
      const both = { ...A, id: 'C', loads: [...A.loads, ...B.loads.map((l) => times(l, factor))] };
      if (B.loads.some((l) => l.kind === 'self-weight')) return;
      const combinations = [{ id: 'sum', purpose: 'service' as const, factors: { A: 1, B: factor } }];
      const solution = solveOrRefuse({ ...input, cases: [A, B, both], combinations });
      if (!solution) return;
      const sum = solution.combinations[0];
      const own = solution.cases.C;
      if (!sum || !own) throw new Error('the sum is missing');
      const open = openNames(solution);
      const a = valuesOf(solution, own, open).forces;
      const b = valuesOf(
        solution,
        { ...own, reactions: sum.reactions, members: sum.members as typeof own.members },
        open,
      ).forces;
      const size = Math.max(...['A', 'B', 'C'].map((id) => sizeOf(solution, id).force));
      expect(difference(a, b, size)).toBeLessThan(toleranceOf(solution));
    }),
    { numRuns },
  );
});

function times(l: Load, factor: number): Load {
  switch (l.kind) {
    case 'point':
    case 'couple':
    case 'misfit':
    case 'settlement':
      return { ...l, value: l.value * factor };
    case 'distributed':
      return { ...l, w1: l.w1 * factor, w2: l.w2 * factor };
    case 'joint':
      return { ...l, x: (l.x ?? 0) * factor, y: (l.y ?? 0) * factor, couple: (l.couple ?? 0) * factor };
    case 'temperature':
      return { ...l, rise: (l.rise ?? 0) * factor, difference: (l.difference ?? 0) * factor };
    case 'self-weight':
      return l;
  }
}
