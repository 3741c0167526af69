import { type Quantity, quantityKey } from '@/lib/model/quantity';
import { type Context, redundantSymbol } from './context';
import { dimensionOf, per } from './dimensions';
import { type EndForces, endForcesOf } from './end-forces';
import type { Value } from './expression';
import { cellsInstead, type NotWritten, tooLong } from './not-written';
import { usedLines } from './primary-step';
import { writeSteps } from './statics';
import type { StaticsStep } from './statics-equation';
import { inUnitState, type SymbolName } from './symbol-name';

/** One unit state: X_i = 1 on the primary structure, nothing else. */
export interface UnitState {
  index: number;
  symbol: SymbolName;
  quantity: Quantity;
  steps: StaticsStep[];
  reactions: Value[];
  ends: EndForces[];
}

/** States whose statics are written out, on sheets with so many redundants; the others have their results in tables. */
const most = { states: 3, redundants: 12 };

/** Step 7: the unit-load structures. Moments per unit of X: a length for a force, a pure number for a moment. */
export interface UnitStatesStep {
  kind: 'units';
  states: UnitState[];
  /** Why there are no states, or why their statics stands in tables. */
  notWritten?: NotWritten;
}

export function deriveUnitStates(ctx: Context): UnitStatesStep {
  const { solution } = ctx;
  const released = new Set(solution.redundants.map(quantityKey));
  const states = solution.primary.units.map((state, index): UnitState => {
    const quantity = solution.redundants[index];
    if (!quantity) throw new Error(`no redundant ${index}`);
    const written = index < most.states && solution.redundants.length <= most.redundants;
    return {
      index,
      symbol: redundantSymbol(index),
      quantity,
      steps: written ? writeSteps(ctx, usedLines(state.lines), { kind: 'unit', index }) : [],
      reactions: state.reactions
        .filter((r) => !released.has(quantityKey(r.quantity)))
        .map((r) => ({
          kind: 'value',
          symbol: inUnitState(ctx.names.quantity(r.quantity), index),
          value: Math.abs(r.value) < 1e-13 ? 0 : r.value,
          dimension: per(dimensionOf(r.quantity), dimensionOf(quantity)),
          decimals: ctx.figures.unitForce,
        })),
      ends: endForcesOf(ctx, state.members),
    };
  });
  const many = solution.redundants.length > most.redundants;
  return { kind: 'units', states, notWritten: cellsInstead(ctx) ?? (many ? tooLong(ctx) : undefined) };
}
