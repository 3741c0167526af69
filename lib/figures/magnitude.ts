import type { UnitSet } from '@/lib/model/analysis';
import { coherentFactor, type KindName, kinds } from '@/lib/units/kind';
import { shownFactor } from '@/lib/units/write-quantity';
import { decimalsFor, exactDecimals, writeNumber } from './write-number';

/** Units as a drawing prints them. */
const unitTex: Record<Shown, Record<UnitSet, string>> = {
  force: { US: 'kip', SI: 'kN' },
  distributed: { US: 'kip/ft', SI: 'kN/m' },
  couple: { US: 'kip\\per ft', SI: 'kN\\per m' },
  movement: { US: 'in', SI: 'mm' },
  rotation: { US: 'rad', SI: 'rad' },
  temperature: { US: '{}^\\circ F', SI: 'K' },
};

type Shown = Extract<KindName, 'force' | 'distributed' | 'couple' | 'movement' | 'rotation' | 'temperature'>;

/** TeX of a load's value with its unit: `5.40\unit{kN/m}`. Movements are printed in mm or in., not in m or ft.
 * With the decimals the value needs, or to a count of significant figures. */
export function magnitude(
  value: number,
  kind: Shown,
  units: UnitSet,
  signed = false,
  figures?: number,
): string {
  const shown = (value * coherentFactor(kinds[kind].dimension, units)) / shownFactor(kind, units);
  const least = kind === 'temperature' ? 0 : kind === 'movement' ? 1 : 2;
  const exact = kind === 'rotation' ? 5 : exactDecimals([shown], least, Math.max(least, 3));
  const decimals = figures === undefined ? exact : decimalsFor([shown], figures);
  return `${writeNumber(shown, decimals, units, signed)}\\unit{${unitTex[kind][units]}}`;
}
