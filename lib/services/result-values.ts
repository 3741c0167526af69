import { z } from 'zod';
import { type Quantity, quantity } from '@/lib/model/quantity';

/** The part of a revision's stored results that is compared value by value. */
const stored = z.object({
  reactions: z.record(
    z.string(),
    z.object({ reactions: z.array(z.object({ quantity, value: z.number() })) }),
  ),
  envelopes: z.array(
    z.object({
      member: z.string(),
      purpose: z.enum(['strength', 'service']),
      stations: z.array(z.object({ M: z.object({ max: z.number(), min: z.number() }) })),
    }),
  ),
});

export interface ResultValue {
  /** "R at 2 across, case D". */
  name: string;
  unit: string;
  value: number;
}

/** Reactions of every case, and greatest and least moments of the envelopes, by name; what a stranger can compare. */
export function resultValues(results: unknown, units: 'US' | 'SI'): ResultValue[] {
  const { reactions, envelopes } = stored.parse(results);
  const [force, moment] = units === 'US' ? ['kip', 'kip·ft'] : ['kN', 'kN·m'];
  const perCase = Object.entries(reactions).flatMap(([id, { reactions: list }]) =>
    list.map((r) => ({
      name: `${reactionWords(r.quantity)}, case ${id}`,
      unit: isTurn(r.quantity) ? moment : force,
      value: r.value,
    })),
  );
  const extremes = envelopes.flatMap(({ member, purpose, stations }) => [
    {
      name: `greatest M in ${member}, ${purpose}`,
      unit: moment,
      value: Math.max(...stations.map((s) => s.M.max)),
    },
    {
      name: `least M in ${member}, ${purpose}`,
      unit: moment,
      value: Math.min(...stations.map((s) => s.M.min)),
    },
  ]);
  return [...perCase, ...extremes];
}

const isTurn = (q: Quantity) => q.kind === 'reaction' && q.component === 'turn';

function reactionWords(q: Quantity): string {
  if (q.kind !== 'reaction') throw new Error('a reaction is expected');
  if (q.component === 'turn') return `fixing moment at ${q.joint}`;
  return `reaction at ${q.joint} along ${q.component}`;
}

/** One value of two sheets side by side. */
export const valuePair = z.object({
  name: z.string(),
  unit: z.string(),
  before: z.number().optional(),
  after: z.number().optional(),
  /** Change over the earlier value; absent where one side is missing or the earlier value is nothing beside the rest. */
  change: z.number().optional(),
});
export type ValuePair = z.infer<typeof valuePair>;

/** Below this part of the greatest value of its unit, a value is rounding and no change is reckoned against it. */
const nothing = 1e-9;

/** The values of two revisions by name, in the order of the later one; what only the earlier had comes last. */
export function pairValues(before: readonly ResultValue[], after: readonly ResultValue[]): ValuePair[] {
  const was = new Map(before.map((v) => [`${v.name} ${v.unit}`, v.value]));
  const sizes = new Map<string, number>();
  for (const v of [...before, ...after])
    sizes.set(v.unit, Math.max(sizes.get(v.unit) ?? Number.MIN_VALUE, Math.abs(v.value)));
  const paired = after.map((v): ValuePair => {
    const key = `${v.name} ${v.unit}`;
    const earlier = was.get(key);
    was.delete(key);
    if (earlier === undefined) return { name: v.name, unit: v.unit, after: v.value };
    const small = Math.abs(earlier) <= nothing * (sizes.get(v.unit) as number);
    const change = small ? {} : { change: (v.value - earlier) / Math.abs(earlier) };
    return { name: v.name, unit: v.unit, before: earlier, after: v.value, ...change };
  });
  const gone = before.filter((v) => was.has(`${v.name} ${v.unit}`));
  return [...paired, ...gone.map((v) => ({ name: v.name, unit: v.unit, before: v.value }))];
}
