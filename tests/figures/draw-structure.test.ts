import { describe, expect, it } from 'vitest';
import { drawStructure } from '@/lib/figures/draw-structure';
import type { Drawing, Shape } from '@/lib/figures/drawing';
import { drawingSchema } from '@/lib/figures/drawing';
import { corpus, frame, joint, longBeam, member, portalWithCanopy, slopedPortal } from './sample-frames';

type Line = Extract<Shape, { kind: 'line' }>;

const memberLine = (drawing: Drawing, id: string): Line => {
  const found = drawing.shapes.find((s) => s.kind === 'line' && s.ref?.of === 'member' && s.ref.id === id);
  if (found?.kind !== 'line') throw new Error(`no line for ${id}`);
  return found;
};
const texts = (drawing: Drawing) => drawing.shapes.flatMap((s) => (s.kind === 'label' ? [s.text] : []));
const ofSupport = (drawing: Drawing, id: string) =>
  drawing.shapes.filter((s) => s.ref?.of === 'support' && s.ref.id === id);

describe('drawStructure', () => {
  const drawing = drawStructure(portalWithCanopy, { width: 426 });

  it.each(Object.entries(corpus))('is a valid drawing: %s', (_, analysis) => {
    expect(() => drawingSchema.parse(drawStructure(analysis, { width: 300 }))).not.toThrow();
  });

  it('is to scale', () => {
    const [beam, column] = [memberLine(drawing, 'B-C'), memberLine(drawing, 'A-B')];
    const ratio = Math.abs(beam.x2 - beam.x1) / Math.abs(column.y2 - column.y1);
    expect(ratio).toBeCloseTo(7.2 / 4.2, 2);
  });

  it('shows the inner face on the right of the walk', () => {
    // A column walked up has its right on the right; a beam walked to the right has it below; a column walked down, left.
    const dashed = drawing.shapes.filter((s): s is Line => s.kind === 'line' && s.dash !== undefined);
    const column = memberLine(drawing, 'A-B');
    const right = memberLine(drawing, 'C-D');
    const beam = memberLine(drawing, 'B-C');
    const vertical = dashed.filter((s) => s.x1 === s.x2).map((s) => s.x1);
    const level = dashed.filter((s) => s.y1 === s.y2).map((s) => s.y1);
    expect(vertical.some((x) => x > column.x1 && x < column.x1 + 8)).toBe(true);
    expect(vertical.some((x) => x < right.x1 && x > right.x1 - 8)).toBe(true);
    expect(level.every((y) => y > beam.y1 && y < beam.y1 + 8)).toBe(true);
  });

  it('writes dimensions in the unit of the sheet', () => {
    expect(texts(drawing)).toEqual(expect.arrayContaining(['$7.20$', '$1.80$', '$4.20$']));
    expect(texts(drawStructure(slopedPortal, { width: 426 }))).toEqual(
      expect.arrayContaining(['$40.00$', '$12.00$', '$9.00$']),
    );
  });

  it('writes long runs of equal spans once', () => {
    const row = drawStructure(corpus.manySpans, { width: 426 });
    expect(texts(row).filter((t) => t.includes('3.00'))).toEqual(['$12\\times 3.00$']);
  });

  it('lets each shape be found by what it stands for', () => {
    for (const { id } of portalWithCanopy.members) expect(memberLine(drawing, id)).toBeDefined();
    expect(ofSupport(drawing, 'A').length).toBeGreaterThan(3);
    expect(ofSupport(drawing, 'B')).toEqual([]);
  });

  it('draws a pin as a triangle with its tip at the joint and the ground below', () => {
    const foot = memberLine(drawing, 'C-D');
    const triangle = ofSupport(drawing, 'D').find((s) => s.kind === 'poly' && s.closed);
    if (triangle?.kind !== 'poly') throw new Error('no triangle');
    expect(triangle.points[0]).toEqual([foot.x2, foot.y2]);
    expect(triangle.points.slice(1).every(([, y]) => y > foot.y2)).toBe(true);
  });

  it('turns a roller with its support', () => {
    const turned = frame({
      units: 'SI',
      joints: [joint('A', 0, 0, 'fixed'), joint('B', 6, 0, 'roller', 30)],
      members: [member('A', 'B')],
    });
    const shapes = ofSupport(drawStructure(turned, { width: 300 }), 'B');
    const triangle = shapes.find((s) => s.kind === 'poly' && s.closed);
    if (triangle?.kind !== 'poly') throw new Error('no triangle');
    const [, [ax, ay] = [0, 0], [bx, by] = [0, 0]] = triangle.points;
    // The ground of axes turned by 30° counter-clockwise rises to the right at 30°; y runs down on the page.
    expect(Math.atan2(Math.abs(by - ay), Math.abs(bx - ax))).toBeCloseTo(Math.PI / 6, 2);
    expect((by - ay) * (bx - ax)).toBeLessThan(0);
  });

  it('turns the wall of a fixed end against its only member', () => {
    const cantilever = frame({
      units: 'SI',
      joints: [joint('A', 0, 0, 'fixed'), joint('B', 3, 0)],
      members: [member('A', 'B')],
    });
    const wall = ofSupport(drawStructure(cantilever, { width: 300 }), 'A')[0];
    if (wall?.kind !== 'line') throw new Error('no wall');
    expect(wall.x1).toBeCloseTo(wall.x2, 6);
  });

  it('tells itself in words', () => {
    expect(drawing.alt).toContain('Frame of 4 members, 9 m wide and 4.2 m high');
    expect(drawing.alt).toContain('A is fixed and D is pinned');
    expect(drawStructure(longBeam, { width: 426 }).alt).toContain('Beam of 5 members, 30.5 m long');
  });

  it('is laid out anew for a narrow column, with labels of nearly the same size', () => {
    const narrow = drawStructure(portalWithCanopy, { width: 232 });
    expect(narrow.width).toBe(232);
    const size = (d: Drawing) => Math.max(...d.shapes.map((s) => (s.kind === 'label' ? s.size : 0)));
    expect(size(narrow) / size(drawing)).toBeGreaterThan(0.85);
  });
});
