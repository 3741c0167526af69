import { spawnSync } from 'node:child_process';
import { expect, test } from 'vitest';
import { z } from 'zod';
import { valueAt } from '@/lib/engine/diagrams/piecewise';
import { solve } from '@/lib/engine/solve';
import type { AnalysisInput } from '@/lib/model/analysis';

/**
 * Beams and frames solved in exact fractions by third-opinion.py, whose head says what it covers. The structures are
 * drawn by a fixed recipe of small whole numbers, so that the fractions stay short.
 */
const tolerance = 1e-9;
const missing = spawnSync('python3', ['--version']).status === 0 ? undefined : 'python3 is not installed';

const answers = z.object({
  answers: z.array(
    z.object({
      reactions: z.record(z.string(), z.string()),
      moments: z.record(z.string(), z.tuple([z.string(), z.string()])),
      joints: z.record(z.string(), z.tuple([z.string(), z.string()])),
    }),
  ),
});

const supports = {
  fixed: { x: 'held', y: 'held', turn: 'held' },
  pinned: { x: 'held', y: 'held', turn: 'free' },
  roller: { x: 'free', y: 'held', turn: 'free' },
} as const;
type Draw = (below: number) => number;

/** Whole numbers that look random and are the same everywhere: Park and Miller's generator. */
function drawing(seed: number): Draw {
  let state = seed;
  return (below) => {
    state = (state * 48_271) % 2_147_483_647;
    return state % below;
  };
}

function loadsOn(members: AnalysisInput['members'], lengths: Record<string, number>, draw: Draw) {
  return members.flatMap((m) => {
    const at = (lengths[m.id] as number) * ((1 + draw(3)) / 4);
    const w = -1 - draw(20);
    return [
      { kind: 'distributed' as const, member: m.id, direction: 'across' as const, w1: w, w2: w },
      { kind: 'point' as const, member: m.id, direction: 'across' as const, at, value: draw(41) - 20 },
    ];
  });
}

function wrap(
  joints: AnalysisInput['joints'],
  members: AnalysisInput['members'],
  loads: object[],
): AnalysisInput {
  const cases = [{ id: 'D', title: 'Loads', nature: 'other', loads }] as AnalysisInput['cases'];
  const basis = { kind: 'absolute' } as const;
  return { form: 'fairhand.analysis/1', units: 'SI', basis, joints, members, cases };
}

function beam(draw: Draw): AnalysisInput {
  const lengths = Array.from({ length: 2 + draw(4) }, () => 3 + draw(6));
  const kinds = [
    supports.fixed,
    supports.pinned,
    { x: 'free', y: { spring: 500 + draw(2_000) }, turn: 'free' },
  ] as const;
  let x = 0;
  const joints: AnalysisInput['joints'] = [{ id: '0', x, y: 0, support: kinds[draw(2)] }];
  for (const [i, L] of lengths.entries()) {
    x += L;
    joints.push({ id: `${i + 1}`, x, y: 0, support: draw(4) === 0 ? kinds[2] : supports.roller });
  }
  const members = lengths.map((_, i) => ({
    id: `m${i}`,
    start: `${i}`,
    end: `${i + 1}`,
    EI: 1_000 * (1 + draw(30)),
  }));
  const own = Object.fromEntries(lengths.map((L, i) => [`m${i}`, L]));
  const settle = { kind: 'settlement', joint: '0', component: 'y', value: -0.004 };
  return wrap(joints, members, [...loadsOn(members, own, draw), settle]);
}

/** Storeys of 4, bays of 3 and a brace of 5: every length is whole. */
function frame(draw: Draw, EA: boolean): AnalysisInput {
  const [bays, storeys] = [1 + draw(2), 1 + draw(2)];
  const foot = draw(2) === 0 ? supports.fixed : supports.pinned;
  const joints: AnalysisInput['joints'] = [];
  const members: AnalysisInput['members'] = [];
  const own: Record<string, number> = {};
  const add = (start: string, end: string, L: number, hinges: boolean) => {
    const releases = hinges ? { start: ['moment' as const], end: ['moment' as const] } : undefined;
    const stretch = EA || hinges ? { EA: 10_000 * (1 + draw(9)) } : {};
    members.push({ id: `${start}-${end}`, start, end, EI: 1_000 * (1 + draw(30)), ...stretch, releases });
    own[`${start}-${end}`] = L;
  };
  for (let s = 0; s <= storeys; s++) {
    for (let b = 0; b <= bays; b++) {
      joints.push({ id: `${s}${b}`, x: 3 * b, y: 4 * s, support: s === 0 ? foot : undefined });
      if (s > 0) add(`${s - 1}${b}`, `${s}${b}`, 4, false);
      if (s > 0 && b > 0) add(`${s}${b - 1}`, `${s}${b}`, 3, false);
    }
  }
  if (draw(2) === 0) add('00', '11', 5, true);
  const push = { kind: 'joint', joint: `${storeys}0`, x: 5 + draw(20) };
  return wrap(joints, members, [...loadsOn(members, own, draw), push]);
}

const decimal = (fraction: string) => {
  const [p, q] = fraction.split('/').map(BigInt);
  if (p === undefined) throw new Error('no number');
  const scale = 10n ** 30n;
  return Number((p * scale) / (q ?? 1n)) / 1e30;
};

test.skipIf(missing !== undefined)(
  `exact fractions agree on 60 beams and frames with springs, settlements, hinges and braces${missing ? ` (skipped: ${missing})` : ''}`,
  () => {
    const draw = drawing(20_261);
    const analyses = Array.from({ length: 60 }, (_, i) =>
      i % 3 === 0 ? beam(draw) : frame(draw, i % 3 === 1),
    );
    const run = spawnSync('python3', [`${import.meta.dirname}/third-opinion.py`], {
      input: JSON.stringify({ analyses }),
      encoding: 'utf8',
      maxBuffer: 64e6,
    });
    expect(run.stderr).toBe('');
    const exact = answers.parse(JSON.parse(run.stdout)).answers;
    expect(exact.length).toBe(analyses.length);
    analyses.forEach((analysis, i) => {
      const result = solve(analysis);
      if (!result.ok) throw new Error(`structure ${i}: ${result.refusal.message}`);
      const own = result.value.cases.D;
      const one = exact[i];
      if (!own || !one) throw new Error('a structure without an answer');
      const pairs = [
        ...own.reactions.map((r) => {
          if (r.quantity.kind !== 'reaction') throw new Error('not a reaction');
          return [
            r.value,
            decimal(one.reactions[`${r.quantity.joint}:${r.quantity.component}`] as string),
          ] as const;
        }),
        ...Object.entries(one.moments).flatMap(([id, [M0, M1]]) => {
          const M = own.members[id]?.M ?? [];
          const L = M.at(-1)?.to as number;
          return [[valueAt(M, 0), decimal(M0)] as const, [valueAt(M, L, 'left'), decimal(M1)] as const];
        }),
      ];
      const size = Math.max(...pairs.map(([, b]) => Math.abs(b)));
      for (const [a, b] of pairs) expect(Math.abs(a - b) / size, `structure ${i}`).toBeLessThan(tolerance);
      const moved = Object.entries(one.joints).flatMap(([id, [x, y]]) => [
        [own.joints[id]?.x as number, decimal(x)] as const,
        [own.joints[id]?.y as number, decimal(y)] as const,
      ]);
      const far = Math.max(...moved.map(([, b]) => Math.abs(b)));
      for (const [a, b] of moved) expect(Math.abs(a - b) / far, `structure ${i}`).toBeLessThan(tolerance);
    });
  },
);
