import { addTurnArrow } from './add-arrows';
import type { Drawing } from './drawing';
import { type DrawOptions, sizeFor } from './fit-drawing';
import { estimateText } from './measure-text';
import type { LabelSpot } from './place-labels';
import { Sketch, type Style } from './sketch';
import type { Point } from './vector';

const ink: Style = { stroke: 'ink', width: 1.2 };
const half = 62;
const deep = 13;

/**
 * The sign convention: a piece of a member walked from left to right with N, V and M in their positive senses, the
 * dashed line on the side that a positive moment stretches, and the axes of the frame.
 */
export function drawSigns(options: Pick<DrawOptions, 'width' | 'size' | 'measure'>): Drawing {
  const sketch = new Sketch(options.measure ?? estimateText);
  const size = options.size ?? sizeFor(options.width);
  const label = (text: string, at: Point, toward: Point, gap = 2.5) => {
    const spots: [LabelSpot] = [{ at, toward, gap }];
    sketch.label({ text, size, rank: 1, spots });
  };
  sketch.poly(
    [
      { x: -half, y: -deep },
      { x: half, y: -deep },
      { x: half, y: deep },
      { x: -half, y: deep },
    ],
    true,
    {
      ...ink,
      fill: 'wash',
    },
  );
  sketch.line(
    { x: -half + 4, y: deep - 4 },
    { x: half - 4, y: deep - 4 },
    { stroke: 'ink3', width: 0.7, dash: [3, 2.2] },
  );
  sketch.arrow(
    { x: -half / 2, y: deep + 11 },
    { x: half / 2, y: deep + 11 },
    { stroke: 'ink3', width: 0.8 },
    5,
  );
  label('$s$', { x: half / 2, y: deep + 11 }, { x: 1, y: 0 });
  for (const side of [-1, 1]) {
    const face = side * (half + 5);
    const out = { x: side, y: 0 };
    sketch.arrow({ x: face, y: 0 }, { x: face + side * 24, y: 0 }, ink);
    label('$N$', { x: face + side * 24, y: 0 }, { x: side, y: -0.2 }, 2);
    // Left on the cut where it begins, V points up; at its end, down: V = dM/ds.
    const v = side * deep;
    sketch.arrow({ x: face, y: -v }, { x: face, y: v }, ink);
    label('$V$', { x: face, y: -deep }, { x: 0.3 * side, y: -1 }, 2);
    // A positive moment stretches the dashed side: on both ends the arrows run towards it.
    const from = side < 0 ? -Math.PI * 0.72 : -Math.PI * 0.28;
    const to = side < 0 ? -Math.PI * 1.28 : Math.PI * 0.28;
    addTurnArrow(sketch, { x: side * (half - 4), y: 0 }, 46, from, to, ink);
    label('$M$', { x: side * (half + 42), y: 0 }, out, 3);
  }
  const corner = { x: half + 100, y: deep + 4 };
  sketch.arrow(corner, { x: corner.x + 30, y: corner.y }, { ...ink, width: 1 }, 5);
  sketch.arrow(corner, { x: corner.x, y: corner.y - 30 }, { ...ink, width: 1 }, 5);
  label('$x$', { x: corner.x + 30, y: corner.y }, { x: 1, y: 0 });
  label('$y$', { x: corner.x, y: corner.y - 30 }, { x: 0, y: -1 });
  addTurnArrow(sketch, corner, 19, -0.2, -1.35, { ...ink, width: 1 });
  const alt =
    'Positive senses: N pulls, V turns the piece clockwise, M stretches the dashed side, the right of the walk. ' +
    'x runs right, y up, rotations and couples counter-clockwise.';
  return sketch.finish(options.width, { alt });
}
