import type { Dimension } from '@/lib/units/dimension';
import type { WorkRow } from '../force-method/work';
import { type Context, lengthValue, placedMember, pureValue } from './context';
import { dimensions, per } from './dimensions';
import { type Expression, negative, product, quotient, type Value } from './expression';
import { decimalsFor } from './figure-plan';
import { referenceValue } from './structure-step';
import type { SymbolName } from './symbol-name';

/** What the two states of a term are: how their symbols are marked, and what a unit state is per unit of. */
export interface TermStates {
  unit: (s: SymbolName) => SymbolName;
  /** Dimension of the redundant or unit load of the unit state. */
  perUnit: Dimension;
  other: (s: SymbolName) => SymbolName;
  /** Of the redundant of the other state when that is a unit state too. */
  perOther: Dimension;
  /** Tells stretches of one member apart in the lines of one sum. */
  stretch: string;
}

type OtherRow = Exclude<WorkRow, { kind: 'bending' }>;

/** EI0 times the unit force times the movement that goes with it. */
export function otherFormula(ctx: Context, row: OtherRow, states: TermStates): Expression {
  const EI0 = referenceValue(ctx.solution.reference.value ?? 1);
  const { names, figures } = ctx;
  const known = (symbol: SymbolName, value: number, dimension: Dimension, decimals: number): Value => ({
    kind: 'value',
    symbol,
    value,
    dimension,
    decimals,
  });
  const stiff = (letter: string, sub: readonly string[], value: number, dimension: Dimension) =>
    known({ letter, sub }, value, dimension, decimalsFor([value], 5, 0, 3));
  const unit = (s: SymbolName, value: number, own: Dimension = dimensions.force): Value => ({
    ...pureValue(value, figures.unitForce, states.unit(s)),
    dimension: per(own, states.perUnit),
  });
  const other = (s: SymbolName, value: number, own: Dimension = dimensions.force) =>
    known(
      states.other(s),
      value,
      per(own, states.perOther),
      own.length === 1 ? figures.moment : figures.force,
    );
  switch (row.kind) {
    case 'axial':
    case 'shear': {
      const sub = names.member(row.member);
      // N and V are means over the length; a length that is part of its member is named by its line.
      const whole = Math.abs(placedMember(ctx, row.member).L - row.length) <= 1e-9 * row.length;
      const mean = {
        letter: row.kind === 'axial' ? 'N' : 'V',
        sub: [...sub, ',', whole ? 'm' : states.stretch],
      };
      const under =
        row.kind === 'axial'
          ? stiff('EA', sub, row.EA, dimensions.force)
          : stiff('GA', [...sub, ',', 's'], row.GAs, dimensions.force);
      const own = whole ? names.length(row.member) : { letter: 'l', sub: [...sub, ',', states.stretch] };
      const length = lengthValue(ctx, own, row.length);
      return quotient(product(EI0, unit(mean, row.unit), other(mean, row.force), length), under);
    }
    case 'spring': {
      const r = names.reaction(row.joint, row.component);
      const own = row.component === 'turn' ? dimensions.moment : dimensions.force;
      const k = stiff(
        'k',
        r.sub ?? [],
        row.stiffness,
        row.component === 'turn' ? dimensions.moment : dimensions.spring,
      );
      return quotient(product(EI0, unit(r, row.unit, own), other(r, row.force, own)), k);
    }
    case 'temperature': {
      const sub = names.member(row.member);
      const alpha = known({ letter: 'α', sub }, row.alpha, per(dimensions.pure, dimensions.temperature), 9);
      const rise = known({ letter: 'T', sub }, row.rise, dimensions.temperature, 1);
      const length = lengthValue(ctx, names.length(row.member), row.length);
      return product(EI0, unit({ letter: 'N', sub }, row.unit), alpha, rise, length);
    }
    case 'gradient': {
      const sub = names.member(row.member);
      const own = { force: 1, length: 2, temperature: 0 };
      const area = { ...unit({ letter: 'A', sub }, row.area, own), decimals: 3 };
      return product(EI0, area, known({ letter: 'κ', sub }, row.curvature, dimensions.perLength, 7));
    }
    case 'misfit': {
      const sub = names.member(row.member);
      const d = known({ letter: 'd', sub }, row.misfit, dimensions.length, 4);
      return product(EI0, unit({ letter: 'N', sub }, row.unit), d);
    }
    case 'settlement': {
      const r = names.reaction(row.joint, row.component);
      const turn = row.component === 'turn';
      const own = turn ? dimensions.moment : dimensions.force;
      const movement = known(
        { letter: 'Δ', sub: r.sub },
        row.movement,
        turn ? dimensions.pure : dimensions.length,
        4,
      );
      return negative(product(EI0, unit(r, row.unit, own), movement));
    }
  }
}
