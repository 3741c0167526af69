import { type Quantity, quantityKey } from '@/lib/model/quantity';
import type { StaticsTerm } from '../statics/statics-line';
import { type Context, redundantSymbol } from './context';
import { dimensionOf } from './dimensions';
import { type EndForces, endForcesOf } from './end-forces';
import type { Value } from './expression';
import { cellsInstead, type NotWritten, tooLong } from './not-written';
import { writeSteps } from './statics';
import type { StaticsStep } from './statics-equation';
import { inCase, onPrimary, type SymbolName } from './symbol-name';

/** Step 5: the determinate structure left when the redundants are released, and its forces. */
export interface PrimaryStep {
  kind: 'primary';
  released: { symbol: SymbolName; is: SymbolName; quantity: Quantity }[];
  pieces: readonly (readonly string[])[];
  /** Why there are no cases. */
  notWritten?: NotWritten;
  cases: {
    id: string;
    /** One unknown at a time, then a few together. */
    steps: StaticsStep[];
    /** Why there are no steps: then the tables stand alone. */
    notWritten?: NotWritten;
    reactions: Value[];
    ends: EndForces[];
  }[];
}

/** Cases whose statics are written out, and lines of one; the others have their results in tables. */
const most = { cases: 3, lines: 40 };

export function derivePrimary(ctx: Context): PrimaryStep {
  const { solution, analysis, names } = ctx;
  const released = new Set(solution.redundants.map(quantityKey));
  return {
    kind: 'primary',
    released: solution.redundants.map((quantity, i) => ({
      symbol: redundantSymbol(i),
      is: names.quantity(quantity),
      quantity,
    })),
    pieces: solution.primary.pieces,
    notWritten: cellsInstead(ctx),
    cases: analysis.cases.flatMap(({ id }, k) => {
      const state = solution.primary.loaded[id];
      if (!state) return [];
      const lines = usedLines(state.lines);
      const notWritten = whyNot(ctx, k, lines, state.reactions);
      return [
        {
          id,
          steps: notWritten ? [] : writeSteps(ctx, lines, { kind: 'case', id }),
          notWritten,
          reactions: state.reactions
            .filter((r) => !released.has(quantityKey(r.quantity)))
            .map((r) => reactionValue(ctx, r, (s) => inCase(onPrimary(s), id))),
          ends: endForcesOf(ctx, state.members),
        },
      ];
    }),
  };
}

function whyNot(ctx: Context, k: number, lines: Lines, reactions: Reactions): NotWritten | undefined {
  const { written, pieces } = ctx.solution.primary;
  if (written !== 'lines' || lines.length > most.lines) return tooLong(ctx);
  if (k >= most.cases) return { why: 'alike' };
  if (pieces.length === 0) return { why: 'order' };
  const loaded = reactions.some((r) => r.value !== 0);
  return agree(lines, reactions) && (lines.length > 0 || !loaded) ? undefined : { why: 'couple' };
}

/** The lines give the reactions of the state. Where they do not (a load whose resultant is a couple), tables stand alone. */
function agree(lines: Lines, reactions: Reactions): boolean {
  const size = Math.max(...reactions.map((r) => Math.abs(r.value)), 0);
  return lines.flatMap(foundBy).every(({ of, value }) => {
    if (of.kind !== 'quantity') return true;
    const key = quantityKey(of.quantity);
    const found = reactions.find((r) => quantityKey(r.quantity) === key);
    return found !== undefined && Math.abs(found.value - value) <= 1e-9 * size;
  });
}

/** A reaction with its symbol and the decimals of its kind. */
export function reactionValue(
  ctx: Context,
  { quantity, value }: { quantity: Quantity; value: number },
  name: (s: SymbolName) => SymbolName,
): Value {
  const dimension = dimensionOf(quantity);
  const decimals = dimension.length === 1 ? ctx.figures.moment : ctx.figures.force;
  return { kind: 'value', symbol: name(ctx.names.quantity(quantity)), value, dimension, decimals };
}

type Lines = Context['solution']['primary']['units'][number]['lines'];
type Reactions = readonly { quantity: Quantity; value: number }[];

/** What a line gives. */
function foundBy(line: Lines[number]): { of: StaticsTerm['of']; value: number }[] {
  if (line.kind === 'simultaneous') return line.unknowns;
  return line.kind === 'equation' ? [{ of: line.unknown, value: line.value }] : [];
}

/** Forces at hinges are written only where a reaction found after them needs them. */
export function usedLines(lines: Lines): Lines {
  const keyOf = (of: StaticsTerm['of']) =>
    of.kind === 'interface' ? `${of.member} ${of.end} ${of.component}` : undefined;
  const needed = new Set<string | undefined>();
  const kept: Lines[number][] = [];
  for (const line of [...lines].reverse()) {
    const found = foundBy(line).map((f) => keyOf(f.of));
    if (found.length > 0 && found.every((key) => key !== undefined && !needed.has(key))) continue;
    kept.unshift(line);
    if (line.kind === 'check') continue;
    const equations = line.kind === 'equation' ? [line] : line.equations;
    for (const e of equations) for (const t of e.terms) needed.add(keyOf(t.of));
  }
  return kept;
}
