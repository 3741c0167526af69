import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { Mechanism } from '@/lib/model/refusal';
import { trier } from '../force-method/choose';
import type { Context } from './context';
import { endForcesOf } from './end-forces';
import { symbolKey } from './symbol-name';

/** Sets that leave the same mechanism. */
export interface RefusedSets {
  message: string;
  sets: readonly Quantity[][];
  mechanism?: Mechanism;
}

/** Trials are made on structures that a person would look over by eye. */
export const most = { members: 8, redundants: 3, trials: 40 };

/** Sets that differ from the chosen one in one place and leave a mechanism, by what moves. */
export function refusedExchanges(ctx: Context): RefusedSets[] {
  const { solution, analysis, names } = ctx;
  const { redundants } = solution;
  const n = redundants.length;
  if (n === 0 || n > most.redundants || analysis.members.length > most.members) return [];
  const barred = new Set([...redundants, ...solution.fixed.map((f) => f.quantity)].map(quantityKey));
  const seen = new Set<string>();
  const others = [...reactionsOf(analysis.joints), ...momentsOf(analysis.members)].filter((q) => {
    const name = JSON.stringify(names.quantity(q));
    if (barred.has(quantityKey(q)) || seen.has(name)) return false;
    seen.add(name);
    return true;
  });
  const byMotion: Motions = new Map();
  let trials = 0;
  const ask = trier(analysis);
  for (const { quantity, values } of oncePerSymbol(ctx)) {
    if (quantity.kind === 'axial' || Object.values(values).every((v) => v === 0)) continue;
    const choice = ask(redundants.map((q, k) => (k === 0 ? quantity : q)));
    if (!choice.good && choice.mechanism) note(byMotion, choice, [quantity]);
  }
  for (let i = 0; i < n; i++) {
    const callsUp = calledUp(ctx, i);
    for (const other of others) {
      if (++trials > most.trials) break;
      if (callsUp(other)) continue;
      const set = redundants.map((q, k) => (k === i ? other : q));
      const choice = ask(set);
      if (choice.good || !choice.mechanism) continue;
      note(byMotion, choice, set);
    }
  }
  return [...byMotion.values()];
}

/** Beside the largest force of a unit state: what is surely called up. */
const clear = 1e-6;

/** Whether a unit state calls up a force: then that can take the place of its redundant, and the set needs no trial. */
function calledUp(ctx: Context, i: number): (q: Quantity) => boolean {
  const unit = ctx.solution.primary.units[i];
  if (!unit) return () => false;
  const sizes = new Map(unit.reactions.map((r) => [quantityKey(r.quantity), Math.abs(r.value)]));
  for (const { member, end, M } of endForcesOf(ctx, unit.members))
    sizes.set(quantityKey({ kind: 'moment', member, end }), Math.abs(M));
  const least = clear * Math.max(...sizes.values());
  return (q) => {
    const size = sizes.get(quantityKey(q));
    return size !== undefined && size > least;
  };
}

/** Quantities that equilibrium fixes; moments on both sides of a joint that are one stand once. */
export function oncePerSymbol({ solution, names }: Context): Context['solution']['fixed'] {
  const seen = new Set<string>();
  return solution.fixed.filter(({ quantity }) => {
    const key = symbolKey(names.quantity(quantity));
    return !seen.has(key) && seen.add(key);
  });
}

type Motions = Map<string, RefusedSets & { sets: Quantity[][] }>;

function note(
  motions: Motions,
  { message, mechanism }: Pick<RefusedSets, 'message' | 'mechanism'>,
  set: Quantity[],
): void {
  const known = motions.get(message);
  if (known) known.sets.push(set);
  else motions.set(message, { message, sets: [set], mechanism });
}

function reactionsOf(joints: Context['analysis']['joints']): Quantity[] {
  return joints.flatMap(({ id, support }) =>
    (['x', 'y', 'turn'] as const).flatMap((component): Quantity[] =>
      support && support[component] !== 'free' ? [{ kind: 'reaction', joint: id, component }] : [],
    ),
  );
}

function momentsOf(members: Context['analysis']['members']): Quantity[] {
  return members.flatMap((m) =>
    (['start', 'end'] as const).map((end): Quantity => ({ kind: 'moment', member: m.id, end })),
  );
}
