import type { Typesetter } from '@/lib/typeset/typesetter';
import type { TableBlock } from '../block';
import { type Ink, moved } from './ink';
import type { PageGeometry } from './page-geometry';
import { baseline, LOOKS, MM, type PaperTone, type TextLook } from './paper-look';
import { setLines, wordInk } from './set-words';
import { lineStrips, plainStrip, stackLines } from './stack-lines';
import type { Strip } from './strip';
import { cellText, isBold, type TableColumns, tableColumns } from './table-columns';

const CELL = 0.82 * MM;

/** A table as strips, one a row: none is split, the head comes again on each page that the table goes on to. */
export function setTable(block: TableBlock, page: PageGeometry, typesetter: Typesetter): Strip[] {
  const { id, caption, rows, note } = block;
  const strips: Strip[] = [];
  if (caption !== undefined) {
    const lines = setLines(caption, LOOKS.text, 'ink', page.textWidth, typesetter);
    strips.push(...lineStrips(id, lines, true).map((strip) => ({ ...strip, keep: true })));
  }
  const table = tableColumns(block, page.textWidth, typesetter);
  const head = setHead(block, table, typesetter);
  strips.push({ ...head, keep: true });
  const again = headAgain(head, id, page, typesetter);
  rows.forEach((row, index) => {
    const next = rows[index + 1];
    const keep =
      row.emphasis === 'group' || next?.emphasis === 'total' || (index === rows.length - 1 && !!note);
    const strip = setRow(block, index, table, typesetter);
    strips.push({ ...strip, keep, head: index === 0 ? undefined : again });
  });
  if (note !== undefined) {
    const { ink, height } = stackLines(
      setLines(note, LOOKS.caption, 'ink2', page.textWidth, typesetter),
      0,
      0.8 * MM,
    );
    strips.push(plainStrip(id, height + 0.8 * MM, ink));
  }
  return strips;
}

function setHead({ columns, id }: TableBlock, table: TableColumns, typesetter: Typesetter): Strip {
  const cells = columns.map(({ head, unit, align }, index) => {
    const place = table.columns[index] ?? { x: 0, width: 0 };
    const texts = unit === undefined ? [head] : [head, `$${unit}$`];
    const lines = texts.flatMap((text) => setLines(text, table.head, 'ink2', place.width, typesetter, align));
    return { x: place.x, ...stackLines(lines) };
  });
  const tallest = Math.max(...cells.map((cell) => cell.height));
  const ink = cells.flatMap((cell) =>
    cell.ink.map((mark) => moved(mark, cell.x, 0.5 * MM + tallest - cell.height)),
  );
  const bottom = 0.5 * MM + tallest + 0.6 * MM;
  ink.push(across(bottom, table.width, 0.3 * MM, 'ink'));
  return plainStrip(id, bottom, ink);
}

/** The head once more, with "continued" and the number in the margin. */
function headAgain(head: Strip, id: string, page: PageGeometry, typesetter: Typesetter): Strip {
  const right = page.marginRight - page.textLeft;
  const first = baseline(LOOKS.number);
  const ink: Ink[] = [
    wordInk(id, LOOKS.number, 'ink', { x: right, y: first, side: 'right' }, typesetter),
    wordInk('continued', LOOKS.source, 'ink2', { x: right, y: first + 10, side: 'right' }, typesetter),
  ];
  return { ...head, ink: [...head.ink, ...ink], keep: true, noteHeight: first + 13 };
}

function setRow(block: TableBlock, index: number, table: TableColumns, typesetter: Typesetter): Strip {
  const row = block.rows[index];
  const total = row?.emphasis === 'total';
  if (!row) throw new RangeError(`Table ${block.id} has no row ${index}.`);
  const look: TextLook = isBold(row) ? table.total : table.body;
  const cells = row.cells.map((_, at) => {
    const place = table.columns[at] ?? { x: 0, width: 0 };
    const align = block.columns[at]?.align ?? 'left';
    const lines = setLines(cellText(row, at), look, 'ink', place.width, typesetter, align);
    return { x: place.x, lines };
  });
  const first = Math.max(...cells.map(({ lines }) => firstBaseline(lines[0]?.ink ?? [])));
  const ink: Ink[] = [];
  let height = 0;
  for (const { x, lines } of cells) {
    const shift = CELL + first - firstBaseline(lines[0]?.ink ?? []);
    const set = stackLines(lines);
    ink.push(...set.ink.map((mark) => moved(mark, x, shift)));
    height = Math.max(height, shift + set.height);
  }
  height += CELL;
  const followed = block.rows[index + 1]?.emphasis;
  if (total) ink.push(across(0, table.width, 0.2 * MM, 'ink2'));
  if (!total && followed !== 'total')
    ink.push(across(height, table.width, 0.2 * MM, followed === 'group' ? 'line2' : 'hairline'));
  return plainStrip(block.id, height, ink);
}

function firstBaseline(ink: readonly Ink[]): number {
  const mark = ink.find((item) => item.kind === 'words' || item.kind === 'math');
  return mark && 'y' in mark ? mark.y : 0;
}

function across(y: number, width: number, thickness: number, tone: PaperTone): Ink {
  return { kind: 'line', x1: 0, y1: y, x2: width, y2: y, width: thickness, tone };
}
