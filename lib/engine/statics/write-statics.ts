import type { Quantity } from '@/lib/model/quantity';
import type { Equilibrium } from './equilibrium';
import { type Action, type Body, type BodyForce, rigidBodies } from './rigid-body';
import type { StaticsLine, StaticsTerm } from './statics-line';

type Sum = Extract<StaticsLine, { kind: 'equation' }>['sum'];

/** Arms and cosines below this part of a member length count as none. */
const none = 1e-9;

/**
 * How a person finds the forces of a determinate structure: again and again an equation with one unknown, on the whole
 * or on a piece of it, moments about a joint before sums of forces; the equation left over on the whole is the check.
 * Empty when a cut along a member is among the redundants, or when no such order exists; tables then stand alone.
 */
export function writeStatics(
  eq: Equilibrium,
  redundants: readonly Quantity[],
  action: Action,
): StaticsLine[] {
  const bodies = rigidBodies(eq, redundants, action);
  if (!bodies) return [];
  const known = new Map<string, number>();
  const lines: StaticsLine[] = [];
  const whole = join(bodies);
  const tries = bodies.length === 1 ? [whole] : [whole, ...bodies];
  const unknowns = new Set(
    bodies.flatMap((b) => b.forces.filter((f) => f.value === undefined).map((f) => f.key)),
  );
  const used = new Set<string>();
  while (known.size < unknowns.size) {
    const found = nextLine(eq, tries, known, used);
    if (!found) return [];
    known.set(found.key, found.line.value);
    lines.push(found.line);
  }
  const check = leftOver(eq, whole, known, used);
  return check ? [...lines, check] : lines;
}

function join(bodies: readonly Body[]): Body {
  const forces = bodies
    .flatMap((b) => b.forces)
    .filter((f) => !f.key.startsWith('interface:') && !f.key.startsWith('unit:'));
  const units = bodies.flatMap((b) => b.forces.filter((f) => f.of.kind === 'unit' && f.couple === undefined));
  const turning = bodies.flatMap((b) =>
    b.forces.filter((f) => f.of.kind === 'unit' && f.couple !== undefined && !f.key.startsWith('unit:')),
  );
  const kept = forces.filter((f) => f.of.kind !== 'unit');
  return { members: bodies.flatMap((b) => b.members), forces: [...kept, ...units, ...turning] };
}

function sumsOf(eq: Equilibrium, body: Body): Sum[] {
  const joints = eq.analysis.joints.filter((j) =>
    eq.bars.some(
      (b) => body.members.includes(b.member.id) && (b.member.start === j.id || b.member.end === j.id),
    ),
  );
  return [
    ...joints.map((j): Sum => ({ kind: 'moment', x: j.x, y: j.y, joint: j.id })),
    { kind: 'force', x: 0, y: 1 },
    { kind: 'force', x: 1, y: 0 },
  ];
}

function coefficient(f: BodyForce, sum: Sum): number {
  if (sum.kind === 'force') return f.couple === undefined ? f.ux * sum.x + f.uy * sum.y : 0;
  return f.couple === undefined ? (f.x - sum.x) * f.uy - (f.y - sum.y) * f.ux : f.couple;
}

function termsOf(eq: Equilibrium, body: Body, sum: Sum): (StaticsTerm & { key: string; known?: number })[] {
  const limit = none * (sum.kind === 'moment' ? eq.length : 1);
  return body.forces.flatMap((f) => {
    const c = coefficient(f, sum);
    if (Math.abs(c) <= limit || f.value === 0) return [];
    return [{ key: f.key, coefficient: c, value: f.value ?? Number.NaN, of: f.of, known: f.value }];
  });
}

function nextLine(
  eq: Equilibrium,
  tries: readonly Body[],
  known: ReadonlyMap<string, number>,
  used: Set<string>,
) {
  for (const body of tries) {
    for (const sum of sumsOf(eq, body)) {
      const name = `${body.members.join()}|${JSON.stringify(sum)}`;
      if (used.has(name)) continue;
      const terms = termsOf(eq, body, sum);
      const open = terms.filter((t) => t.known === undefined && !known.has(t.key));
      const [sought] = open;
      if (!sought || open.some((t) => t.key !== sought.key)) continue;
      used.add(name);
      const valued = terms.map((t) => ({
        coefficient: t.coefficient,
        value: t.known ?? known.get(t.key) ?? Number.NaN,
        of: t.of,
        key: t.key,
      }));
      const rest = valued
        .filter((t) => t.key !== sought.key)
        .reduce((s, t) => s + t.coefficient * t.value, 0);
      const value = rest === 0 ? 0 : -rest / sought.coefficient;
      const written = valued.map(({ key, ...t }) => (key === sought.key ? { ...t, value } : t));
      const line: Extract<StaticsLine, { kind: 'equation' }> = {
        kind: 'equation',
        piece: body.members,
        sum,
        terms: written,
        unknown: sought.of,
        value,
      };
      return { key: sought.key, line };
    }
  }
  return undefined;
}

/** A moment sum on the whole about a joint not used before: every force stands in it with its value. */
function leftOver(
  eq: Equilibrium,
  whole: Body,
  known: ReadonlyMap<string, number>,
  used: ReadonlySet<string>,
): StaticsLine | undefined {
  const free = sumsOf(eq, whole).filter((s) => !used.has(`${whole.members.join()}|${JSON.stringify(s)}`));
  const sum =
    free.find((s) => s.kind === 'moment' && termsOf(eq, whole, s).length > 1) ??
    free.find((s) => termsOf(eq, whole, s).length > 1);
  if (!sum) return undefined;
  const terms = termsOf(eq, whole, sum).map((t) => ({
    coefficient: t.coefficient,
    value: t.known ?? (known.get(t.key) as number),
    of: t.of,
  }));
  return {
    kind: 'check',
    piece: whole.members,
    sum,
    terms,
    residual: terms.reduce((s, t) => s + t.coefficient * t.value, 0),
  };
}
