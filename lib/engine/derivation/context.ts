import type { Analysis } from '@/lib/model/analysis';
import type { Solution } from '../solution';
import { ArmNames } from './arm-names';
import { dimensions } from './dimensions';
import type { EndForces } from './end-forces';
import type { Value } from './expression';
import { exactDecimals, type FigurePlan, planFigures } from './figure-plan';
import { type Placed, placeMembers } from './geometry';
import { type LoadPart, type LoadSymbol, nameLoads } from './load-symbols';
import { type Names, nameQuantities } from './names';
import type { SolutionStep } from './solution-step';
import type { SymbolName } from './symbol-name';

/** What every step of one derivation reads. */
export interface Context {
  solution: Solution;
  analysis: Analysis;
  placed: ReadonlyMap<string, Placed>;
  names: Names;
  loads: readonly LoadSymbol[];
  figures: FigurePlan;
  arms: ArmNames;
  /** End forces of the states met so far, by their diagrams. */
  ends: WeakMap<object, EndForces[]>;
  /** Step 10, worked out with the figures it asks for. */
  solved?: SolutionStep;
}

export function contextOf(solution: Solution): Context {
  const { analysis } = solution;
  const placed = placeMembers(analysis);
  const names = nameQuantities(analysis, placed);
  const figures = planFigures(solution);
  const arms = new ArmNames(figures.length);
  return {
    solution,
    analysis,
    placed,
    names,
    loads: nameLoads(analysis),
    figures,
    arms,
    ends: new WeakMap(),
  };
}

export function placedMember(ctx: Context, id: string): Placed {
  const found = ctx.placed.get(id);
  if (!found) throw new Error(`there is no member ${id}`);
  return found;
}

/** A length of the structure, printed as it was given where that takes no more than five decimals. */
export function lengthValue(ctx: Context, symbol: SymbolName | undefined, value: number): Value {
  const { length } = ctx.figures;
  const exact = exactDecimals([value], length, 5);
  const decimals = exact < 5 ? exact : length;
  return { kind: 'value', symbol, value, dimension: dimensions.length, decimals };
}

/** A load of a case by its place in it. */
export function loadAt(ctx: Context, id: string, index: number) {
  const load = ctx.analysis.cases.find((c) => c.id === id)?.loads[index];
  if (!load) throw new Error(`case ${id} has no load ${index}`);
  return load;
}

/** Magnitude of a load as the load table has it. */
export function loadValue(ctx: Context, id: string, index: number, part?: LoadPart, size?: number): Value {
  const found = ctx.loads.find(
    (l) =>
      l.case === id &&
      l.loads.includes(index) &&
      (part === undefined || l.part === part) &&
      (size === undefined || Math.abs(l.value.value - size) <= 1e-9 * size),
  );
  if (!found) throw new Error(`load ${index} of case ${id} has no such part`);
  return found.value;
}

/** A pure number without a symbol, as a factor. */
export const pureValue = (value: number, decimals: number, symbol?: SymbolName): Value => ({
  kind: 'value',
  symbol,
  value,
  dimension: dimensions.pure,
  decimals,
});

/** The symbol of a redundant: X_1, X_2 … in the order of the solution. */
export const redundantSymbol = (i: number): SymbolName => ({ letter: 'X', sub: [`${i + 1}`] });
