import type { MomentPart } from '../force-method/work';
import { type Context, lengthValue, placedMember } from './context';
import { dimensions } from './dimensions';
import type { Value } from './expression';
import { exactDecimals } from './figure-plan';
import { cellsInstead, type NotWritten } from './not-written';
import { heightFormula } from './part-height';
import { fitColumns } from './precision';
import { type Relation, relate } from './relation';
import type { SymbolName } from './symbol-name';

/** One shape of the primary moment diagram, with its name on the sheet. */
export interface NamedPart {
  name: string;
  case: string;
  part: MomentPart;
  length: Value;
}

/** Decimals of the columns of one table of parts. */
export interface PartDecimals {
  length: number;
  height: number;
  area: number;
  centroid: number;
}

/** Step 6: the primary moments of every case as named shapes. */
export interface PartsStep {
  kind: 'parts';
  cases: { id: string; parts: NamedPart[]; heights: Relation[]; decimals: PartDecimals }[];
  /** Why no part is named. */
  notWritten?: NotWritten;
}

export function deriveParts(ctx: Context): PartsStep {
  const cases = ctx.analysis.cases.map(({ id }) => {
    const parts = namedParts(ctx, id);
    const decimals = decimalsOf(ctx, parts);
    return { id, parts, heights: parts.flatMap((p) => heightOf(ctx, p, decimals.height)), decimals };
  });
  return { kind: 'parts', cases, notWritten: cellsInstead(ctx) };
}

function decimalsOf(ctx: Context, parts: readonly NamedPart[]): PartDecimals {
  const rows = parts.map(({ part }) => ({
    length: part.to - part.from,
    height: part.height,
    area: part.area,
    factor: part.factor.n / part.factor.d,
  }));
  const { figures } = ctx;
  const start = {
    length: Math.max(figures.length, ...parts.map((p) => p.length.decimals)),
    height: figures.moment,
    area: exactDecimals(
      rows.map((r) => r.area),
      2,
      figures.area,
    ),
    factor: 12,
  };
  const { length, height, area } = fitColumns<keyof typeof start>(rows, start, [
    { column: 'area', from: ['factor', 'length', 'height'], work: (r) => r.factor * r.length * r.height },
  ]);
  return { length, height, area, centroid: figures.length + 1 };
}

/** Rounding of the arithmetic, beside the largest area of a case. */
const negligible = 1e-12;

/** The parts of one case: D1, D2 … */
export function namedParts(ctx: Context, id: string): NamedPart[] {
  const all = ctx.solution.work.parts[id] ?? [];
  const largest = Math.max(...all.map((p) => Math.abs(p.area)), 0);
  const parts = all.filter((p) => Math.abs(p.area) > negligible * largest);
  return parts.map((part, i) => {
    const { L } = placedMember(ctx, part.member);
    const l = part.to - part.from;
    const symbol = Math.abs(l - L) <= 1e-9 * L ? ctx.names.length(part.member) : undefined;
    const divider = /\d$/.test(id) ? '.' : '';
    return { name: `${id}${divider}${i + 1}`, case: id, part, length: lengthValue(ctx, symbol, l) };
  });
}

/** The height of a part, M with a hat. */
export const heightSymbol = (name: string): SymbolName => ({ letter: 'M', mark: 'hat', sub: [name] });

function heightOf(ctx: Context, named: NamedPart, decimals: number): Relation[] {
  const formula = heightFormula(ctx, named.case, named.part);
  if (!formula) return [];
  const figures = { dimension: dimensions.moment, decimals };
  return [relate(heightSymbol(named.name), formula, figures, named.part.height)];
}
