import type { ShapeRef } from '@/lib/figures/drawing';
import type { Block } from '@/templates/block';
import type { DeskStepKey } from './desk-step';

/** Steps of the written calculation, the same on every sheet, that each part of the form writes to. */
const written: Record<DeskStepKey, number> = {
  basis: 1,
  geometry: 2,
  supports: 2,
  loads: 2,
  combinations: 14,
  redundants: 4,
  results: 11,
  checks: 15,
};

/**
 * The line of the page that answers to what is in hand: in the step of the form, the figure of the load case, or the
 * first figure that shows the element; else the heading of the step.
 */
export function findLine(
  blocks: readonly Block[],
  step: DeskStepKey,
  element: ShapeRef | undefined,
  caseTitle: string | undefined,
): string | undefined {
  const lines = blocks.filter((b) => b.id === `${written[step]}` || b.id.startsWith(`${written[step]}.`));
  const figures = lines.filter((b) => b.kind === 'figure');
  if (step === 'loads' && caseTitle !== undefined) {
    const drawn = figures.find((b) => b.caption.startsWith(caseTitle));
    if (drawn) return drawn.id;
  }
  const shown =
    element && figures.find((b) => b.drawings.some((d) => d.shapes.some((s) => sameRef(s.ref, element))));
  return (shown ?? lines[0])?.id;
}

function sameRef(a: ShapeRef | undefined, b: ShapeRef): boolean {
  return a !== undefined && a.of === b.of && a.id === b.id;
}
