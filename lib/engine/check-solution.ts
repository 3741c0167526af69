import { between, integralOfProduct } from './diagrams/piecewise';
import { flexibilityRows } from './force-method/flexibility';
import type { SolvedCase, SolvedForces } from './force-method/solve-redundants';
import { axialShearRows } from './force-method/work-row';
import type { CaseResult, Check } from './solution';
import type { Equilibrium } from './statics/equilibrium';
import { type StiffnessCase, solveStiffness } from './stiffness/solve-stiffness';
import { tolerance } from './tolerance';

const check = (kind: Check['kind'], subject: string, residual: number, caseId?: string): Check => ({
  kind,
  subject,
  case: caseId,
  residual,
  tolerance: tolerance.check,
  holds: residual <= tolerance.check,
});

/** Equilibrium of every joint, reciprocity, closed gaps and agreement with the stiffness way, each relative to the largest value of its kind. */
export function checkSolution(
  eq: Equilibrium,
  solved: SolvedForces,
  cases: Readonly<Record<string, CaseResult>>,
  EI0: number,
): Check[] {
  const checks: Check[] = [];
  for (const [id, c] of solved.cases)
    checks.push(
      check('equilibrium', 'every joint is in equilibrium', jointResidual(eq, c.final, c.load.rows), id),
    );
  if (solved.units.length > 1)
    checks.push(check('reciprocity', 'f_ij equals f_ji', reciprocity(eq, solved, EI0)));
  for (const [id] of solved.cases)
    if (solved.units.length > 0)
      checks.push(
        check('gap', 'every gap is closed', gapResidual(eq, solved, id, cases[id] as CaseResult, EI0), id),
      );
  const second = solveStiffness(eq.analysis);
  for (const [id, c] of solved.cases) {
    const other = second?.get(id);
    const residual = other ? agreement(eq, c, cases[id] as CaseResult, other) : Number.POSITIVE_INFINITY;
    checks.push(check('second-way', 'direct stiffness gives the same forces', residual, id));
  }
  return checks;
}

function jointResidual(eq: Equilibrium, final: Float64Array, rows: Float64Array): number {
  const left = Float64Array.from(rows);
  const size = Float64Array.from(rows.map(Math.abs));
  eq.columns.forEach((column, q) => {
    column.rows.forEach((r, i) => {
      const v = (column.values[i] as number) * (final[q] as number);
      left[r] = (left[r] as number) + v;
      size[r] = Math.max(size[r] as number, Math.abs(v));
    });
  });
  const largest = Math.max(...size);
  return largest === 0 ? 0 : Math.max(...left.map(Math.abs)) / largest;
}

/** The same coefficient with areas of the one diagram and ordinates of the other exchanged. */
function reciprocity(eq: Equilibrium, solved: SolvedForces, EI0: number): number {
  const diagonal = new Map(solved.entries.filter((f) => f.i === f.j).map((f) => [f.i, f.total]));
  let worst = 0;
  for (const { i, j, total } of solved.entries) {
    const [a, b] = [solved.units[j], solved.units[i]];
    if (i === j || !a || !b) continue;
    const turned = flexibilityRows(eq, a, b, solved.held, EI0).reduce((t, r) => t + r.value, 0);
    const size = Math.sqrt((diagonal.get(i) as number) * (diagonal.get(j) as number));
    if (size > 0) worst = Math.max(worst, Math.abs(turned - total) / size);
  }
  return worst;
}

