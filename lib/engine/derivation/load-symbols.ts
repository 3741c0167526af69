import type { Analysis, UnitSet } from '@/lib/model/analysis';
import type { Load } from '@/lib/model/load';
import type { Dimension } from '@/lib/units/dimension';
import { dimensions } from './dimensions';
import type { Value } from './expression';
import { exactDecimals } from './figure-plan';

/** One letter of the load table: its magnitude and which way it acts. Equal loads of a case share a letter. */
export interface LoadSymbol {
  case: string;
  value: Value;
  sense: Sense;
  /** The loads it stands for, by their place in the case. */
  loads: number[];
  /** Which number of the load it is: the only one, the end of a varying load, a component. */
  part: LoadPart;
}

export type LoadPart = 'only' | 'from' | 'to' | 'x' | 'y' | 'couple' | 'difference';
export type Sense =
  | 'down'
  | 'up'
  | 'right'
  | 'left'
  | 'across'
  | 'against'
  | 'along'
  | 'back'
  | 'anticlockwise'
  | 'clockwise'
  | 'warmer'
  | 'cooler'
  | 'long'
  | 'short';

interface Item {
  letter: string;
  value: number;
  dimension: Dimension;
  sense: [Sense, Sense];
  part: LoadPart;
}

const senses = {
  x: ['right', 'left'],
  y: ['up', 'down'],
  across: ['across', 'against'],
  along: ['along', 'back'],
  turn: ['anticlockwise', 'clockwise'],
} as const satisfies Record<string, readonly [Sense, Sense]>;

/** The letters of all loads of a sheet, in the order of its cases. Letters that occur once carry no number. */
export function nameLoads(analysis: Analysis): LoadSymbol[] {
  const found: LoadSymbol[] = [];
  for (const c of analysis.cases) {
    c.loads.forEach((load, index) => {
      for (const item of itemsOf(load, analysis)) add(found, c.id, index, item, analysis.units);
    });
  }
  const count = new Map<string, number>();
  for (const s of found) count.set(letterOf(s), (count.get(letterOf(s)) ?? 0) + 1);
  const used = new Map<string, number>();
  return found.map((s) => {
    const letter = letterOf(s);
    const n = (used.get(letter) ?? 0) + 1;
    used.set(letter, n);
    const sub = count.get(letter) === 1 ? undefined : [`${n}`];
    return { ...s, value: { ...s.value, symbol: { letter, sub } } };
  });
}

const letterOf = (s: LoadSymbol): string => s.value.symbol?.letter ?? '';

function add(found: LoadSymbol[], id: string, index: number, item: Item, units: UnitSet): void {
  const sense = item.sense[item.value < 0 ? 1 : 0];
  const value = Math.abs(item.value);
  const same = found.find(
    (s) =>
      s.case === id &&
      s.part === item.part &&
      s.sense === sense &&
      letterOf(s) === item.letter &&
      s.value.value === value,
  );
  if (same) {
    if (!same.loads.includes(index)) same.loads.push(index);
    return;
  }
  const small = item.dimension.length === 1 && item.dimension.force === 0;
  const scale = small ? (units === 'US' ? 12 : 1000) : undefined;
  const decimals = exactDecimals([value * (scale ?? 1)], item.dimension.force === 0 && !small ? 0 : 2, 6);
  const symbol = { letter: item.letter };
  found.push({
    case: id,
    value: { kind: 'value', symbol, value, dimension: item.dimension, decimals, scale },
    sense,
    loads: [index],
    part: item.part,
  });
}

function itemsOf(load: Load, analysis: Analysis): Item[] {
  const d = dimensions;
  switch (load.kind) {
    case 'distributed': {
      const end = (value: number, part: LoadPart): Item => ({
        letter: 'w',
        value,
        dimension: d.intensity,
        sense: [...senses[load.direction]],
        part,
      });
      if (load.w1 === load.w2) return [end(load.w1, 'only')];
      return [end(load.w1, 'from'), end(load.w2, 'to')].filter((i) => i.value !== 0);
    }
    case 'point':
      return [
        {
          letter: 'P',
          value: load.value,
          dimension: d.force,
          sense: [...senses[load.direction]],
          part: 'only',
        },
      ];
    case 'couple':
      return [{ letter: 'C', value: load.value, dimension: d.moment, sense: [...senses.turn], part: 'only' }];
    case 'joint': {
      const items: Item[] = [
        { letter: 'H', value: load.x, dimension: d.force, sense: [...senses.x], part: 'x' },
        { letter: 'P', value: load.y, dimension: d.force, sense: [...senses.y], part: 'y' },
        { letter: 'C', value: load.couple, dimension: d.moment, sense: [...senses.turn], part: 'couple' },
      ];
      return items.filter((i) => i.value !== 0);
    }
    case 'self-weight': {
      const named = analysis.members.filter(
        (m) => m.weight !== undefined && (load.members === undefined || load.members.includes(m.id)),
      );
      const weights = [...new Set(named.map((m) => m.weight ?? 0))];
      return weights.map((w) => ({
        letter: 'g',
        value: -w,
        dimension: d.intensity,
        sense: [...senses.y],
        part: 'only',
      }));
    }
    case 'temperature': {
      const items: Item[] = [
        {
          letter: 'T',
          value: load.rise,
          dimension: d.temperature,
          sense: ['warmer', 'cooler'],
          part: 'only',
        },
        {
          letter: 'ΔT',
          value: load.difference,
          dimension: d.temperature,
          sense: ['warmer', 'cooler'],
          part: 'difference',
        },
      ];
      return items.filter((i) => i.value !== 0);
    }
    case 'misfit':
      return [
        { letter: 'd', value: load.value, dimension: d.length, sense: ['long', 'short'], part: 'only' },
      ];
    case 'settlement': {
      const turn = load.component === 'turn';
      const sense = turn ? senses.turn : senses[load.component === 'x' ? 'x' : 'y'];
      return [
        {
          letter: 'Δ',
          value: load.value,
          dimension: turn ? d.pure : d.length,
          sense: [...sense],
          part: 'only',
        },
      ];
    }
  }
}
