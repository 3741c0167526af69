import type { Dimension } from './dimension';
import { units } from './unit';

export type UnitSetName = 'US' | 'SI';

/** What a field holds: its dimension, the unit a bare number is read in, and an example for messages. */
export interface Kind {
  noun: string;
  dimension: Dimension;
  /** Typed unit of a bare number and of what the field shows. */
  unit: Record<UnitSetName, string>;
  example: Record<UnitSetName, string>;
}

const d = (force: number, length: number, temperature = 0): Dimension => ({ force, length, temperature });
const kind = (
  noun: string,
  dimension: Dimension,
  us: string,
  si: string,
  usEx: string,
  siEx: string,
): Kind => ({
  noun,
  dimension,
  unit: { US: us, SI: si },
  example: { US: usEx, SI: siEx },
});

export const kinds = {
  length: kind('length', d(0, 1), 'ft', 'm', `12'-6"`, '7.20 m'),
  sectionLength: kind('section dimension', d(0, 1), 'in', 'mm', '8.25 in', '210 mm'),
  movement: kind('movement', d(0, 1), 'in', 'mm', '0.25 in', '10 mm'),
  force: kind('force', d(1, 0), 'kip', 'kN', '12 kip', '45 kN'),
  distributed: kind('force per length', d(1, -1), 'kip/ft', 'kN/m', '2.4 kip/ft', '18 kN/m'),
  couple: kind('couple', d(1, 1), 'kip*ft', 'kN*m', '20 kip*ft', '30 kN*m'),
  modulus: kind('modulus of elasticity', d(1, -2), 'ksi', 'GPa', '29000 ksi', '210 GPa'),
  inertia: kind('second moment of area', d(0, 4), 'in^4', 'cm^4', '510 in^4', '8360 cm^4'),
  area: kind('area', d(0, 2), 'in^2', 'cm^2', '10.3 in^2', '53.8 cm^2'),
  bendingStiffness: kind(
    'bending stiffness EI',
    d(1, 2),
    'kip*ft^2',
    'kN*m^2',
    '41000 kip*ft^2',
    '17600 kN*m^2',
  ),
  spring: kind('spring stiffness', d(1, -1), 'kip/ft', 'kN/m', '120 kip/ft', '1500 kN/m'),
  turnSpring: kind('rotational spring stiffness', d(1, 1), 'kip*ft', 'kN*m', '900 kip*ft', '1200 kN*m'),
  temperature: kind('temperature difference', d(0, 0, 1), 'degF', 'K', '40 degF', '25 K'),
  expansion: kind('coefficient of expansion', d(0, 0, -1), '1/degF', '1/K', '6.5e-6', '12e-6'),
  angle: kind('angle', d(0, 0), 'deg', 'deg', '30', '30'),
  rotation: kind('rotation', d(0, 0), 'rad', 'rad', '0.002', '0.002'),
  number: kind('number', d(0, 0), '', '', '2.5', '2.5'),
} as const satisfies Record<string, Kind>;

export type KindName = keyof typeof kinds;

const coherent: Record<UnitSetName, { force: number; length: number; temperature: number }> = {
  US: { force: factorOf('kip'), length: factorOf('ft'), temperature: factorOf('degF') },
  SI: { force: factorOf('kN'), length: factorOf('m'), temperature: factorOf('K') },
};

/** How many newton, metre, kelvin make one coherent unit (kip, ft, °F or kN, m, K) of a dimension. */
export function coherentFactor(dimension: Dimension, set: UnitSetName): number {
  const base = coherent[set];
  return (
    base.force ** dimension.force *
    base.length ** dimension.length *
    base.temperature ** dimension.temperature
  );
}

function factorOf(name: string): number {
  const found = units[name];
  if (!found) throw new Error(`no unit named ${name}`);
  return found.factor;
}
