import { describe, expect, it } from 'vitest';
import type { PiecewisePolynomial } from '@/lib/engine/diagrams/piecewise-polynomial';
import { drawDiagram } from '@/lib/figures/draw-diagram';
import type { Drawing } from '@/lib/figures/drawing';
import { arcsOf, rootsInside, valueOn } from '@/lib/figures/polynomial-curve';
import { frame, joint, member } from './sample-frames';

const none: PiecewisePolynomial = [{ from: 0, to: 8, c: [0] }];
const simple = frame({
  units: 'SI',
  joints: [joint('A', 0, 0, 'pinned'), joint('B', 8, 0, 'roller')],
  members: [member('A', 'B')],
});
/** Uniform load w on a simple span l: M = w s (l − s)/2, greatest w l²/8 (AISC Manual, table 3-23, case 1, as recalled). */
const uniform = (w: number, l: number): PiecewisePolynomial => [
  { from: 0, to: l, c: [0, (w * l) / 2, -w / 2] },
];
const shear = (w: number, l: number): PiecewisePolynomial => [{ from: 0, to: l, c: [(w * l) / 2, -w] }];

const labels = (drawing: Drawing) =>
  drawing.shapes.flatMap((s) => (s.kind === 'label' && /[+-]?\d/.test(s.text) ? [s.text] : []));

function outlineOf(drawing: Drawing): [number, number][] {
  const path = drawing.shapes.find((s) => s.kind === 'path' && s.stroke === 'ink');
  if (path?.kind !== 'path') throw new Error('no outline');
  const n = (path.d.match(/-?[\d.]+/g) ?? []).map(Number);
  return Array.from({ length: n.length / 2 }, (_, i) => [n[2 * i] ?? 0, n[2 * i + 1] ?? 0]);
}

