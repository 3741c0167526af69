import { readdirSync, readFileSync } from 'node:fs';
import { evaluate as evaluateExact } from 'mathjs';
import { describe, expect, test } from 'vitest';
import { combine } from '@/lib/engine/combinations/combine';
import { deflectionLimit, deflectionTables } from '@/lib/engine/combinations/deflection-limits';
import { findSet } from '@/lib/engine/combinations/published-sets';
import { extremes, integralOfProduct, valueAt } from '@/lib/engine/diagrams/piecewise';
import type { PiecewisePolynomial } from '@/lib/engine/diagrams/piecewise-polynomial';
import { influenceLines } from '@/lib/engine/influence/influence-line';
import type { CaseResult, Solution } from '@/lib/engine/solution';
import { solve } from '@/lib/engine/solve';
import type { Dislocation } from '@/lib/engine/stiffness/dislocate';
import { analysis } from '@/lib/model/analysis';
import { type LoadCase, loadCase } from '@/lib/model/load';
import type { Quantity } from '@/lib/model/quantity';
import { type Ask, group, type ReferenceValue } from './reference-value';

/** Relative to the published value. */
const tolerance = 1e-9;

const files = readdirSync(import.meta.dirname).filter((name) => name.endsWith('.json'));

for (const file of files) {
  const { title, structures, values } = group.parse(
    JSON.parse(readFileSync(`${import.meta.dirname}/${file}`, 'utf8')),
  );
  describe(title, () => {
    test.each(values.map((v) => [`${v.id} ${v.description} [${v.evidence}: ${v.source}]`, v] as const))(
      '%s',
      (_, v) => {
        expectClose(Number(evaluateExact(v.exact)), v.value);
        const structure = v.structure === undefined ? undefined : structures?.[v.structure];
        for (const found of answer(v, structure)) expectClose(found, v.value);
      },
    );
  });
}

function expectClose(found: number, value: number): void {
  expect(Math.abs(found - value), `${found} should be ${value}`).toBeLessThanOrEqual(
    tolerance * Math.max(Math.abs(value), Number.MIN_VALUE),
  );
}

/** What the engine says, by every way it has of saying it. */
function answer({ ask }: ReferenceValue, structure: unknown): number[] {
  switch (ask.of) {
    case 'product-integral':
      return [integralOfProduct(ask.f, ask.g)];
    case 'area':
      return [integralOfProduct(ask.f, one)];
    case 'centroid':
      return [integralOfProduct(ask.f, ramp) / integralOfProduct(ask.f, one)];
    case 'combination':
      return [combined(ask)];
    case 'limit': {
      const table = deflectionTables.find((t) => t.key === ask.table);
      const limit = table && deflectionLimit(table, ask.row, ask.action, ask.length, ask.cantilever);
      return [limit?.value ?? Number.NaN];
    }
    case 'rank':
      return [rankOf(ask, structure)];
    case 'influence':
    case 'influence-extreme':
      return influence(ask, structure);
    case 'degree':
      return [solved(structure).determinacy.degree];
    default:
      return fromSolution(ask, structure).map((v) => (ask.magnitude ? Math.abs(v) : ask.sign * v));
  }
}

const one: PiecewisePolynomial = [{ from: 0, to: 1, c: [1] }];
const ramp: PiecewisePolynomial = [{ from: 0, to: 1, c: [0, 1] }];

function solved(structure: unknown): Solution {
  const result = solve(structure);
  if (!result.ok) throw new Error(`${result.refusal.code}: ${result.refusal.message}`);
  return result.value;
}

function caseOf(solution: Solution): CaseResult {
  return solution.cases.D as CaseResult;
}

type StructuralAsk = Extract<Ask, { sign: number }>;

function fromSolution(ask: StructuralAsk, structure: unknown): number[] {
  const input = analysis.parse(structure);
  switch (ask.of) {
    case 'M':
    case 'N': {
      const f = caseOf(solved(input)).members[ask.member]?.[ask.of] ?? [];
      return [valueAt(f, ask.at, 'left'), valueAt(f, ask.at, 'right')];
    }
    case 'reaction':
      return [reactionOf(caseOf(solved(input)), ask.joint, ask.component)];
    case 'rotation':
      return [caseOf(solved(input)).joints[ask.joint]?.rotation ?? Number.NaN];
    case 'displacement':
      return [caseOf(solved(input)).joints[ask.joint]?.[ask.component] ?? Number.NaN];
    case 'deflection': {
      const { member, at, direction } = ask;
      const solution = solved({ ...input, displacements: [{ member, at, direction }] });
      const own = caseOf(solution).members[member];
      const curve = direction === 'across' ? own?.across : own?.rotation;
      const line = solution.displacements[0]?.cases.D;
      return [valueAt(curve ?? [], at), line?.value ?? Number.NaN];
    }
    case 'extreme':
      return [extremes(caseOf(solved(input)).members[ask.member]?.[ask.diagram] ?? [])[ask.bound].value];
    default:
      throw new Error(`nothing answers ${ask.of}`);
  }
}

