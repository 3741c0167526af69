import type { Box } from '@/lib/typeset/box';
import { em } from '@/lib/typeset/katex-tree';
import type { Mark } from '@/lib/typeset/laid';
import { stretchPicture } from '@/lib/typeset/stretch-picture';

const FRAME_THICKNESS = 0.04;

/** Shares of the width that the three parts of a brace and the two of a double arrow fill (katex.css). */
const PARTS: readonly (readonly [string, number, number])[] = [
  ['brace-left', 0, 0.251],
  ['brace-center', 0.25, 0.5],
  ['brace-right', 0.749, 0.251],
  ['halfarrow-left', 0, 0.502],
  ['halfarrow-right', 0.498, 0.502],
];

/** Writes the marks of a measured box whose baseline starts at (x, y). `room` is the width that 100 % means. */
export function placeBox(box: Box, x: number, y: number, room: number, out: Mark[]): void {
  switch (box.kind) {
    case 'symbol':
      placeSymbol(box, x + box.shiftX, y + box.shiftY, out);
      return;
    case 'row':
      placeRow(box, x + box.shiftX, y + box.shiftY, room, out);
      return;
    case 'stack':
      placeStack(box, x + box.shiftX, y, out);
      return;
    case 'line':
      out.push({ kind: 'rule', x, y, width: room, height: box.thickness, colour: box.colour });
      return;
    case 'rule':
      out.push({
        kind: 'rule',
        x: x + box.shiftX,
        y: y + box.shiftY,
        width: box.ruleWidth,
        height: box.ruleHeight,
        colour: box.colour,
      });
      return;
    case 'stretch':
      placeStretch(box, x, y, Math.max(room, box.minWidth), out);
      return;
    case 'picture':
      stretchPicture(box, { x, y, width: room, height: em(box.node.attributes?.height) * box.size }, out);
  }
}

function placeSymbol(box: Extract<Box, { kind: 'symbol' }>, x: number, y: number, out: Mark[]): void {
  for (const { face, glyph, x: offset } of box.glyphs) {
    out.push({
      kind: 'glyphs',
      face,
      size: box.size,
      x: x + offset,
      y,
      glyphs: [glyph],
      advances: [glyph.advance],
      colour: box.colour,
    });
  }
}

function placeRow(box: Extract<Box, { kind: 'row' }>, x: number, y: number, room: number, out: Mark[]): void {
  let at = x;
  for (const child of box.children) {
    if (child.kind === 'picture') {
      const height = box.fixedHeight ?? em(child.node.attributes?.height) * child.size;
      stretchPicture(child, { x: at, y, width: box.fixedWidth ?? room, height }, out);
    } else placeBox(child, at, y, box.children.length === 1 ? room : child.width, out);
    at += child.width;
  }
}

function placeStack(box: Extract<Box, { kind: 'stack' }>, x: number, y: number, out: Mark[]): void {
  for (const row of box.rows) {
    const left = x + row.marginLeft;
    const room = box.inner - row.marginLeft - row.marginRight;
    const free = room - row.width;
    let at = left + (row.align === 'centre' ? free / 2 : row.align === 'right' ? free : 0);
    for (const child of row.boxes) {
      if (fills(child)) placeBox(child, left, y + row.y, room, out);
      else {
        placeBox(child, at, y + row.y, child.width, out);
        at += child.width;
      }
    }
  }
}

/** Whether a box takes its width from the stack it stands in. */
function fills(box: Box): boolean {
  if (box.kind === 'line' || box.kind === 'stretch' || box.kind === 'picture') return true;
  return (
    box.kind === 'row' && box.width === 0 && box.children.length === 1 && box.children[0]?.kind === 'picture'
  );
}

function placeStretch(
  box: Extract<Box, { kind: 'stretch' }>,
  x: number,
  y: number,
  width: number,
  out: Mark[],
): void {
  const { height, size, colour } = box;
  if (box.frame) {
    out.push({ kind: 'frame', x, y, width, height, thickness: FRAME_THICKNESS * size, colour });
    return;
  }
  for (const part of box.parts) {
    const share = PARTS.find(([name]) => part.classes?.includes(name));
    const node = share ? part.children?.[0] : part;
    if (!node) continue;
    const [, from, of] = share ?? ['', 0, 1];
    stretchPicture({ node, size, colour }, { x: x + width * from, y, width: width * of, height }, out);
  }
}
