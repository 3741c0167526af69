import { type Action, actingForces } from './acting-forces';
import { coefficient, negligible } from './equilibrium-sums';
import type { Equation, StaticsPlan } from './plan-statics';
import type { BodyForce } from './rigid-body';
import { solveTogether } from './simultaneous';
import type { StaticsLine, StaticsTerm } from './statics-line';

/** A sum of terms below this part of the largest of them is rounding. */
const rounding = 1e-13;

/** Beyond so many unknowns, those that are zero because nothing acts near them are not written. */
const mostZeros = 16;

/**
 * The lines of one state of a primary structure in the order of its plan, then an equation of the whole that was not
 * needed, as the check. Empty when a load stands on a bar that is cut, or has no resultant.
 */
export function writeStatics(plan: StaticsPlan, action: Action): StaticsLine[] {
  const acting = actingForces(plan.bodies, action);
  if (!acting) return [];
  const outside = [...acting.values()].flatMap((list) => list.filter((f) => f.outer));
  const known = new Map<string, number>();
  const sides = (e: Equation) => acting.get(e.body) ?? outside;
  const quiet = plan.steps.length > mostZeros;
  const lines: StaticsLine[] = [];
  for (const step of plan.steps) {
    if (step.kind === 'equation') {
      const line = writeEquation(plan, step.equation, step.unknown, sides(step.equation), known);
      known.set(step.unknown, line.value);
      if (!quiet || line.value !== 0 || line.terms.length > 1) lines.push(line);
      continue;
    }
    const sought = new Set(step.unknowns);
    const written = step.equations.map((e) => termsOf(plan, e, sides(e), known, sought));
    const rights = written.map((terms) => total(terms.filter((t) => !sought.has(t.key))));
    const values = solveTogether(step.equations, step.unknowns, rights);
    step.unknowns.forEach((k, i) => {
      known.set(k, values[i] as number);
    });
    if (quiet && values.every((v) => v === 0)) continue;
    lines.push({
      kind: 'simultaneous',
      equations: step.equations.map((e) => ({
        piece: e.body.members,
        sum: e.sum,
        terms: strip(termsOf(plan, e, sides(e), known, sought)),
      })),
      unknowns: step.unknowns.map((k) => ({ of: ofKey(plan, k), value: known.get(k) as number })),
    });
  }
  return [...lines, ...check(plan, outside, known)];
}

type Term = StaticsTerm & { key: string };

function writeEquation(
  plan: StaticsPlan,
  e: Equation,
  unknown: string,
  acting: readonly BodyForce[],
  known: ReadonlyMap<string, number>,
): Extract<StaticsLine, { kind: 'equation' }> {
  const terms = termsOf(plan, e, acting, known, new Set([unknown]));
  const rest = total(terms.filter((t) => t.key !== unknown));
  const value = rest === 0 ? 0 : -rest / (e.coefficients.get(unknown) as number);
  const written = terms.map((t) => (t.key === unknown ? { ...t, value } : t));
  return {
    kind: 'equation',
    piece: e.body.members,
    sum: e.sum,
    terms: strip(written),
    unknown: ofKey(plan, unknown),
    value,
  };
}

/** Terms of an equation: unknowns (those sought without value, found zeros left out), then what acts. */
function termsOf(
  plan: StaticsPlan,
  e: Equation,
  acting: readonly BodyForce[],
  known: ReadonlyMap<string, number>,
  sought: ReadonlySet<string>,
): Term[] {
  const limit = negligible(plan.bodies.eq, e.sum);
  const forces = [...e.body.forces, ...acting];
  return forces.flatMap((f): Term[] => {
    const c = coefficient(f, e.sum);
    if (Math.abs(c) <= limit) return [];
    const value = f.value ?? known.get(f.key);
    if (sought.has(f.key)) return [{ key: f.key, coefficient: c, value: value ?? Number.NaN, of: f.of }];
    return value === undefined || value === 0 ? [] : [{ key: f.key, coefficient: c, value, of: f.of }];
  });
}

const strip = (terms: readonly Term[]): StaticsTerm[] =>
  terms.map(({ coefficient: c, value, of }) => ({ coefficient: c, value, of }));

/** The sum of the terms; zero when it is only what rounding leaves. */
function total(terms: readonly StaticsTerm[]): number {
  let sum = 0;
  let largest = 0;
  for (const t of terms) {
    sum += t.coefficient * t.value;
    largest = Math.max(largest, Math.abs(t.coefficient * t.value));
  }
  return Math.abs(sum) <= rounding * largest ? 0 : sum;
}

function ofKey(plan: StaticsPlan, key: string): StaticsTerm['of'] {
  for (const body of plan.bodies.list) for (const f of body.forces) if (f.key === key) return f.of;
  throw new Error(`no force ${key}`);
}

/** An equation of the whole that was not needed, a moment sum before a sum of forces: every force in it is known. */
function check(
  plan: StaticsPlan,
  outside: readonly BodyForce[],
  known: ReadonlyMap<string, number>,
): StaticsLine[] {
  const moments = plan.left.filter((e) => e.sum.kind === 'moment');
  for (const e of [...moments, ...plan.left.filter((x) => x.sum.kind === 'force')]) {
    const terms = strip(termsOf(plan, e, outside, known, new Set()));
    if (terms.length < 2) continue;
    const residual = terms.reduce((s, t) => s + t.coefficient * t.value, 0);
    return [{ kind: 'check', piece: plan.whole.members, sum: e.sum, terms, residual }];
  }
  return [];
}
