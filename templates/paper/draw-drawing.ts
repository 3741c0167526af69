import type { Drawing, LabelShape, Shape } from '@/lib/figures/drawing';
import { MATH_SCALE } from '@/lib/typeset/rich-line';
import { drawInk } from './draw-ink';
import { COLOURS } from './paper-look';
import type { PaperPen } from './paper-pen';
import { lineInk } from './set-words';

/** White ground around a label, points. */
const HALO = 1;

/** Draws a figure with its upper left corner at (x, y). A label's size is that of its mathematics. */
export function drawDrawing(drawing: Drawing, x: number, y: number, scale: number, pen: PaperPen): void {
  const { doc } = pen;
  doc.markContent('Span', { alt: drawing.alt });
  doc.save().transform(scale, 0, 0, scale, x, y);
  for (const shape of drawing.shapes) {
    if (shape.kind === 'label') drawLabel(shape, pen);
    else drawShape(shape, pen);
  }
  doc.restore();
  doc.endMarkedContent();
}

function drawShape(shape: Exclude<Shape, LabelShape>, { doc }: PaperPen): void {
  switch (shape.kind) {
    case 'line':
      doc.moveTo(shape.x1, shape.y1).lineTo(shape.x2, shape.y2);
      break;
    case 'circle':
      doc.circle(shape.cx, shape.cy, shape.r);
      break;
    case 'path':
      doc.path(shape.d);
      break;
    case 'poly':
      if (shape.closed) doc.polygon(...shape.points);
      else traceOpen(shape.points, doc);
  }
  const fill = shape.fill && COLOURS[shape.fill];
  const stroke = shape.stroke && COLOURS[shape.stroke];
  if (stroke) doc.lineWidth(shape.width ?? 1);
  if (stroke && shape.dash) doc.dash(shape.dash);
  if (fill && stroke) doc.fillAndStroke(fill, stroke);
  else if (fill) doc.fill(fill);
  else if (stroke) doc.stroke(stroke);
  else doc.addContent('n');
  if (stroke && shape.dash) doc.undash();
}

function traceOpen(points: readonly (readonly [number, number])[], doc: PaperPen['doc']): void {
  for (const [index, [x, y]] of points.entries()) {
    if (index === 0) doc.moveTo(x, y);
    else doc.lineTo(x, y);
  }
}

function drawLabel(label: LabelShape, pen: PaperPen): void {
  const line = pen.label(label.text, label.size / MATH_SCALE);
  if (!line) return;
  const { doc } = pen;
  const turn = ((label.turn ?? 0) * Math.PI) / 180;
  const [cos, sin] = [Math.cos(turn), Math.sin(turn)];
  const start = { start: 0, middle: -line.width / 2, end: -line.width }[label.anchor];
  doc.save().transform(cos, -sin, sin, cos, label.x, label.y);
  if (label.halo) {
    const height = line.height + line.depth + 2 * HALO;
    doc.rect(start - HALO, -line.height - HALO, line.width + 2 * HALO, height).fill(COLOURS.paper);
  }
  drawInk(lineInk(line, label.tone ?? 'ink', start, 0), pen);
  doc.restore();
}
