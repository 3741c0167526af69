import { describe, expect, it } from 'vitest';
import { solve } from '@/lib/engine/solve';
import { drawDeflected } from '@/lib/figures/draw-deflected';
import { drawDiagram } from '@/lib/figures/draw-diagram';
import { drawMomentParts } from '@/lib/figures/draw-moment-parts';
import { drawPrimary } from '@/lib/figures/draw-primary';
import { drawUnit } from '@/lib/figures/draw-unit';
import type { Drawing } from '@/lib/figures/drawing';
import { frame, joint, member } from './sample-frames';

/** Two equal spans under a uniform load: moment −w l²/8 over the middle support (three-moment equation, Clapeyron 1857). */
const twoSpans = frame({
  units: 'SI',
  basis: { kind: 'relative', EI0: 20_000 },
  joints: [joint('A', 0, 0, 'pinned'), joint('B', 8, 0, 'roller'), joint('C', 16, 0, 'roller')],
  members: [member('A', 'B'), member('B', 'C')],
  cases: [
    {
      id: 'G',
      title: 'Dead',
      nature: 'dead',
      loads: ['A-B', 'B-C'].map((id) => ({
        kind: 'distributed' as const,
        member: id,
        direction: 'across',
        w1: -10,
        w2: -10,
      })),
    },
  ],
});

const outcome = solve(twoSpans);
if (!outcome.ok) throw new Error(outcome.refusal.message);
const solution = outcome.value;
const result = solution.cases.G;
if (!result) throw new Error('no case');
const values = (drawing: Drawing) =>
  drawing.shapes.flatMap((s) =>
    s.kind === 'label' && /[\d]/.test(s.text) ? [s.text.replaceAll('$', '')] : [],
  );

describe('drawings of a solved beam', () => {
  it('tell the support moment −w l²/8 = −80 and the field moments 9 w l²/128 = 45', () => {
    const told = values(drawDiagram(twoSpans, result.members, { which: 'M', width: 426 }));
    expect(told.toSorted()).toEqual(['+45.00', '+45.00', '-80.00']);
  });

  it('tell the shears 3 w l/8 = 30 and 5 w l/8 = 50', () => {
    const told = values(drawDiagram(twoSpans, result.members, { which: 'V', width: 426 }));
    expect(told.toSorted()).toEqual(['+30.00', '+50.00', '-30.00', '-50.00']);
  });

  it('show each unit state with its own X and no reaction of nought', () => {
    solution.primary.units.forEach((state, i) => {
      const told = values(drawUnit(twoSpans, solution.redundants, i, state, { width: 300 }));
      expect(told).toContain(`X_{${i + 1}}=1`);
      expect(told).not.toContain('0');
    });
  });

  it('show the loaded primary structure and its parts', () => {
    const loadCase = twoSpans.cases[0];
    const state = solution.primary.loaded.G;
    if (!loadCase || !state) throw new Error('no case');
    const primary = drawPrimary(twoSpans, solution.redundants, {
      width: 300,
      loadCase,
      reactions: state.reactions,
    });
    expect(values(primary)).toContain('10.00\\unit{kN/m}');
    const parts = drawMomentParts(twoSpans, solution.work.parts.G ?? [], { width: 300 });
    // Simple spans: w l²/8 = 80.
    expect(parts.flatMap(values)).toEqual(['+80.00', '+80.00']);
  });

  it('tell the greatest deflection, w l⁴/185 EI', () => {
    // 0.00541612 w l⁴/EI at 0.4215 l of a span fixed at one end (AISC Manual, table 3-23, case 12, as recalled): 11.09 mm.
    const told = values(drawDeflected(twoSpans, result.members, { width: 426 }));
    expect(told.some((t) => t === '11.1\\unit{mm}')).toBe(true);
  });
});
