import type { Typesetter } from '@/lib/typeset/typesetter';
import type { FigureBlock } from '../block';
import type { Ink } from './ink';
import type { PageGeometry } from './page-geometry';
import { LOOKS, MM } from './paper-look';
import { setLines } from './set-words';
import { plainStrip, stackLines } from './stack-lines';
import type { Strip } from './strip';

const GAP = 4 * MM;
/** Drawings are shrunk to fit the page, never below this: their labels would grow too small to read. */
const LEAST_SCALE = 0.6;

/**
 * Drawings side by side at one scale with their caption, in one strip: a figure is never split. A row that would be
 * shrunk too far is set in several rows. `mostHeight` is the room of an empty page.
 */
export function setFigure(
  block: FigureBlock,
  page: PageGeometry,
  mostHeight: number,
  typesetter: Typesetter,
): Strip {
  const caption = setLines(block.caption, LOOKS.caption, 'ink2', page.textWidth, typesetter);
  const captionHeight = 1.4 * MM + caption.reduce((sum, line) => sum + line.height, 0);
  const rows = rowsOf(block, page.textWidth);
  const heights = rows.map(
    ({ drawings, scale }) => scale * Math.max(...drawings.map(({ height }) => height)),
  );
  const natural = heights.reduce((sum, height) => sum + height, 0) + GAP * (rows.length - 1);
  const fit = Math.min(1, (mostHeight - captionHeight) / natural);
  const ink: Ink[] = [];
  let y = 0.5 * MM;
  rows.forEach(({ drawings, scale }, index) => {
    let x = 0;
    for (const drawing of drawings) {
      ink.push({ kind: 'drawing', x, y, scale: scale * fit, drawing });
      x += drawing.width * scale * fit + GAP;
    }
    y += (heights[index] ?? 0) * fit + (index < rows.length - 1 ? GAP : 0);
  });
  const words = stackLines(caption, 0, y + 1.4 * MM);
  return plainStrip(block.id, y + 1.4 * MM + words.height, [...ink, ...words.ink]);
}

type Row = { drawings: FigureBlock['drawings']; scale: number };

function rowsOf({ drawings }: FigureBlock, room: number): Row[] {
  const scaleOf = (list: FigureBlock['drawings']) => {
    const natural = list.reduce((sum, drawing) => sum + drawing.width, 0);
    return Math.min(1, (room - GAP * (list.length - 1)) / natural);
  };
  const rows: Row[] = [];
  for (const drawing of drawings) {
    const last = rows.at(-1);
    const joined = last ? [...last.drawings, drawing] : [drawing];
    const scale = scaleOf(joined);
    if (last && scale >= LEAST_SCALE) rows[rows.length - 1] = { drawings: joined, scale };
    else rows.push({ drawings: [drawing], scale: scaleOf([drawing]) });
  }
  return rows;
}
