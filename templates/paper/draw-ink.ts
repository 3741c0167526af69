import { drawDrawing } from './draw-drawing';
import type { Ink } from './ink';
import { COLOURS } from './paper-look';
import type { PaperPen } from './paper-pen';

/** Draws a page's ink in its order. */
export function drawInk(ink: readonly Ink[], pen: PaperPen): void {
  for (const mark of ink) drawMark(mark, pen);
}

function drawMark(mark: Ink, pen: PaperPen): void {
  const { doc } = pen;
  switch (mark.kind) {
    case 'words':
      pen.words(mark.shaped, mark.x, mark.y, mark.size, COLOURS[mark.tone], mark.tracking, mark.space);
      return;
    case 'math':
      pen.math(mark.laid, mark.tex, mark.x, mark.y, mark.size, COLOURS[mark.tone]);
      return;
    case 'line':
      doc.lineWidth(mark.width).moveTo(mark.x1, mark.y1).lineTo(mark.x2, mark.y2);
      if (mark.dash) doc.dash(mark.dash);
      doc.stroke(COLOURS[mark.tone]);
      if (mark.dash) doc.undash();
      return;
    case 'fill':
      doc.rect(mark.x, mark.y, mark.width, mark.height).fill(COLOURS[mark.tone]);
      return;
    case 'stroke':
      doc.save().transform(1, 0, 0, 1, mark.x, mark.y).lineWidth(mark.width);
      if (mark.dash) doc.dash(mark.dash);
      doc.path(mark.d).stroke(COLOURS[mark.tone]).restore();
      return;
    case 'drawing':
      drawDrawing(mark.drawing, mark.x, mark.y, mark.scale, pen);
      return;
    case 'link':
      doc.goTo(mark.x, mark.y, mark.width, mark.height, mark.to);
  }
}
