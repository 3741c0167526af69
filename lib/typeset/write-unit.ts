import type { UnitSet } from '@/lib/model/analysis';
import type { Dimension } from '@/lib/units/dimension';

const names = {
  US: { force: 'kip', length: 'ft', small: 'in' },
  SI: { force: 'kN', length: 'm', small: 'mm' },
};

/**
 * The unit of a dimension for `\unit{…}`: `kip\per ft^2`, `kN/m`, `/m`. Empty for pure numbers. `small` writes lengths
 * in inches or millimetres.
 */
export function unitTex(dimension: Dimension, units: UnitSet, small = false): string {
  const { force, length, temperature } = dimension;
  const name = names[units];
  const powers: [string, number][] = [
    [name.force, force],
    [small ? name.small : name.length, length],
    [units === 'US' ? '{}^\\circ F' : 'K', temperature],
  ];
  const raised = ([unit, p]: [string, number]) => (Math.abs(p) === 1 ? unit : `${unit}^${Math.abs(p)}`);
  const above = powers.filter(([, p]) => p > 0).map(raised);
  const below = powers.filter(([, p]) => p < 0).map(raised);
  const denominator = below.length > 1 ? `/(${below.join('\\per ')})` : below.map((u) => `/${u}`).join('');
  return `${above.join('\\per ')}${denominator}`;
}

/** The same for the head of a column: upright TeX of its own, or nothing. */
export function unitHead(dimension: Dimension, units: UnitSet, small = false): string | undefined {
  const unit = unitTex(dimension, units, small);
  return unit === '' ? undefined : `\\mathrm{${unit.startsWith('/') ? `1${unit}` : unit}}`;
}
