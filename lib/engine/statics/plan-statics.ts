import type { Quantity } from '@/lib/model/quantity';
import type { Equilibrium } from './equilibrium';
import { jointSums, meetingSum, type Sum, unknownsOf } from './equilibrium-sums';
import { type Bodies, type Body, rigidBodies } from './rigid-body';
import { independentRows } from './simultaneous';

/** One equilibrium equation of a body, with the unknowns in it. */
export interface Equation {
  body: Body;
  sum: Sum;
  coefficients: Map<string, number>;
}

export type PlanStep =
  | { kind: 'equation'; equation: Equation; unknown: string }
  | { kind: 'simultaneous'; equations: Equation[]; unknowns: string[] };

/** How a person finds the forces of a determinate structure, whatever acts: which equation gives which force. */
export interface StaticsPlan {
  bodies: Bodies;
  /** All pieces together: only what acts from outside. */
  whole: Body;
  steps: PlanStep[];
  /** Equations of the whole that were not needed. */
  left: Equation[];
}

/** So many unknowns are set as one system; more are left to the tables. */
const mostTogether = 6;

/**
 * Again and again an equation with one unknown, on the whole or on a piece of it, moments about a joint before sums of
 * forces; then moments about the point where the other unknowns of a piece meet; then two equations with the same two
 * unknowns; then whatever is left as one small system. Undefined when there is no such order.
 */
export function planStatics(eq: Equilibrium, redundants: readonly Quantity[]): StaticsPlan | undefined {
  const bodies = rigidBodies(eq, redundants);
  if (!bodies) return undefined;
  const whole = wholeOf(bodies);
  const pieces = bodies.list.length === 1 ? [whole] : [whole, ...bodies.list];
  const equations = pieces.flatMap((body) =>
    jointSums(eq, body).map((sum): Equation => ({ body, sum, coefficients: unknownsOf(eq, body, sum) })),
  );
  const open = new Set(bodies.list.flatMap((b) => b.forces.map((f) => f.key)));
  const used = new Set<Equation>();
  const steps: PlanStep[] = [];
  const openIn = (e: Equation) => [...e.coefficients.keys()].filter((k) => open.has(k));
  while (open.size > 0) {
    const step =
      single(equations, used, openIn) ??
      meeting(eq, pieces, open) ??
      pair(equations, used, openIn) ??
      rest(equations, used, open, openIn);
    if (!step) return undefined;
    const solved = step.kind === 'equation' ? [step.equation] : step.equations;
    for (const e of solved) used.add(e);
    for (const k of step.kind === 'equation' ? [step.unknown] : step.unknowns) open.delete(k);
    steps.push(step);
  }
  return { bodies, whole, steps, left: equations.filter((e) => e.body === whole && !used.has(e)) };
}

function wholeOf({ eq, list }: Bodies): Body {
  const [only, ...more] = list;
  if (only && more.length === 0) return only;
  const forces = list.flatMap((b) => b.forces.filter((f) => f.of.kind === 'quantity'));
  return { members: eq.bars.map((b) => b.member.id), forces };
}

type OpenIn = (e: Equation) => string[];

function single(
  equations: readonly Equation[],
  used: ReadonlySet<Equation>,
  openIn: OpenIn,
): PlanStep | undefined {
  for (const equation of equations) {
    if (used.has(equation)) continue;
    const [unknown, ...more] = openIn(equation);
    if (unknown !== undefined && more.length === 0) return { kind: 'equation', equation, unknown };
  }
  return undefined;
}

/** The point where all unknowns of a piece but one meet, or the direction that all but one are normal to. */
function meeting(eq: Equilibrium, pieces: readonly Body[], open: ReadonlySet<string>): PlanStep | undefined {
  for (const body of pieces) {
    const forces = body.forces.filter((f) => open.has(f.key));
    if (forces.length < 2 || forces.length > 3) continue;
    for (const sought of forces) {
      const sum = meetingSum(
        eq,
        forces.filter((f) => f !== sought),
      );
      if (!sum) continue;
      const coefficients = unknownsOf(eq, body, sum);
      const left = [...coefficients.keys()].filter((k) => open.has(k));
      if (left.length === 1 && left[0] === sought.key)
        return { kind: 'equation', equation: { body, sum, coefficients }, unknown: sought.key };
    }
  }
  return undefined;
}

function pair(
  equations: readonly Equation[],
  used: ReadonlySet<Equation>,
  openIn: OpenIn,
): PlanStep | undefined {
  const seen = new Map<string, Equation[]>();
  for (const e of equations) {
    const unknowns = openIn(e);
    if (used.has(e) || unknowns.length !== 2) continue;
    const key = [...unknowns].sort().join();
    for (const other of seen.get(key) ?? []) {
      if (independentRows([other, e], unknowns))
        return { kind: 'simultaneous', equations: [other, e], unknowns };
    }
    seen.set(key, [...(seen.get(key) ?? []), e]);
  }
  return undefined;
}

function rest(
  equations: readonly Equation[],
  used: ReadonlySet<Equation>,
  open: ReadonlySet<string>,
  openIn: OpenIn,
): PlanStep | undefined {
  if (open.size > mostTogether) return undefined;
  const unknowns = [...open];
  const rows = equations.filter((e) => !used.has(e) && openIn(e).length > 0);
  const chosen = independentRows(rows, unknowns);
  return chosen ? { kind: 'simultaneous', equations: chosen, unknowns } : undefined;
}
