/** Exponents of force, length and temperature difference; angles and counts are pure numbers. */
export interface Dimension {
  force: number;
  length: number;
  temperature: number;
}

export const pure: Dimension = { force: 0, length: 0, temperature: 0 };

export function sameDimension(a: Dimension, b: Dimension): boolean {
  return a.force === b.force && a.length === b.length && a.temperature === b.temperature;
}

/** a · b^power, by adding exponents. */
export function combineDimensions(a: Dimension, b: Dimension, power: number): Dimension {
  return {
    force: a.force + power * b.force,
    length: a.length + power * b.length,
    temperature: a.temperature + power * b.temperature,
  };
}

const names: [Dimension, string][] = [
  [pure, 'a pure number'],
  [{ force: 1, length: 0, temperature: 0 }, 'a force'],
  [{ force: 0, length: 1, temperature: 0 }, 'a length'],
  [{ force: 0, length: 2, temperature: 0 }, 'an area'],
  [{ force: 0, length: 3, temperature: 0 }, 'a volume or section modulus'],
  [{ force: 0, length: 4, temperature: 0 }, 'a second moment of area'],
  [{ force: 1, length: -1, temperature: 0 }, 'a force per length'],
  [{ force: 1, length: -2, temperature: 0 }, 'a stress or a force per area'],
  [{ force: 1, length: -3, temperature: 0 }, 'a weight per volume'],
  [{ force: 1, length: 1, temperature: 0 }, 'a couple or moment'],
  [{ force: 1, length: 2, temperature: 0 }, 'a bending stiffness'],
  [{ force: 0, length: 0, temperature: 1 }, 'a temperature difference'],
  [{ force: 0, length: 0, temperature: -1 }, 'a coefficient of expansion'],
];

/** The dimension in the trade's words: "a force per length". */
export function describeDimension(d: Dimension): string {
  return names.find(([known]) => sameDimension(known, d))?.[1] ?? 'none of the kinds a sheet uses';
}