/** The gap at every redundant, integrated anew from the final diagrams. */
function gapResidual(
  eq: Equilibrium,
  solved: SolvedForces,
  id: string,
  result: CaseResult,
  EI0: number,
): number {
  const c = solved.cases.get(id);
  if (!c) return Number.POSITIVE_INFINITY;
  let worst = 0;
  const force = sizeOf(eq, c);
  const diagonal = new Map(solved.entries.filter((f) => f.i === f.j).map((f) => [f.i, f.total]));
  /** The gap that the largest force of the case would open here: what a rounding of forces is to be held against. */
  const opened = (i: number, { members }: SolvedForces['units'][number]) => {
    const ends = [...members.values()].flatMap((u) => [u.N, u.m0 / eq.length, u.m1 / eq.length]);
    const own = Math.max(0, ...ends.map(Math.abs));
    return own === 0 ? 0 : ((diagonal.get(i) as number) * force) / own;
  };
  solved.units.forEach((unit, i) => {
    const terms: number[] = [];
    for (const [b, u] of unit.members) {
      const bar = eq.bars[b];
      const local = c.load.local[b];
      const d = bar && result.members[bar.member.id];
      if (!bar || !d || !local) continue;
      const { L } = bar.axis;
      const own = bar.stretches;
      const line = [{ from: 0, to: L, c: [u.m0, (u.m1 - u.m0) / L] }];
      for (const t of own) {
        const work = integralOfProduct(between(d.M, t.from, t.to), between(line, t.from, t.to));
        terms.push((EI0 * work) / t.EI);
      }
      terms.push(...axialShearRows(bar, u, d, EI0).map((r) => r.value));
      terms.push(
        EI0 * (u.N * (local.strain * L + local.misfit) + (((u.m0 + u.m1) * L) / 2) * local.curvature),
      );
    }
    for (const s of solved.held) {
      const R = unit.reactions.get(s.column);
      if (R !== undefined)
        terms.push((EI0 * R * (c.final[s.column] as number) * (eq.scale[s.column] as number)) / s.stiffness);
    }
    for (const m of c.movements) {
      const R = unit.reactions.get(m.column);
      if (R !== undefined) terms.push(-EI0 * R * m.value);
    }
    const size = Math.max(...terms.map(Math.abs), Math.abs(c.gaps[i]?.total as number), opened(i, unit));
    if (size > 0) worst = Math.max(worst, Math.abs(terms.reduce((a, b) => a + b, 0)) / size);
  });
  return worst;
}

/**
 * The largest force of a case, its loads among them, and what its strains and movements would call for in a member held
 * fast: what rounding is to be held against where all forces are none.
 */
function sizeOf(eq: Equilibrium, c: SolvedCase): number {
  const strained = eq.bars.map(({ member, axis: { L } }, b) => {
    const local = c.load.local[b];
    if (!local) return 0;
    const part = Math.abs(local.strain) + Math.abs(local.curvature) * L + Math.abs(local.misfit) / L;
    return (part * member.EI) / L ** 2;
  });
  const stiffest = eq.bars.reduce((most, { member }) => Math.max(most, member.EI), 0);
  const moved = c.movements.map((m) => {
    const part = m.component === 'turn' ? m.value : m.value / eq.length;
    return (part * stiffest) / eq.length ** 2;
  });
  return largest(c.final, c.load.rows, strained, moved);
}

function largest(...lists: Iterable<number>[]): number {
  let most = 0;
  for (const list of lists) for (const v of list) most = Math.max(most, Math.abs(v));
  return most;
}

/** Moments below this part of force times length are those of a structure that hardly bends. */
const unbent = 1e-6;

function agreement(eq: Equilibrium, c: SolvedCase, one: CaseResult, other: StiffnessCase): number {
  let off = 0;
  const pairs: { a: number; b: number; moment: boolean }[] = [];
  for (const r of one.reactions) {
    if (r.quantity.kind !== 'reaction') continue;
    const name = `${r.quantity.joint}:${r.quantity.component}`;
    if (other.open.has(name)) continue;
    pairs.push({
      a: r.value,
      b: other.reactions.get(name) as number,
      moment: r.quantity.component === 'turn',
    });
  }
  eq.bars.forEach((bar, b) => {
    const d = one.members[bar.member.id];
    const m = other.members[b];
    if (!d || !m) return;
    const start = (f: typeof d.M) => f[0]?.c[0] as number;
    if (!other.open.has(bar.member.id)) pairs.push({ a: start(d.N), b: m.N, moment: false });
    pairs.push({ a: start(d.M), b: m.M0, moment: true });
    const last = d.M.at(-1);
    const end = last?.c.reduce((t, c, k) => t + c * (last.to - last.from) ** k, 0) as number;
    pairs.push({ a: end, b: m.M1, moment: true });
  });
  // Couples that cancel leave no force but moments in the member between them.
  const size = largest(
    [sizeOf(eq, c)],
    pairs.map((p) => (p.moment ? p.a / eq.length : p.a)),
  );
  if (size === 0) return largest(pairs.map((p) => p.b));
  // Beside a very short member forces are huge and moments are not: moments are held against moments.
  const bent = largest(pairs.map((p) => (p.moment ? p.a : 0)));
  const moment = Math.max(bent, unbent * size * eq.length);
  for (const p of pairs) off = Math.max(off, Math.abs(p.a - p.b) / (p.moment ? moment : size));
  return off;
}
