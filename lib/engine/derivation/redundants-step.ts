import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { Mechanism } from '@/lib/model/refusal';
import { trier } from '../force-method/choose';
import { type Context, redundantSymbol } from './context';
import { dimensionOf } from './dimensions';
import { endForcesOf } from './end-forces';
import type { Value } from './expression';
import { cellsInstead } from './not-written';
import { type SymbolName, symbolKey } from './symbol-name';

/** Step 4: what may be released, what may not, and what is. */
export interface RedundantsStep {
  kind: 'redundants';
  /** Quantities with the same value whatever the redundants; zero in every case ones apart. */
  fixed: { symbol: SymbolName; quantity: Quantity; values: Value[] }[];
  fixedZero: { symbol: SymbolName; quantity: Quantity }[];
  /** Sets that differ from the chosen one in one place and leave a mechanism, by what moves. */
  refused: RefusedSets[];
  redundants: { symbol: SymbolName; is: SymbolName; quantity: Quantity }[];
  /** Forces that may be released, each once, where there is one redundant. */
  good: SymbolName[];
  /** Pairs of redundants that act on nothing in common: f_ij = 0. */
  uncoupled: number;
  condition: number;
  proposed: boolean;
}

export interface RefusedSets {
  message: string;
  sets: readonly Quantity[][];
  mechanism?: Mechanism;
}

/** Trials are made on structures that a person would look over by eye. */
const most = { members: 8, redundants: 3, trials: 40 };

export function deriveRedundants(ctx: Context): RedundantsStep {
  const { solution, names, analysis } = ctx;
  const fixed = oncePerSymbol(ctx).map(({ quantity, values }) => {
    const symbol = names.quantity(quantity);
    const decimals = dimensionOf(quantity).length === 1 ? ctx.figures.moment : ctx.figures.force;
    const list = analysis.cases.map(
      (c): Value => ({
        kind: 'value',
        symbol: { ...symbol, super: c.id },
        value: values[c.id] ?? Number.NaN,
        dimension: dimensionOf(quantity),
        decimals,
      }),
    );
    return { symbol, quantity, values: list };
  });
  const largest = Math.max(...fixed.flatMap((f) => f.values.map((v) => Math.abs(v.value))), 0);
  const isZero = (f: (typeof fixed)[number]) => f.values.every((v) => Math.abs(v.value) <= 1e-9 * largest);
  const n = solution.redundants.length;
  const coupled = solution.work.flexibility.filter((f) => f.i !== f.j && f.total !== 0).length;
  return {
    kind: 'redundants',
    fixed: fixed.filter((f) => !isZero(f)),
    fixedZero: fixed.filter(isZero).map(({ symbol, quantity }) => ({ symbol, quantity })),
    refused: refusedExchanges(ctx),
    redundants: solution.redundants.map((quantity, i) => ({
      symbol: redundantSymbol(i),
      is: names.quantity(quantity),
      quantity,
    })),
    good: n === 1 && analysis.members.length <= most.members ? alternatives(ctx) : [],
    uncoupled: cellsInstead(ctx) ? 0 : (n * (n - 1)) / 2 - coupled,
    condition: solution.condition,
    proposed: solution.proposed,
  };
}

function refusedExchanges(ctx: Context): RefusedSets[] {
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
    for (const other of others) {
      if (++trials > most.trials) break;
      if (callsUp(ctx, i, other)) continue;
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

/** A force that a unit state calls up can take the place of its redundant, so such sets need no trial. */
function callsUp(ctx: Context, i: number, q: Quantity): boolean {
  const unit = ctx.solution.primary.units[i];
  if (!unit) return false;
  const ends = endForcesOf(ctx, unit.members);
  const own = new Map(unit.reactions.map((r) => [quantityKey(r.quantity), r.value]));
  for (const e of ends) own.set(quantityKey({ kind: 'moment', member: e.member, end: e.end }), e.M);
  const largest = Math.max(...[...own.values()].map(Math.abs));
  return Math.abs(own.get(quantityKey(q)) ?? 0) > clear * largest;
}

/** Quantities that equilibrium fixes; moments on both sides of a joint that are one stand once. */
function oncePerSymbol({ solution, names }: Context): Context['solution']['fixed'] {
  const seen = new Set<string>();
  return solution.fixed.filter(({ quantity }) => {
    const key = symbolKey(names.quantity(quantity));
    return !seen.has(key) && seen.add(key);
  });
}

/** Forces that one redundant brings with it: any of them could be released in its place. */
function alternatives(ctx: Context): SymbolName[] {
  const [unit] = ctx.solution.primary.units;
  if (!unit) return [];
  const found = [
    ...unit.reactions.filter((r) => r.value !== 0).map((r) => ctx.names.quantity(r.quantity)),
    ...endForcesOf(ctx, unit.members).flatMap((e) => [
      ...(e.M === 0 ? [] : [ctx.names.moment(e.member, e.end)]),
      ...(e.N === 0 || e.end === 'end' ? [] : [ctx.names.axial(e.member, 'start')]),
    ]),
  ];
  return [...new Map(found.map((s) => [symbolKey(s), s])).values()];
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
