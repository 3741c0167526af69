import { type Column, optionsOf } from './column';

/** A block of cells as spreadsheets put it on the clipboard: rows by line ends, cells by tabs. */
export function readBlock(text: string): string[][] {
  const lines = text.replace(/\r\n?/g, '\n').replace(/\n$/, '').split('\n');
  return lines.map((line) => line.split('\t'));
}

/**
 * The rows with a block written over them, its corner at (row, column); rows that are missing are made
 * where rows may be added. Cells that a choice does not know by value or label stay as they were.
 */
export function pasteBlock<Row>(
  rows: readonly Row[],
  columns: readonly Column<Row>[],
  corner: { row: number; column: number },
  block: readonly (readonly string[])[],
  blank: (() => Row) | undefined,
): Row[] {
  const next = [...rows];
  while (blank && next.length < corner.row + block.length) next.push(blank());
  block.forEach((cells, i) => {
    let row = next[corner.row + i];
    if (row === undefined) return;
    cells.forEach((cell, k) => {
      const column = columns[corner.column + k];
      if (column) row = writeCell(column, row as Row, cell.trim());
    });
    next[corner.row + i] = row;
  });
  return next;
}

function writeCell<Row>(column: Column<Row>, row: Row, text: string): Row {
  const options = optionsOf(column, row);
  if (!options) return column.write(row, text);
  const found = options.find((o) => o.value === text || o.label.toLowerCase() === text.toLowerCase());
  return found ? column.write(row, found.value) : row;
}

/** The cell above, written into the cell at (row, column). */
export function fillDown<Row>(rows: readonly Row[], column: Column<Row>, at: number): Row[] {
  const above = rows[at - 1];
  return rows.map((row, i) => (i === at && above ? column.write(row, column.read(above)) : row));
}