function reactionOf(result: CaseResult, joint: string, component: string): number {
  const found = result.reactions.find(
    ({ quantity: q }) => q.kind === 'reaction' && q.joint === joint && q.component === component,
  );
  return found?.value ?? Number.NaN;
}

/** The line's own ordinate, and the force that the solved structure has under a unit load there. */
function influence(ask: Extract<Ask, { released: Quantity }>, structure: unknown): number[] {
  const input = analysis.parse(structure);
  const [line] = influenceLines(input, [sectionOf(ask.released, input)]) ?? [];
  const curve = line?.members[ask.member]?.across ?? [];
  if (ask.of === 'influence-extreme') {
    const turned = curve.map((p) => ({ ...p, c: p.c.map((k) => -k) }));
    return [ask.sign * extremes(turned)[ask.bound].value];
  }
  const load = { kind: 'point', member: ask.member, at: ask.at, direction: 'y', value: -1 };
  const [first] = input.cases;
  const result = caseOf(solved({ ...input, cases: [{ ...first, loads: [load] }] }));
  const section = sectionOf(ask.released, input);
  const force =
    section.kind === 'reaction'
      ? reactionOf(result, section.joint, section.component)
      : valueAt(result.members[section.member]?.[section.kind] ?? [], section.at, 'left');
  return [-valueAt(curve, ask.at), force].map((v) => ask.sign * v);
}

function sectionOf(q: Quantity, { joints, members }: ReturnType<typeof analysis.parse>): Dislocation {
  if (q.kind === 'reaction') return q;
  const m = members.find((x) => x.id === q.member);
  const [a, b] = [m?.start, m?.end].map((id) => joints.find((j) => j.id === id));
  if (!a || !b) throw new Error('no such member');
  const L = Math.hypot(b.x - a.x, b.y - a.y);
  return {
    kind: q.kind === 'axial' ? 'N' : 'M',
    member: q.member,
    at: q.kind === 'moment' && q.end === 'end' ? L : 0,
  };
}

/** Three reactions of a rigid body less its one free motion, which must be the one published. */
function rankOf(ask: Extract<Ask, { of: 'rank' }>, structure: unknown): number {
  const result = solve(structure);
  if (result.ok) throw new Error('solved although it is unstable');
  expect(result.refusal.code).toMatch(/^unstable/);
  const pieces = result.refusal.mechanism?.pieces ?? [];
  expect(pieces.length).toBe(1);
  const [piece] = pieces;
  if (ask.motion === 'slide') expect(piece?.slide).toBeDefined();
  else {
    expect(piece?.centre?.x).toBeCloseTo(ask.centre?.x ?? Number.NaN, 9);
    expect(piece?.centre?.y).toBeCloseTo(ask.centre?.y ?? Number.NaN, 9);
  }
  return 3 - pieces.length;
}

/** The effect of the named sum, which the set must ask for. */
function combined(ask: Extract<Ask, { of: 'combination' }>): number {
  const set = findSet(ask.set);
  if (!set) throw new Error(`no set ${ask.set}`);
  const cases = ask.cases.map((c): LoadCase => loadCase.parse({ title: c.id, loads: [], ...c }));
  const found = combine(cases, set).find((c) => c.id === ask.sum);
  if (!found) throw new Error(`${ask.set} does not ask for ${ask.sum}`);
  return Object.entries(found.factors).reduce((t, [id, f]) => t + f * (ask.effects[id] as number), 0);
}

test('no published value is missing', () => {
  const count = files.reduce((n, file) => {
    const text = readFileSync(`${import.meta.dirname}/${file}`, 'utf8');
    return n + new Set(group.parse(JSON.parse(text)).values.map((v) => v.id)).size;
  }, 0);
  expect(count).toBe(231);
});
