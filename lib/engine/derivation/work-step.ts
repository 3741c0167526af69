import type { Quantity } from '@/lib/model/quantity';
import type { Dimension } from '@/lib/units/dimension';
import { type Context, redundantSymbol } from './context';
import { dimensionOf, dimensions, flexibilityDimension, gapDimension, per } from './dimensions';
import { cellsInstead, type NotWritten } from './not-written';
import { namedParts } from './parts-step';
import { inCase, inUnitState, onPrimary, type SymbolName } from './symbol-name';
import { type WorkTable, workTable } from './work-table';

/** Step 8: EI0 f_ij and EI0 δ_i0, row by row. Tables hold groups of one dimension. */
export interface WorkStep {
  kind: 'work';
  flexibility: WorkTable[];
  gaps: { case: string; tables: WorkTable[] }[];
  /** Beside bending. */
  terms: ReadonlySet<'axial' | 'shear' | 'spring' | 'temperature' | 'gradient' | 'misfit' | 'settlement'>;
  /** Rows are left out where the redundants are too many: then the totals are worked from end moments. */
  rows: boolean;
  /** Why there are no coefficients. */
  notWritten?: NotWritten;
}

export const flexibilitySymbol = (i: number, j: number): SymbolName => ({
  letter: 'f',
  sub: i > 8 || j > 8 ? [`${i + 1}`, ',', `${j + 1}`] : [`${i + 1}${j + 1}`],
  timesEI0: true,
});

export const gapSymbol = (i: number, id: string): SymbolName => ({
  letter: 'δ',
  sub: i > 8 ? [`${i + 1}`, ',', '0'] : [`${i + 1}0`],
  super: id,
  timesEI0: true,
});

/** Beyond this many redundants the rows give way to tables of totals. */
export const writtenRows = 12;

export function deriveWork(ctx: Context): WorkStep {
  const { work, redundants } = ctx.solution;
  const rows = redundants.length <= writtenRows;
  const at = (i: number): Quantity => {
    const q = redundants[i];
    if (!q) throw new Error(`there is no redundant ${redundantSymbol(i).sub?.join('')}`);
    return q;
  };
  const unitOf = (i: number) => ({ unit: (s: SymbolName) => inUnitState(s, i), perUnit: dimensionOf(at(i)) });
  const flexibility = grouped(
    work.flexibility.filter((f) => f.rows.length > 0 || f.total !== 0),
    (f) => flexibilityDimension(at(f.i), at(f.j)),
  ).map(({ dimension, items }) => {
    const [first] = items;
    const mine = first ? dimensionOf(at(first.j)) : dimensions.force;
    const other = first ? dimensionOf(at(first.i)) : dimensions.force;
    return workTable(
      ctx,
      items.map((f) => ({
        symbol: flexibilitySymbol(f.j, f.i),
        rows: rows ? f.rows : [],
        total: f.total,
        states: { ...unitOf(f.i), other: (s) => inUnitState(s, f.j), perOther: dimensionOf(at(f.j)) },
      })),
      { dimension, area: unitArea(mine), ordinate: per(dimensions.moment, other) },
      ctx.figures.flexibility,
    );
  });
  const gaps = ctx.analysis.cases.map(({ id }) => {
    const parts = namedParts(ctx, id);
    const mine = work.gaps.filter((g) => g.case === id);
    const tables = grouped(mine, (g) => gapDimension(at(g.i))).map(({ dimension, items }) => {
      const [first] = items;
      const other = first ? dimensionOf(at(first.i)) : dimensions.force;
      return workTable(
        ctx,
        items.map((g) => ({
          symbol: gapSymbol(g.i, id),
          rows: rows ? g.rows : [],
          total: g.total,
          states: { ...unitOf(g.i), other: (s) => inCase(onPrimary(s), id), perOther: dimensions.pure },
          nameOf: (row) =>
            parts.find(
              ({ part }) =>
                part.member === row.member && part.centroid === row.centroid && part.area === row.area,
            )?.name,
        })),
        { dimension, area: { force: 1, length: 2, temperature: 0 }, ordinate: per(dimensions.moment, other) },
        ctx.figures.gap,
      );
    });
    return { case: id, tables };
  });
  const all = [...work.flexibility.flatMap((f) => f.rows), ...work.gaps.flatMap((g) => g.rows)];
  const terms: WorkStep['terms'] = new Set(all.flatMap((r) => (r.kind === 'bending' ? [] : [r.kind])));
  return { kind: 'work', flexibility, gaps, terms, rows, notWritten: cellsInstead(ctx) };
}

/** Area of a unit moment diagram. */
function unitArea(redundant: Dimension): Dimension {
  const height = per(dimensions.moment, redundant);
  return { ...height, length: height.length + 1 };
}

function grouped<T>(
  items: readonly T[],
  dimensionOfItem: (item: T) => Dimension,
): { dimension: Dimension; items: T[] }[] {
  const groups = new Map<string, { dimension: Dimension; items: T[] }>();
  for (const item of items) {
    const dimension = dimensionOfItem(item);
    const key = JSON.stringify(dimension);
    const known = groups.get(key);
    if (known) known.items.push(item);
    else groups.set(key, { dimension, items: [item] });
  }
  return [...groups.values()];
}
