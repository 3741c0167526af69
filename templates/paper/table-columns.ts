import { setAtoms } from '@/lib/typeset/set-atoms';
import { TypesetError } from '@/lib/typeset/typeset-error';
import type { Typesetter } from '@/lib/typeset/typesetter';
import type { TableBlock, TableRow } from '../block';
import { LOOKS, type TextLook } from './paper-look';

/** Places of a table's columns, points from the left edge of the text, and the type that lets them fit. */
export type TableColumns = {
  readonly columns: readonly { readonly x: number; readonly width: number }[];
  readonly width: number;
  readonly body: TextLook;
  readonly total: TextLook;
  readonly head: TextLook;
};

/** Least space between columns, and the most that a loose table spreads them by, points. */
const GAP = 10;
const SPREAD = 26;
/** Type of a table that is too wide for the page at full size. */
const SCALES = [1, 0.93, 0.86, 0.8];

type Extent = { least: number; natural: number };

/** Widths from what the cells hold: natural where there is room, else words wrap, else the type is set smaller. */
export function tableColumns(block: TableBlock, room: number, typesetter: Typesetter): TableColumns {
  for (const scale of SCALES) {
    const looks = {
      body: scaled(LOOKS.table, scale),
      total: scaled(LOOKS.tableTotal, scale),
      head: scaled(LOOKS.tableHead, scale),
    };
    const extents = block.columns.map((_, index) => extentOf(block, index, looks, typesetter));
    const widths = share(extents, room - GAP * (extents.length - 1));
    if (widths) return { ...looks, ...place(widths, room) };
  }
  throw new TypesetError('a table wider than the page', block.id);
}

function scaled(look: TextLook, scale: number): TextLook {
  return { ...look, size: look.size * scale, leading: look.leading * scale };
}

function extentOf(
  block: TableBlock,
  index: number,
  looks: { body: TextLook; total: TextLook; head: TextLook },
  typesetter: Typesetter,
): Extent {
  const column = block.columns[index];
  const texts: [string, TextLook][] = [[column?.head ?? '', looks.head]];
  if (column?.unit !== undefined) texts.push([`$${column.unit}$`, looks.head]);
  for (const row of block.rows) texts.push([cellText(row, index), isBold(row) ? looks.total : looks.body]);
  let least = 0;
  let natural = 0;
  for (const [text, look] of texts) {
    const atoms = setAtoms(text, look, Number.POSITIVE_INFINITY, typesetter);
    least = Math.max(least, ...atoms.map((atom) => atom.width));
    natural = Math.max(
      natural,
      atoms.reduce((sum, atom) => sum + atom.gap + atom.width, 0),
    );
  }
  return { least, natural };
}

/** Widths that fill no more than the room, or undefined when even the narrowest do not fit. */
function share(extents: readonly Extent[], room: number): number[] | undefined {
  const least = extents.reduce((sum, extent) => sum + extent.least, 0);
  const natural = extents.reduce((sum, extent) => sum + extent.natural, 0);
  if (least > room) return undefined;
  const part = natural <= room ? 1 : (room - least) / (natural - least);
  // A hundredth of a point more than measured, so that rounding never wraps a word.
  return extents.map((extent) => extent.least + part * (extent.natural - extent.least) + 0.01);
}

function place(widths: readonly number[], room: number) {
  const used = widths.reduce((sum, width) => sum + width, 0) + GAP * (widths.length - 1);
  const gaps = Math.max(1, widths.length - 1);
  const gap = GAP + Math.max(0, Math.min(SPREAD, (room - used) / gaps));
  let x = 0;
  const columns = widths.map((width) => {
    const own = { x, width };
    x += width + gap;
    return own;
  });
  return { columns, width: Math.min(room, x - gap) };
}

/** Whether a row stands out in bold. */
export function isBold({ emphasis }: TableRow): boolean {
  return emphasis === 'total' || emphasis === 'governing';
}

/** The rich text of a cell; numbers of a bold row are bold as its words are. */
export function cellText(row: TableRow, index: number): string {
  const cell = row.cells[index] ?? '';
  return cell === '' || !isBold(row) || cell.includes('**') ? cell : `**${cell}**`;
}
