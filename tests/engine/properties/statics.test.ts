import fc from 'fast-check';
import { expect, test } from 'vitest';
import { valueAt } from '@/lib/engine/diagrams/piecewise';
import { influenceLines } from '@/lib/engine/influence/influence-line';
import { analysis } from '@/lib/model/analysis';
import type { Quantity } from '@/lib/model/quantity';
import { difference, sizeOf, solveOrRefuse, toleranceOf, valuesOf } from './compare-results';
import { between, type Load, randomBeam, randomGrid, randomStructure } from './random-structure';

/** Force x, force y and moment about the origin of everything outside the structure, reckoned load by load. */
test('reactions and loads of the whole structure balance', () => {
  fc.assert(
    fc.property(randomStructure, (input) => {
      const solution = solveOrRefuse(input);
      if (!solution) return;
      const at = new Map(solution.analysis.joints.map((j) => [j.id, j]));
      for (const c of solution.analysis.cases) {
        const sum = { x: 0, y: 0, turn: 0 };
        const put = (px: number, py: number, fx: number, fy: number, couple = 0) => {
          sum.x += fx;
          sum.y += fy;
          sum.turn += px * fy - py * fx + couple;
        };
        for (const { quantity: q, value } of solution.cases[c.id]?.reactions ?? []) {
          const joint = q.kind === 'reaction' ? at.get(q.joint) : undefined;
          if (q.kind !== 'reaction' || !joint) throw new Error('not a reaction');
          const turn = ((joint.support?.angle ?? 0) * Math.PI) / 180;
          if (q.component === 'turn') put(joint.x, joint.y, 0, 0, value);
          else if (q.component === 'x') put(joint.x, joint.y, value * Math.cos(turn), value * Math.sin(turn));
          else put(joint.x, joint.y, -value * Math.sin(turn), value * Math.cos(turn));
        }
        for (const m of solution.analysis.members) {
          const [a, b] = [at.get(m.start), at.get(m.end)];
          if (!a || !b) throw new Error('a member without joints');
          const L = Math.hypot(b.x - a.x, b.y - a.y);
          const [ux, uy] = [(b.x - a.x) / L, (b.y - a.y) / L];
          const ways = { x: [1, 0], y: [0, 1], along: [ux, uy], across: [-uy, ux] } as const;
          const push = (s: number, way: keyof typeof ways, p: number) =>
            put(a.x + s * ux, a.y + s * uy, p * ways[way][0], p * ways[way][1]);
          for (const l of c.loads) {
            if (l.kind === 'self-weight') push(L / 2, 'y', -(m.weight as number) * L);
            if (!('member' in l) || l.member !== m.id) continue;
            if (l.kind === 'point') push(l.at, l.direction, l.value);
            if (l.kind === 'couple') put(0, 0, 0, 0, l.value);
            if (l.kind !== 'distributed') continue;
            const [from, to] = [l.from ?? 0, l.to ?? L];
            const plan =
              l.per === 'length'
                ? 1
                : l.direction === 'y'
                  ? Math.abs(ux)
                  : l.direction === 'x'
                    ? Math.abs(uy)
                    : 1;
            const d = (to - from) * plan;
            push(from + (to - from) / 3, l.direction, (l.w1 * d) / 2);
            push(to - (to - from) / 3, l.direction, (l.w2 * d) / 2);
          }
        }
        for (const l of c.loads) {
          const joint = l.kind === 'joint' ? at.get(l.joint) : undefined;
          if (l.kind === 'joint' && joint) put(joint.x, joint.y, l.x, l.y, l.couple);
        }
        const reach = Math.max(...solution.analysis.joints.flatMap((j) => [Math.abs(j.x), Math.abs(j.y)]));
        const { force } = sizeOf(solution, c.id);
        const size = force * solution.analysis.members.length;
        expect(Math.hypot(sum.x, sum.y)).toBeLessThanOrEqual(1e-10 * size);
        expect(Math.abs(sum.turn)).toBeLessThanOrEqual(1e-10 * size * reach);
      }
    }),
    { numRuns: 200 },
  );
});

