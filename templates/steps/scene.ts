import { type FigurePlan, planFigures } from '@/lib/engine/derivation/figure-plan';
import { type Placed, placeMembers } from '@/lib/engine/derivation/geometry';
import { type Names, nameQuantities } from '@/lib/engine/derivation/names';
import type { Solution } from '@/lib/engine/solution';
import type { Analysis, UnitSet } from '@/lib/model/analysis';

/** What the words of a sheet are about. */
export interface Scene {
  solution: Solution;
  analysis: Analysis;
  units: UnitSet;
  placed: ReadonlyMap<string, Placed>;
  names: Names;
  /** Decimals by kind of number. */
  plan: FigurePlan;
  /** Drawings are made; a page that is written on every keystroke may leave them to later. */
  figures: boolean;
  /** Assumptions and references in the engineer's own words. */
  basis?: string;
}

export function sceneOf(solution: Solution, options: { figures: boolean; basis?: string }): Scene {
  const { analysis } = solution;
  const placed = placeMembers(analysis);
  const names = nameQuantities(analysis, placed);
  return {
    solution,
    analysis,
    units: analysis.units,
    placed,
    names,
    plan: planFigures(solution),
    ...options,
  };
}

/** Widths of drawings, points: across the text of a page, and for the column of a phone. */
export const wide = 450;
export const narrow = 320;

/** Cases stand side by side in a table up to this many; more make a second table. */
const abreast = 6;

/** A list in runs that fit side by side. */
export function runsOf<T>(list: readonly T[], most = abreast): T[][] {
  const runs: T[][] = [];
  for (let i = 0; i < list.length; i += most) runs.push(list.slice(i, i + most));
  return runs;
}
