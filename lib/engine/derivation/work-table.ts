import type { Dimension } from '@/lib/units/dimension';
import type { PartShape, WorkRow } from '../force-method/work';
import type { Context } from './context';
import type { Value } from './expression';
import { decimalsFor } from './figure-plan';
import { otherFormula, type TermStates } from './other-formula';
import { fitColumns, fitTerms } from './precision';
import { type Relation, relate } from './relation';
import type { SymbolName } from './symbol-name';

/** One bending row: area of one diagram times the ordinate of the other at its centroid, over k. */
export interface BendingLine {
  kind: 'bending';
  /** Name of the part, where the area is that of one. */
  part?: string;
  member: string;
  shape: PartShape;
  factor: { n: number; d: number };
  length: number;
  height: number;
  area: number;
  ordinate: number;
  k: number;
  value: number;
}

/** A term beside bending: a line of its own, and its value in the table. */
export interface OtherLine {
  kind: 'other';
  row: Exclude<WorkRow, { kind: 'bending' }>;
  relation: Relation;
  value: number;
}

export type WorkLine = BendingLine | OtherLine;

/** A group of rows and their sum: one EI0 f_ij or EI0 δ_i0. */
export interface WorkGroup {
  symbol: SymbolName;
  lines: WorkLine[];
  total: Value;
}

/** Groups of one dimension, with the decimals of their columns. */
export interface WorkTable {
  groups: WorkGroup[];
  decimals: Record<WorkColumn, number>;
  /** Of the whole, of the areas and of the ordinates. */
  dimension: Dimension;
  area: Dimension;
  ordinate: Dimension;
}

export type WorkColumn = 'length' | 'height' | 'area' | 'ordinate' | 'k' | 'value';

const factors: Record<PartShape, { n: number; d: number }> = {
  rectangle: { n: 1, d: 1 },
  triangle: { n: 1, d: 2 },
  parabola: { n: 2, d: 3 },
  'half-parabola': { n: 2, d: 3 },
  spandrel: { n: 1, d: 3 },
  cubic: { n: 1, d: 4 },
  'cubic-spandrel': { n: 1, d: 4 },
};

export interface GroupInput {
  symbol: SymbolName;
  rows: readonly WorkRow[];
  total: number;
  states: Omit<TermStates, 'stretch'>;
  /** Names of the parts of the rows, in their order. */
  nameOf?: (row: Extract<WorkRow, { kind: 'bending' }>) => string | undefined;
}

/** A table of groups, its decimals raised until every row and total works with the figures printed. */
export function workTable(
  ctx: Context,
  inputs: readonly GroupInput[],
  dims: Pick<WorkTable, 'dimension' | 'area' | 'ordinate'>,
  totalDecimals: number,
): WorkTable {
  const { figures } = ctx;
  let others = 0;
  const groups = inputs.map((g) => {
    const lines = withoutRounding(g.rows).map((row): WorkLine => {
      if (row.kind === 'bending') return bendingLine(row, g.nameOf?.(row));
      others += 1;
      return otherLine(ctx, row, g, others, dims, totalDecimals);
    });
    const total: Value = {
      kind: 'value',
      symbol: g.symbol,
      value: g.total,
      dimension: dims.dimension,
      decimals: totalDecimals,
    };
    return { symbol: g.symbol, lines, total };
  });
  const rows = groups.flatMap((g) => g.lines.filter((l) => l.kind === 'bending'));
  const valueDecimals = Math.max(
    totalDecimals,
    ...groups.map((g) =>
      fitTerms(
        g.lines.map((l) => l.value),
        totalDecimals,
      ),
    ),
  );
  const start: Record<WorkColumn | 'factor', number> = {
    length: figures.length,
    height: dims.area.force === 0 ? figures.unitMoment : figures.moment,
    area: decimalsFor(
      rows.map((r) => r.area),
      6,
      0,
      4,
    ),
    ordinate: figures.unitMoment,
    k: figures.ratio,
    value: valueDecimals,
    factor: 12,
  };
  const numbers = rows.map((r) => ({
    length: r.length,
    height: r.height,
    area: r.area,
    ordinate: r.ordinate,
    k: r.k,
    value: r.value,
    factor: r.factor.n / r.factor.d,
  }));
  const { factor, ...decimals } = fitColumns<WorkColumn | 'factor'>(numbers, start, [
    { column: 'value', from: ['area', 'ordinate', 'k'], work: (r) => (r.area * r.ordinate) / r.k },
    { column: 'area', from: ['factor', 'length', 'height'], work: (r) => r.factor * r.length * r.height },
  ]);
  return { groups, decimals, ...dims };
}

/** Rows whose area is rounding of the arithmetic say nothing. */
function withoutRounding(rows: readonly WorkRow[]): WorkRow[] {
  const size = (r: WorkRow) => (r.kind === 'bending' ? Math.abs(r.area) : 0);
  const largest = Math.max(...rows.map(size), 0);
  return rows.filter((r) => r.kind !== 'bending' || size(r) > 1e-12 * largest);
}

function bendingLine(row: Extract<WorkRow, { kind: 'bending' }>, part: string | undefined): BendingLine {
  const length = row.to - row.from;
  return {
    kind: 'bending',
    part,
    member: row.member,
    shape: row.shape,
    factor: factors[row.shape],
    length,
    height: row.height,
    area: row.area,
    ordinate: row.ordinate,
    k: row.k,
    value: row.value,
  };
}

function otherLine(
  ctx: Context,
  row: OtherLine['row'],
  group: GroupInput,
  n: number,
  dims: Pick<WorkTable, 'dimension'>,
  decimals: number,
): OtherLine {
  const symbol: SymbolName = {
    letter: 't',
    sub: [...(group.symbol.sub ?? []), ',', `${n}`],
    super: group.symbol.super,
  };
  const figures = { dimension: dims.dimension, decimals: decimals + 1 };
  const { letter, sub = [] } = group.symbol;
  const stretch = [letter, ...sub, `-${n}`].join('');
  return {
    kind: 'other',
    row,
    relation: relate(symbol, otherFormula(ctx, row, { ...group.states, stretch }), figures, row.value),
    value: row.value,
  };
}