/** Betti, Maxwell: the displacement at 1 under a unit force at 2 is that at 2 under a unit force at 1. */
test('what a force here moves there, the same force there moves here', () => {
  fc.assert(
    fc.property(
      randomStructure,
      fc.nat(99),
      fc.nat(99),
      between(0, 1),
      between(0, 1),
      (input, i, k, s, t) => {
        const place = (pick: number, part: number) => {
          const m = input.members[pick % input.members.length];
          const [a, b] = [m?.start, m?.end].map((id) => input.joints.find((j) => j.id === id));
          if (!m || !a || !b) throw new Error('a member without joints');
          return { member: m.id, at: part * 0.999 * Math.hypot(b.x - a.x, b.y - a.y) };
        };
        const [one, two] = [place(i, s), place(k, t)];
        const under = (p: typeof one): Load[] => [{ kind: 'point', ...p, direction: 'across', value: 1 }];
        const [A, B] = input.cases;
        if (!A || !B) throw new Error('two cases');
        const solution = solveOrRefuse({
          ...input,
          cases: [
            { ...A, loads: under(one) },
            { ...B, loads: under(two) },
          ],
          displacements: [two, one].map((p) => ({ ...p, direction: 'across' as const })),
        });
        if (!solution) return;
        const moved = (id: string, p: typeof one) =>
          valueAt(solution.cases[id]?.members[p.member]?.across ?? [], p.at);
        const asked = (n: number, id: string) => solution.displacements[n]?.cases[id]?.value as number;
        const { motion } = sizeOf(solution, 'A');
        const size = Math.max(motion, Math.abs(moved('A', one)), Math.abs(moved('B', two)));
        for (const [a, b] of [
          [moved('A', two), moved('B', one)],
          [asked(0, 'A'), asked(1, 'B')],
          [asked(0, 'A'), moved('A', two)],
        ] as const) {
          expect(Math.abs(a - b) / size).toBeLessThan(toleranceOf(solution));
        }
      },
    ),
    { numRuns: 150 },
  );
});

test('every good set of redundants gives one answer', () => {
  let tried = 0;
  fc.assert(
    fc.property(fc.oneof(randomBeam, randomGrid), fc.infiniteStream(fc.nat(1e6)), (input, draws) => {
      const proposed = solveOrRefuse(input);
      if (!proposed || proposed.redundants.length === 0 || proposed.determinacy.openAxial.length > 0) return;
      const all: Quantity[] = [
        ...(proposed.cases.A?.reactions ?? []).map((r) => r.quantity),
        ...proposed.analysis.members.flatMap((m): Quantity[] => [
          { kind: 'axial', member: m.id },
          { kind: 'moment', member: m.id, end: 'start' },
          { kind: 'moment', member: m.id, end: 'end' },
        ]),
      ];
      const mixed = all
        .map((q) => ({ q, key: draws.next().value }))
        .sort((a, b) => a.key - b.key)
        .map((x) => x.q);
      for (let k = 0; k < 4; k++) {
        const redundants = mixed.slice(k, k + proposed.redundants.length);
        const other = solveOrRefuseSet({ ...input, redundants });
        if (!other || other.condition > 1e8) continue;
        tried++;
        for (const id of ['A', 'B']) {
          const [a, b] = [proposed, other].map((s) => valuesOf(s, s.cases[id] as (typeof s.cases)[string]));
          if (!a || !b) throw new Error('a case is missing');
          const { force, motion } = sizeOf(proposed, id);
          const tolerance = Math.max(toleranceOf(proposed), 1e-12 * other.condition);
          expect(difference(a.forces, b.forces, force)).toBeLessThan(tolerance);
          expect(difference(a.motions, b.motions, motion)).toBeLessThan(tolerance);
        }
      }
    }),
    { numRuns: 150 },
  );
  expect(tried).toBeGreaterThan(25);
});

function solveOrRefuseSet(input: Parameters<typeof solveOrRefuse>[0]) {
  try {
    return solveOrRefuse(input);
  } catch (error) {
    // A set drawn at random is mostly no good one; the refusal must say so.
    if (error instanceof Error && /^refused: (?!check-failed|form)/.test(error.message)) return undefined;
    throw error;
  }
}

/** Müller-Breslau against the force method: the ordinate is the force under a unit load there. */
test('influence lines hold the force that a unit load brings, wherever it stands', () => {
  fc.assert(
    fc.property(randomBeam, fc.nat(99), fc.nat(99), between(0, 1), between(0, 1), (input, i, k, s, t) => {
      const lengthOf = (pick: number) => {
        const m = input.members[pick % input.members.length];
        const [a, b] = [m?.start, m?.end].map((id) => input.joints.find((j) => j.id === id));
        if (!m || !a || !b) throw new Error('a member without joints');
        return { member: m.id, L: Math.hypot(b.x - a.x, b.y - a.y) };
      };
      const [section, place] = [lengthOf(i), lengthOf(k)];
      const at = s * section.L;
      const stand = t * 0.999 * place.L;
      if (section.member === place.member && Math.abs(at - stand) < 1e-6 * place.L) return;
      const [A] = input.cases;
      if (!A) throw new Error('a case');
      const load: Load = { kind: 'point', member: place.member, at: stand, direction: 'across', value: 1 };
      const solution = solveOrRefuse({ ...input, cases: [{ ...A, loads: [load] }] });
      if (!solution) return;
      const kinds = ['M', 'V'] as const;
      const lines = influenceLines(
        analysis.parse(input),
        kinds.map((kind) => ({ kind, member: section.member, at })),
      );
      kinds.forEach((kind, n) => {
        const ordinate = valueAt(lines?.[n]?.members[place.member]?.across ?? [], stand);
        const force = valueAt(solution.cases.A?.members[section.member]?.[kind] ?? [], at);
        const size = kind === 'M' ? section.L + place.L : 1;
        expect(Math.abs(ordinate - force) / size).toBeLessThan(toleranceOf(solution));
      });
    }),
    { numRuns: 150 },
  );
});
