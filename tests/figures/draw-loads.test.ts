import { describe, expect, it } from 'vitest';
import { drawLoads } from '@/lib/figures/draw-loads';
import type { Drawing, Shape } from '@/lib/figures/drawing';
import type { LoadCase } from '@/lib/model/load';
import { loadCase } from '@/lib/model/load';
import { corpus, frame, joint, longBeam, member, portalWithCanopy, slopedPortal } from './sample-frames';

const caseOf = (analysis: { cases: LoadCase[] }, id: string): LoadCase => {
  const found = analysis.cases.find((c) => c.id === id);
  if (!found) throw new Error(`no case ${id}`);
  return found;
};
const ofLoad = (drawing: Drawing, id: string): Shape[] =>
  drawing.shapes.filter((s) => s.ref?.of === 'load' && s.ref.id === id);
const texts = (drawing: Drawing) => drawing.shapes.flatMap((s) => (s.kind === 'label' ? [s.text] : []));
/** Arrowheads as [tip, middle of the back]. */
const heads = (shapes: Shape[]) =>
  shapes.flatMap((s) => {
    if (s.kind !== 'poly' || !s.closed || s.points.length !== 3) return [];
    const [tip = [0, 0], a = [0, 0], b = [0, 0]] = s.points;
    return [{ tip, back: [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2] as const }];
  });

const beam = (loads: unknown[]) => ({
  structure: frame({
    units: 'SI',
    joints: [joint('A', 0, 0, 'pinned'), joint('B', 6, 0, 'roller')],
    members: [member('A', 'B', { weight: 0.5 })],
  }),
  acting: loadCase.parse({ id: 'P', title: '', nature: 'live', loads }),
});

describe('drawLoads', () => {
  it('points the arrows the way the load acts, whichever side that is', () => {
    for (const [value, sense] of [
      [-5, 1],
      [5, -1],
    ] as const) {
      const { structure, acting } = beam([
        { kind: 'distributed', member: 'A-B', direction: 'y', w1: value, w2: value },
      ]);
      const arrows = heads(ofLoad(drawLoads(structure, acting, { width: 426 }), 'P:0'));
      expect(arrows.length).toBeGreaterThan(5);
      for (const { tip, back } of arrows) expect(Math.sign(tip[1] - back[1])).toBe(sense);
    }
  });

  it('draws a load that grows along its member as a wedge', () => {
    const { structure, acting } = beam([
      { kind: 'distributed', member: 'A-B', direction: 'y', w1: -2, w2: -8 },
    ]);
    const outline = ofLoad(drawLoads(structure, acting, { width: 426 }), 'P:0').find(
      (s) => s.kind === 'poly' && !s.closed,
    );
    if (outline?.kind !== 'poly') throw new Error('no outline');
    const [a = [0, 0], topA = [0, 0], topB = [0, 0], b = [0, 0]] = outline.points;
    expect(b[1] - topB[1]).toBeGreaterThan(1.5 * (a[1] - topA[1]));
  });

  it('writes every value with its unit', () => {
    expect(texts(drawLoads(slopedPortal, caseOf(slopedPortal, 'D'), { width: 426 }))).toEqual(
      expect.arrayContaining(['$0.60\\unit{kip/ft}$', '$5.00\\unit{kip}$']),
    );
    expect(texts(drawLoads(longBeam, caseOf(longBeam, 'Q'), { width: 426 }))).toEqual(
      expect.arrayContaining([
        '$25.00\\unit{kN\\per m}$',
        '$15.00\\unit{kN/m}$',
        'own weight $1.20\\unit{kN/m}$',
      ]),
    );
  });

  it('writes movements in inches or millimetres', () => {
    // 0.02 ft = 0.24 in.
    expect(texts(drawLoads(slopedPortal, caseOf(slopedPortal, 'T'), { width: 426 }))).toContain(
      '$\\Delta=0.24\\unit{in}$',
    );
  });

  it('writes a load that goes on over several members once', () => {
    const written = texts(drawLoads(portalWithCanopy, caseOf(portalWithCanopy, 'D'), { width: 426 }));
    expect(written.filter((t) => t.startsWith('$5.40'))).toHaveLength(1);
  });

  it('stands a second load on the first', () => {
    const { structure, acting } = beam([
      { kind: 'distributed', member: 'A-B', direction: 'y', w1: -5, w2: -5 },
      { kind: 'distributed', member: 'A-B', direction: 'y', w1: -2, w2: -2 },
    ]);
    const drawing = drawLoads(structure, acting, { width: 426 });
    const highest = (id: string) => Math.min(...heads(ofLoad(drawing, id)).map(({ tip }) => tip[1]));
    expect(highest('P:1')).toBeLessThan(highest('P:0') - 20);
  });

  it('gives places of loads a chain of their own', () => {
    const written = texts(drawLoads(slopedPortal, caseOf(slopedPortal, 'D'), { width: 426 }));
    // 14.35 ft of slope on a member of 41 ft over 40 ft of plan: 14.00 ft of plan.
    expect(written).toEqual(expect.arrayContaining(['$14.00$', '$26.00$', '$40.00$']));
  });

  it('turns a couple counter-clockwise when it is positive', () => {
    const sweep = (value: number) => {
      const { structure, acting } = beam([{ kind: 'couple', member: 'A-B', at: 3, value }]);
      const shapes = ofLoad(drawLoads(structure, acting, { width: 426 }), 'P:0');
      const arc = shapes.find((s) => s.kind === 'path');
      if (arc?.kind !== 'path') throw new Error('no arc');
      const n = (arc.d.match(/-?[\d.]+/g) ?? []).map(Number);
      const points = [0, 6, 12].map((i) => [n[i] ?? 0, n[i + 1] ?? 0] as const);
      const [a, b, c] = points as [
        readonly [number, number],
        readonly [number, number],
        readonly [number, number],
      ];
      return Math.sign((b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]));
    };
    // On a page with y down a negative cross product is a counter-clockwise turn.
    expect(sweep(10)).toBe(-1);
    expect(sweep(-10)).toBe(1);
  });

  it.each(Object.entries(corpus))('tells the loads in words: %s', (_, analysis) => {
    for (const c of analysis.cases) {
      const { alt } = drawLoads(analysis, c, { width: 300 });
      expect(alt).toContain(`Case ${c.id}:`);
      expect(alt).not.toMatch(/undefined|NaN|\\/);
    }
  });
});