describe('drawDiagram', () => {
  const moments = drawDiagram(
    simple,
    { 'A-B': { N: none, V: shear(6, 8), M: uniform(6, 8) } },
    { which: 'M', width: 426 },
  );

  it('draws a sagging moment below the beam, on the side that is stretched', () => {
    const points = outlineOf(moments);
    const axis = points[0]?.[1] ?? 0;
    expect(Math.max(...points.map(([, y]) => y))).toBeGreaterThan(axis + 20);
    expect(Math.min(...points.map(([, y]) => y))).toBeCloseTo(axis, 1);
  });

  it('draws a positive shear on the left of the walk', () => {
    const points = outlineOf(
      drawDiagram(
        simple,
        { 'A-B': { N: none, V: shear(6, 8), M: uniform(6, 8) } },
        { which: 'V', width: 426 },
      ),
    );
    expect(points[1]?.[1]).toBeLessThan((points[0]?.[1] ?? 0) - 20);
  });

  it('draws the tension of a column on its stretched face', () => {
    const column = frame({
      units: 'SI',
      joints: [joint('A', 0, 0, 'fixed'), joint('B', 0, 4)],
      members: [member('A', 'B')],
    });
    // Walked up, a positive moment stretches the right face.
    const M: PiecewisePolynomial = [{ from: 0, to: 4, c: [10, -2.5] }];
    const points = outlineOf(
      drawDiagram(column, { 'A-B': { N: none, V: none, M } }, { which: 'M', width: 200 }),
    );
    expect(points[1]?.[0]).toBeGreaterThan((points[0]?.[0] ?? 0) + 15);
  });

  it('signs every value and tells the greatest, w l²/8 = 48', () => {
    expect(labels(moments)).toEqual(['$+48.00$']);
    expect(
      labels(
        drawDiagram(simple, { 'A-B': { N: none, V: shear(6, 8), M: none } }, { which: 'V', width: 426 }),
      ),
    ).toEqual(expect.arrayContaining(['$+24.00$', '$-24.00$']));
  });

  it('tells both sides of a jump', () => {
    const V: PiecewisePolynomial = [
      { from: 0, to: 3, c: [10] },
      { from: 3, to: 8, c: [-6] },
    ];
    expect(
      labels(drawDiagram(simple, { 'A-B': { N: none, V, M: none } }, { which: 'V', width: 426 })),
    ).toEqual(expect.arrayContaining(['$+10.00$', '$-6.00$']));
  });

  it('tells the peak under a point load', () => {
    const M: PiecewisePolynomial = [
      { from: 0, to: 3, c: [0, 10] },
      { from: 3, to: 8, c: [30, -6] },
    ];
    expect(
      labels(drawDiagram(simple, { 'A-B': { N: none, V: none, M } }, { which: 'M', width: 426 })),
    ).toEqual(['$+30.00$']);
  });

  it('tells a smooth peak that lies where two pieces meet', () => {
    const M: PiecewisePolynomial = [
      { from: 0, to: 4, c: [0, 24, -3] },
      { from: 4, to: 8, c: [48, 0, -3] },
    ];
    const drawing = drawDiagram(simple, { 'A-B': { N: none, V: none, M } }, { which: 'M', width: 426 });
    expect(labels(drawing)).toEqual(['$+48.00$']);
  });

  it('marks where the moment passes through zero', () => {
    // Fixed at both ends: M = −w l²/12 + w l s/2 − w s²/2, zero at 0.2113 l (AISC Manual, table 3-23, case 15, as recalled).
    const M: PiecewisePolynomial = [{ from: 0, to: 8, c: [-32, 24, -3] }];
    const drawing = drawDiagram(simple, { 'A-B': { N: none, V: none, M } }, { which: 'M', width: 426 });
    const beam = drawing.shapes.find((s) => s.kind === 'line' && s.ref?.of === 'member');
    if (beam?.kind !== 'line') throw new Error('no beam');
    const dots = drawing.shapes.flatMap((s) =>
      s.kind === 'circle' && s.fill === 'ink' && s.r === 1.5 ? [s.cx] : [],
    );
    const shares = dots.map((x) => (x - beam.x1) / (beam.x2 - beam.x1));
    expect(shares).toHaveLength(2);
    expect(shares[0]).toBeCloseTo(0.2113, 3);
    expect(shares[1]).toBeCloseTo(0.7887, 3);
  });

  it('writes the one moment of a corner once', () => {
    const corner = frame({
      units: 'SI',
      joints: [joint('A', 0, 0, 'fixed'), joint('B', 0, 4), joint('C', 5, 4)],
      members: [member('A', 'B'), member('B', 'C')],
    });
    const drawing = drawDiagram(
      corner,
      {
        'A-B': { N: none, V: none, M: [{ from: 0, to: 4, c: [0, -5] }] },
        'B-C': { N: none, V: none, M: [{ from: 0, to: 5, c: [-20, 4] }] },
      },
      { which: 'M', width: 300 },
    );
    expect(labels(drawing).filter((t) => t === '$-20.00$')).toHaveLength(1);
  });

  it('tells itself in words', () => {
    expect(moments.alt).toBe('Bending moment in kN·m: A-B 48 at 4 from A.');
  });
});

describe('curves of polynomials', () => {
  it('are exact up to the third power', () => {
    const piece = { from: 1, to: 4, c: [2, -3, 0.5, 0.7] };
    const [arc] = arcsOf(piece);
    const [a, b, c, d] = arc?.ordinates ?? [0, 0, 0, 0];
    for (const t of [0, 0.2, 0.5, 0.9, 1]) {
      const bezier = (1 - t) ** 3 * a + 3 * t * (1 - t) ** 2 * b + 3 * t * t * (1 - t) * c + t ** 3 * d;
      expect(bezier).toBeCloseTo(valueOn(piece, 1 + 3 * t), 12);
    }
  });

  it('keep to a fifth power within a thousandth of its greatest value', () => {
    const piece = { from: 0, to: 2, c: [0, 1, 0, -3, 0, 1.1] };
    for (const { from, to, ordinates } of arcsOf(piece)) {
      const [a, b, c, d] = ordinates;
      for (const t of [0.25, 0.5, 0.75]) {
        const bezier = (1 - t) ** 3 * a + 3 * t * (1 - t) ** 2 * b + 3 * t * t * (1 - t) * c + t ** 3 * d;
        expect(Math.abs(bezier - valueOn(piece, from + (to - from) * t))).toBeLessThan(0.0135);
      }
    }
  });

  it('find every sign change', () => {
    // (s − 1)(s − 2)(s − 3) = s³ − 6s² + 11s − 6
    const roots = rootsInside({ from: 0, to: 4, c: [-6, 11, -6, 1] });
    expect(roots.map((r) => Math.round(r * 1e9) / 1e9)).toEqual([1, 2, 3]);
  });
});
