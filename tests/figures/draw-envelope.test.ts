import { describe, expect, it } from 'vitest';
import type { Envelope, Extreme } from '@/lib/engine/solution';
import { drawEnvelope } from '@/lib/figures/draw-envelope';
import { drawInfluence } from '@/lib/figures/draw-influence';
import { drawSigns } from '@/lib/figures/draw-signs';
import { drawStructure } from '@/lib/figures/draw-structure';
import type { Drawing } from '@/lib/figures/drawing';
import { frame, joint, member } from './sample-frames';

const span = frame({
  units: 'SI',
  joints: [joint('A', 0, 0, 'pinned'), joint('B', 8, 0, 'roller')],
  members: [member('A', 'B')],
});
const labels = (drawing: Drawing) =>
  drawing.shapes.flatMap((s) => (s.kind === 'label' && /\d/.test(s.text) ? [s.text] : []));

describe('drawEnvelope', () => {
  const bounds = (max: number, min: number): Extreme => ({ max, maxBy: '1', min, minBy: '2' });
  const at = (s: number, max: number, min: number) => ({
    s,
    N: bounds(0, 0),
    V: bounds(0, 0),
    M: bounds(max, min),
  });
  const envelope: Envelope = {
    member: 'A-B',
    purpose: 'strength',
    stations: [at(0, 0, -5), at(4, 60, 20), at(8, 0, -30)],
  };
  const drawing = drawEnvelope(span, [envelope], { which: 'M', width: 426 });

  it('draws both bounds and signs their peaks', () => {
    expect(drawing.shapes.filter((s) => s.kind === 'path' && s.stroke === 'ink')).toHaveLength(2);
    expect(labels(drawing)).toEqual(expect.arrayContaining(['$+60.00$', '$+20.00$', '$-5.00$', '$-30.00$']));
  });
});

describe('drawInfluence', () => {
  it('draws a positive ordinate above the beam', () => {
    // Reaction of A of a simple span: 1 − s/l.
    const line = { 'A-B': [{ from: 0, to: 8, c: [1, -0.125] }] };
    const drawing = drawInfluence(span, line, { of: 'reaction at A', width: 426 });
    const path = drawing.shapes.find((s) => s.kind === 'path' && s.stroke === 'ink');
    if (path?.kind !== 'path') throw new Error('no line');
    const [, y0 = 0, , y1 = 0] = (path.d.match(/-?[\d.]+/g) ?? []).map(Number);
    expect(y1).toBeLessThan(y0 - 20);
    expect(labels(drawing)).toEqual(['$+1.000$']);
    expect(drawing.alt).toContain('reaction at A');
  });
});

describe('drawSigns', () => {
  it('names N, V and M on both ends, and the axes', () => {
    const names = drawSigns({ width: 426 }).shapes.flatMap((s) => (s.kind === 'label' ? [s.text] : []));
    expect(names.toSorted()).toEqual(['$M$', '$M$', '$N$', '$N$', '$V$', '$V$', '$s$', '$x$', '$y$']);
  });

  it('turns both moments towards the dashed side', () => {
    const { shapes } = drawSigns({ width: 426 });
    const dashed = shapes.find((s) => s.kind === 'line' && s.dash);
    if (dashed?.kind !== 'line') throw new Error('no dashes');
    const heads = shapes.flatMap((s) =>
      s.kind === 'poly' && s.closed && s.points.length === 3 ? [s.points] : [],
    );
    const low = heads.filter(
      ([tip = [0, 0], a = [0, 0], b = [0, 0]]) => tip[1] > dashed.y1 + 10 && tip[1] > Math.max(a[1], b[1]),
    );
    expect(low).toHaveLength(2);
  });
});

describe('text beside members', () => {
  it('stands on the inner side', () => {
    const drawing = drawStructure(span, { width: 426, show: { memberText: (m) => `$${m.EI}\\,EI_0$` } });
    const beam = drawing.shapes.find((s) => s.kind === 'line' && s.ref?.of === 'member');
    const text = drawing.shapes.find((s) => s.kind === 'label' && s.text.includes('EI_0'));
    if (beam?.kind !== 'line' || text?.kind !== 'label') throw new Error('shapes are missing');
    expect(text.y).toBeGreaterThan(beam.y1 + 8);
  });
});
