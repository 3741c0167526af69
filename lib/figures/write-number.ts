import type { UnitSet } from '@/lib/model/analysis';

/**
 * A number as TeX with a fixed count of decimals. Groups of three: a comma from 1,000 in US sheets, a thin space from
 * 10 000 in SI sheets. `signed` puts a plus before a positive number; what rounds to zero has no sign.
 */
export function writeNumber(value: number, decimals: number, units: UnitSet, signed = false): string {
  const text = Math.abs(value).toFixed(decimals);
  const [whole = '0', fraction] = text.split('.');
  const grouped =
    units === 'US' || whole.length > 4 ? whole.replace(/\B(?=(\d{3})+$)/g, separator[units]) : whole;
  const sign = Number(text) === 0 ? '' : value < 0 ? '-' : signed ? '+' : '';
  return fraction === undefined ? `${sign}${grouped}` : `${sign}${grouped}.${fraction}`;
}

const separator = { US: '{,}', SI: '\\,' };

/** Decimals that show the greatest of some values with `figures` significant figures; never more than six. */
export function decimalsFor(values: Iterable<number>, figures = 4): number {
  let greatest = 0;
  for (const v of values) greatest = Math.max(greatest, Math.abs(v));
  if (greatest === 0) return 0;
  return Math.min(6, Math.max(0, figures - 1 - Math.floor(Math.log10(greatest) + 1e-9)));
}

/** The fewest decimals, from `least` to `most`, that give every value back (to one part in a million). */
export function exactDecimals(values: Iterable<number>, least: number, most: number): number {
  const all = [...values];
  for (let d = least; d < most; d++) {
    const close = (v: number) => Math.abs(v - Number(v.toFixed(d))) <= 1e-6 * Math.abs(v);
    if (all.every(close)) return d;
  }
  return most;
}
