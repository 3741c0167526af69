import { describe, expect, it } from 'vitest';
import { drawLoads } from '@/lib/figures/draw-loads';
import { drawPrimary } from '@/lib/figures/draw-primary';
import { drawStructure } from '@/lib/figures/draw-structure';
import type { Drawing, LabelShape, Shape } from '@/lib/figures/drawing';
import { estimateText } from '@/lib/figures/measure-text';
import { corpus, frame, joint, member } from './sample-frames';

interface Box {
  left: number;
  top: number;
  right: number;
  bottom: number;
}

const widths = [426, 300, 232, 140];
const rounding = 0.03;

const drawings: [string, Drawing][] = Object.entries(corpus).flatMap(([name, analysis]) =>
  widths.flatMap((width): [string, Drawing][] => [
    [`${name}, ${width} pt`, drawStructure(analysis, { width })],
    ...analysis.cases.map((c): [string, Drawing] => [
      `${name} case ${c.id}, ${width} pt`,
      drawLoads(analysis, c, { width }),
    ]),
    [
      `primary of ${name}, ${width} pt`,
      drawPrimary(analysis, [{ kind: 'moment', member: analysis.members[1]?.id ?? '', end: 'start' }], {
        width,
      }),
    ],
  ]),
);

const labelsOf = (drawing: Drawing): LabelShape[] => drawing.shapes.filter((s) => s.kind === 'label');

function boxOf(label: LabelShape): Box {
  const { width, height, depth } = estimateText(label.text, label.size);
  if (label.turn) {
    return {
      left: label.x - height,
      right: label.x + depth,
      top: label.y - width / 2,
      bottom: label.y + width / 2,
    };
  }
  const left = label.x - { start: 0, middle: width / 2, end: width }[label.anchor];
  return { left, right: left + width, top: label.y - height, bottom: label.y + depth };
}

const overlap = (a: Box, b: Box): boolean =>
  a.left < b.right - rounding &&
  b.left < a.right - rounding &&
  a.top < b.bottom - rounding &&
  b.top < a.bottom - rounding;

/** Whether a line crosses a box (Liang and Barsky, 1984). */
function crosses(x1: number, y1: number, x2: number, y2: number, box: Box): boolean {
  let [t0, t1] = [0, 1];
  for (const [p, q] of [
    [x1 - x2, x1 - box.left - rounding],
    [x2 - x1, box.right - rounding - x1],
    [y1 - y2, y1 - box.top - rounding],
    [y2 - y1, box.bottom - rounding - y1],
  ] as const) {
    if (p === 0 && q < 0) return false;
    if (p < 0) t0 = Math.max(t0, q / p);
    if (p > 0) t1 = Math.min(t1, q / p);
  }
  return t0 < t1;
}

const sameRef = (a: Shape, b: Shape): boolean => !!a.ref && a.ref.of === b.ref?.of && a.ref.id === b.ref?.id;

describe('labels in drawings', () => {
  it.each(drawings)('no two labels overlap: %s', (_, drawing) => {
    const boxes = labelsOf(drawing).map((label) => ({ label, box: boxOf(label) }));
    const clashes = boxes.flatMap(({ label, box }, i) =>
      boxes
        .slice(i + 1)
        .flatMap((other) => (overlap(box, other.box) ? [`${label.text} on ${other.label.text}`] : [])),
    );
    expect(clashes).toEqual([]);
  });

  it.each(drawings)('no load label covers the shafts of its own load: %s', (_, drawing) => {
    const covered = labelsOf(drawing)
      .filter((label) => label.ref?.of === 'load' && label.text.startsWith('$'))
      .flatMap((label) =>
        drawing.shapes.flatMap((shape) =>
          shape.kind === 'poly' &&
          !shape.closed &&
          sameRef(shape, label) &&
          runCrosses(shape.points, boxOf(label))
            ? [label.text]
            : [],
        ),
      );
    expect(covered).toEqual([]);
  });

  it.each(drawings)('everything lies inside the drawing: %s', (_, drawing) => {
    for (const label of labelsOf(drawing)) {
      const box = boxOf(label);
      expect(box.left).toBeGreaterThanOrEqual(-rounding);
      expect(box.top).toBeGreaterThanOrEqual(-rounding);
      expect(box.right).toBeLessThanOrEqual(drawing.width + rounding);
      expect(box.bottom).toBeLessThanOrEqual(drawing.height + rounding);
    }
  });

  it.each(drawings.filter(([name]) => !name.includes('140')))(
    'keeps the width it is given: %s',
    (name, drawing) => {
      expect(drawing.width).toBeCloseTo(Number(/(\d+) pt$/.exec(name)?.[1]), 1);
    },
  );
});

function runCrosses(points: readonly (readonly [number, number])[], box: Box): boolean {
  return points.slice(1).some(([x, y], i) => {
    const [x0, y0] = points[i] ?? [x, y];
    return crosses(x0, y0, x, y, box);
  });
}

describe('a structure too dense for its labels', () => {
  const bays = 12;
  const dense = frame({
    units: 'SI',
    joints: Array.from({ length: bays * bays }, (_, i) =>
      joint(`${i}`, (i % bays) * 6, Math.floor(i / bays) * 3.5, i < bays ? 'fixed' : undefined),
    ),
    members: Array.from({ length: bays * bays }, (_, i) => [
      i % bays < bays - 1 ? [i, i + 1] : [],
      [i, i + bays],
    ])
      .flat()
      .flatMap(([a, b]) =>
        a !== undefined && b !== undefined && b < bays * bays ? [member(`${a}`, `${b}`)] : [],
      ),
  });

  it('is drawn without those that would stand far off, and says how many', () => {
    const drawing = drawStructure(dense, { width: 300 });
    const told = labelsOf(drawing).find((l) => l.text.includes('no room here'));
    const names = labelsOf(drawing).filter((l) => l.ref?.of === 'joint').length;
    expect(names).toBeLessThan(bays * bays);
    expect(told?.text).toContain(`${bays * bays - names} labels have no room here`);
    expect(drawing.alt).toContain('no room here');
    expect(drawing.width).toBe(300);
  });

  it.each(drawings)('is none of these: %s', (_, drawing) => {
    expect(drawing.alt).not.toContain('no room');
  });
});
