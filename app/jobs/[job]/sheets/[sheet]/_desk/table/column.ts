import type { KindName } from '@/lib/units/kind';

/** One column of a cell table: what its cells are called, hold, and where in the row they are written. */
export interface Column<Row> {
  key: string;
  head: string;
  /** Rich head for the eye when the plain one is for the ear: "$w_1$". */
  unit?: string;
  width: string;
  align?: 'right';
  read: (row: Row) => string;
  write: (row: Row, text: string) => Row;
  /** Path of the field below the row ("first"), for errors. */
  field: string;
  kind?: KindName | ((row: Row) => KindName);
  options?:
    | readonly { value: string; label: string }[]
    | ((row: Row) => readonly { value: string; label: string }[]);
  /** Cells that mean nothing for a row are left out of its reach. */
  used?: (row: Row) => boolean;
  /** Shown, never typed: the name of a row that is given. */
  fixed?: boolean;
  /** Length that L stands for in this row's arithmetic. */
  L?: (row: Row) => number | undefined;
}

export function optionsOf<Row>(column: Column<Row>, row: Row) {
  return typeof column.options === 'function' ? column.options(row) : column.options;
}

export function kindOf<Row>(column: Column<Row>, row: Row): KindName | undefined {
  return typeof column.kind === 'function' ? column.kind(row) : column.kind;
}
