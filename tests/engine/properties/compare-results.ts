import { valueAt } from '@/lib/engine/diagrams/piecewise';
import type { CaseResult, Solution } from '@/lib/engine/solution';
import { solve } from '@/lib/engine/solve';
import type { AnalysisInput } from '@/lib/model/analysis';

/** Agreement of results that are equal but for rounding, relative to the largest force (or moment over length). */
const ordinary = 1e-9;

/**
 * Where a part of the primary structure is held by a pivot of less than `slender`, it is nearly unstable, and what depends
 * on it keeps fewer figures.
 */
const slender = 1e-2;
const nearlyUnstable = 1e-6;

export function toleranceOf({ determinacy }: Solution): number {
  return determinacy.smallestPivot < slender ? nearlyUnstable : ordinary;
}

/** Refusals that a random structure may rightly meet. */
const rightly = /^(unstable|needs-EA|joints-coincide|couple-on-hinge)/;

export function solveOrRefuse(input: AnalysisInput): Solution | undefined {
  const result = solve(input);
  if (result.ok) return result.value;
  if (!rightly.test(result.refusal.code)) {
    throw new Error(`refused: ${result.refusal.code}: ${result.refusal.message}`);
  }
  return undefined;
}

/** Values by name; moments are divided by a length that is typical of the structure, so that one size fits all. */
export interface Values {
  forces: Map<string, number>;
  motions: Map<string, number>;
}

export function valuesOf(
  solution: Solution,
  result: CaseResult,
  open: ReadonlySet<string> = new Set(),
): Values {
  const length = typicalLength(solution);
  const forces = new Map<string, number>();
  for (const { quantity: q, value } of result.reactions) {
    if (q.kind !== 'reaction' || open.has(`${q.joint}:${q.component}`)) continue;
    forces.set(`${q.joint}:${q.component}`, q.component === 'turn' ? value / length : value);
  }
  for (const [id, d] of Object.entries(result.members)) {
    const L = d.M.at(-1)?.to as number;
    if (!open.has(id)) forces.set(`${id}:N`, valueAt(d.N, 0));
    forces.set(`${id}:M0`, valueAt(d.M, 0) / length);
    forces.set(`${id}:M1`, valueAt(d.M, L, 'left') / length);
  }
  const motions = new Map<string, number>();
  for (const [id, j] of Object.entries(result.joints)) {
    motions.set(`${id}:x`, j.x).set(`${id}:y`, j.y);
    if (j.rotation !== undefined) motions.set(`${id}:rotation`, j.rotation * length);
  }
  return { forces, motions };
}

export function typicalLength({ analysis }: Solution): number {
  const at = new Map(analysis.joints.map((j) => [j.id, j]));
  const lengths = analysis.members.map((m) => {
    const [a, b] = [at.get(m.start), at.get(m.end)];
    return a && b ? Math.hypot(b.x - a.x, b.y - a.y) : Number.NaN;
  });
  return lengths.reduce((x, y) => x + y, 0) / lengths.length;
}

/** What rounding is held against besides the values themselves: the loads, and what they would move at most. */
export function sizeOf(solution: Solution, caseId: string): { force: number; motion: number } {
  const { analysis } = solution;
  const length = typicalLength(solution);
  const loads = analysis.cases.find((c) => c.id === caseId)?.loads ?? [];
  const stiffest = Math.max(...analysis.members.map((m) => m.EI));
  /** Force that a strain of one would call for. */
  const strained = stiffest / length ** 2;
  const own = loads.map((l): number => {
    switch (l.kind) {
      case 'distributed':
        return Math.max(Math.abs(l.w1), Math.abs(l.w2)) * length;
      case 'point':
        return Math.abs(l.value);
      case 'couple':
        return Math.abs(l.value) / length;
      case 'joint':
        return Math.max(Math.abs(l.x), Math.abs(l.y), Math.abs(l.couple) / length);
      case 'temperature':
        return 1e-4 * (Math.abs(l.rise) + Math.abs(l.difference)) * strained;
      case 'misfit':
      case 'settlement':
        return (Math.abs(l.value) / length) * strained;
      default:
        // Own weight, 2 per length of every member.
        return 2 * length;
    }
  });
  const forces = valuesOf(solution, solution.cases[caseId] as CaseResult).forces.values();
  const force = Math.max(0, ...own, ...[...forces].map(Math.abs));
  return { force, motion: (force * length ** 3) / stiffest };
}

/** Greatest difference over the greatest value, or `size`; values that only one side has are not compared. */
export function difference(
  a: ReadonlyMap<string, number>,
  b: ReadonlyMap<string, number>,
  size: number,
): number {
  const greatest = Math.max(size, ...[...a.values(), ...b.values()].map(Math.abs));
  const apart = [...a].map(([key, v]) => {
    const other = b.get(key);
    return other === undefined ? 0 : Math.abs(v - other);
  });
  const worst = Math.max(0, ...apart);
  return greatest === 0 ? worst : worst / greatest;
}
