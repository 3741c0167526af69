import { describe, expect, it } from 'vitest';
import { drawDeflected } from '@/lib/figures/draw-deflected';
import { drawMechanism } from '@/lib/figures/draw-mechanism';
import { drawPrimary } from '@/lib/figures/draw-primary';
import type { Drawing } from '@/lib/figures/drawing';
import type { Mechanism } from '@/lib/model/refusal';
import { frame, joint, member, slopedPortal } from './sample-frames';

const linesOf = (drawing: Drawing, stroke: string) =>
  drawing.shapes.flatMap((s) => (s.kind === 'line' && s.stroke === stroke ? [s] : []));

describe('drawMechanism', () => {
  const phi = 0.05;
  /** Turning about joint 1: (−φy, φx). */
  const turning: Mechanism = {
    joints: Object.fromEntries(slopedPortal.joints.map((j) => [j.id, { x: -phi * j.y, y: phi * j.x }])),
    members: {},
    pieces: [{ members: ['1-2', '2-3', '3-4'], centre: { x: 0, y: 0, joint: '1' }, rotation: phi }],
  };
  const drawing = drawMechanism(slopedPortal, [{ kind: 'reaction', joint: '4', component: 'y' }], turning, {
    width: 300,
  });

  it('moves every joint square to its ray from the centre', () => {
    const rest = linesOf(drawing, 'ink3').find((l) => !l.dash);
    const moved = linesOf(drawing, 'ochre').filter((l) => l.ref);
    const column = moved.find((l) => l.ref?.id === '3-4');
    const first = moved.find((l) => l.ref?.id === '1-2');
    if (!rest || !column || !first) throw new Error('lines are missing');
    expect([first.x1, first.y1]).toEqual([rest.x1, rest.y1]);
    // Joint 4 lies level with the centre: it rises straight up; joint 2 above it moves straight to the left.
    const perFoot = Math.abs(rest.y2 - rest.y1) / 12;
    expect(column.x2).toBeCloseTo(rest.x1 + 40 * perFoot, 1);
    expect(column.y2).toBeLessThan(rest.y1 - 10);
    expect(first.x2).toBeLessThan(rest.x2 - 3);
    expect(first.y2).toBeCloseTo(rest.y2, 1);
  });

  it('shows the lines of action that meet in the centre', () => {
    const lines = linesOf(drawing, 'ochre').filter((l) => l.dash && l.dash.length === 4);
    expect(lines.some((l) => Math.abs(l.y1 - l.y2) < 0.01 && Math.abs(l.x2 - l.x1) > 100)).toBe(true);
    expect(lines.some((l) => Math.abs(l.x1 - l.x2) < 0.01)).toBe(true);
  });

  it('keeps its frame while it moves', () => {
    const still = drawMechanism(slopedPortal, [], turning, { width: 300, share: 0 });
    expect(still.width).toBe(drawing.width);
    expect(still.alt).toBe('Mechanism: 1-2, 2-3 and 3-4 turns about 1.');
  });
});

describe('drawDeflected', () => {
  const cantilever = frame({
    units: 'SI',
    joints: [joint('A', 0, 0, 'fixed'), joint('B', 3, 0)],
    members: [member('A', 'B')],
  });
  /** Tip load: v = −P s²(3l − s)/6EI, tip −P l³/3EI (AISC Manual, table 3-23, case 22, as recalled); here P/EI = 0.001. */
  const bent = {
    'A-B': {
      across: [{ from: 0, to: 3, c: [0, 0, -0.0015, 0.001 / 6] }],
      along: [{ from: 0, to: 3, c: [0] }],
    },
  };
  const drawing = drawDeflected(cantilever, bent, { width: 300 });

  it('states the factor it exaggerates by, and draws by it', () => {
    const note = drawing.shapes.find((s) => s.kind === 'label' && s.text.startsWith('displacements'));
    const factor = note?.kind === 'label' ? Number(/times ([\d.]+)/.exec(note.text)?.[1]) : 0;
    const rest = drawing.shapes.find((s) => s.kind === 'line' && s.dash);
    const path = drawing.shapes.find((s) => s.kind === 'path');
    if (rest?.kind !== 'line' || path?.kind !== 'path') throw new Error('shapes are missing');
    const n = (path.d.match(/-?[\d.]+/g) ?? []).map(Number);
    const perMetre = (rest.x2 - rest.x1) / 3;
    expect((n.at(-1) ?? 0) - rest.y2).toBeCloseTo(0.009 * factor * perMetre, 1);
  });

  it('writes the greatest displacement, P l³/3EI = 9 mm', () => {
    expect(drawing.shapes.some((s) => s.kind === 'label' && s.text === '$9.00\\unit{mm}$')).toBe(true);
    expect(drawing.alt).toContain('9.00 mm');
  });

  it('writes no value where EI0 is not known', () => {
    const shape = drawDeflected(cantilever, bent, { width: 300, timesEI0: true });
    expect(shape.shapes.some((s) => s.kind === 'label' && s.text.includes('mm'))).toBe(false);
    expect(shape.shapes.some((s) => s.kind === 'label' && s.text === 'shape only')).toBe(true);
  });
});

describe('drawPrimary', () => {
  it('takes the released support away and shows X in its positive sense', () => {
    const drawing = drawPrimary(slopedPortal, [{ kind: 'reaction', joint: '4', component: 'x' }], {
      width: 300,
    });
    const head = drawing.shapes.find((s) => s.kind === 'poly' && s.ref?.of === 'redundant');
    if (head?.kind !== 'poly') throw new Error('no arrow');
    const [tip = [0, 0], a = [0, 0]] = head.points;
    expect(tip[0]).toBeGreaterThan(a[0]);
    // The pin at 4 is a roller now: two wheels.
    const wheels = drawing.shapes.filter(
      (s) => s.kind === 'circle' && s.ref?.of === 'support' && s.ref.id === '4' && s.r === 1.7,
    );
    expect(wheels).toHaveLength(2);
    expect(drawing.alt).toContain('X1, the x reaction at 4');
  });

  it('puts a hinge in for a moment, with the pair that opens it downward', () => {
    const two = frame({
      units: 'SI',
      joints: [joint('A', 0, 0, 'pinned'), joint('B', 6, 0, 'roller'), joint('C', 12, 0, 'roller')],
      members: [member('A', 'B'), member('B', 'C')],
    });
    const drawing = drawPrimary(two, [{ kind: 'moment', member: 'A-B', end: 'end' }], { width: 300 });
    const heads = drawing.shapes.flatMap((s) => (s.kind === 'poly' && s.ref?.of === 'redundant' ? [s] : []));
    expect(heads).toHaveLength(2);
    // A positive moment stretches the underside: both arrows end below the beam.
    for (const { points } of heads) {
      const [tip = [0, 0], a = [0, 0], b = [0, 0]] = points;
      expect(tip[1]).toBeGreaterThan((a[1] + b[1]) / 2);
    }
  });
});
