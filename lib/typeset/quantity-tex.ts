import { writeNumber } from '@/lib/figures/write-number';
import type { UnitSet } from '@/lib/model/analysis';
import type { Dimension } from '@/lib/units/dimension';
import { unitTex } from './write-unit';

/** A number to print: in coherent units, or in a smaller one so many of which make a coherent one (`scale`). */
export interface PrintedQuantity {
  value: number;
  dimension: Dimension;
  decimals: number;
  scale?: number;
}

/** TeX of a quantity with its unit: `24.60\unit{kip}`. */
export function quantityTex(q: PrintedQuantity, units: UnitSet): string {
  const unit = unitTex(q.dimension, units, q.scale !== undefined);
  return `${quantityNumber(q, units)}${unit === '' ? '' : `\\unit{${unit}}`}`;
}

/** TeX of its number alone, as in a column whose head has the unit. */
export function quantityNumber({ value, decimals, scale = 1 }: PrintedQuantity, units: UnitSet): string {
  return writeNumber(value * scale, decimals, units);
}
