import type { UnitSet } from '@/lib/model/analysis';
import type { Load, LoadCase } from '@/lib/model/load';
import { list, say } from './describe-structure';

const force = { US: 'kip', SI: 'kN' };
const length = { US: 'ft', SI: 'm' };
const degree = { US: '°F', SI: 'K' };

/** The loads of a case in words. */
export function describeLoads({ id, loads }: LoadCase, units: UnitSet): string {
  if (loads.length === 0) return `Case ${id}: no loads.`;
  return `Case ${id}: ${list(loads.map((l) => describeLoad(l, units)))}.`;
}

const senses = {
  x: ['to the left', 'to the right'],
  y: ['down', 'up'],
  along: ['against the walk', 'along the walk'],
  across: ['from left to right of the walk', 'from right to left of the walk'],
} as const;

function describeLoad(load: Load, units: UnitSet): string {
  const [f, l] = [force[units], length[units]];
  const sense = (direction: keyof typeof senses, v: number) => senses[direction][v < 0 ? 0 : 1];
  const size = (v: number) => say(Math.abs(v));
  switch (load.kind) {
    case 'point':
      return `${size(load.value)} ${f} ${sense(load.direction, load.value)} on ${load.member} at ${say(load.at)} ${l}`;
    case 'couple':
      return `couple ${size(load.value)} ${f}·${l} ${turning(load.value)} on ${load.member} at ${say(load.at)} ${l}`;
    case 'distributed': {
      const value = load.w1 === load.w2 ? size(load.w1) : `${say(load.w1)} to ${say(load.w2)}`;
      return `${value} ${f}/${l} ${sense(load.direction, load.w1 + load.w2)} on ${load.member}`;
    }
    case 'joint': {
      const parts = [
        ...(load.x === 0 ? [] : [`${size(load.x)} ${f} ${sense('x', load.x)}`]),
        ...(load.y === 0 ? [] : [`${size(load.y)} ${f} ${sense('y', load.y)}`]),
        ...(load.couple === 0 ? [] : [`couple ${size(load.couple)} ${f}·${l} ${turning(load.couple)}`]),
      ];
      return `${list(parts)} at joint ${load.joint}`;
    }
    case 'self-weight':
      return `own weight of ${load.members ? list(load.members) : 'the members'}`;
    case 'temperature':
      return `${load.member} warmed by ${say(load.rise)} ${degree[units]}, faces ${say(load.difference)} ${degree[units]} apart`;
    case 'misfit':
      return `${load.member} made ${size(load.value)} ${l} too ${load.value > 0 ? 'long' : 'short'}`;
    case 'settlement':
      return `support ${load.joint} moves by ${say(load.value)} in its ${load.component} component`;
  }
}

const turning = (v: number): string => (v > 0 ? 'counter-clockwise' : 'clockwise');
