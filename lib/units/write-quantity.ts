import { evaluateExpression } from './evaluate-expression';
import { coherentFactor, type KindName, kinds, type UnitSetName } from './kind';
import { parseExpression } from './parse-expression';

/**
 * A value in coherent units as a field shows it: in the kind's own unit, to `figures` significant figures, without
 * trailing zeros. Reading the text again gives the value back to that many figures.
 */
export function writeQuantity(value: number, kindName: KindName, set: UnitSetName, figures = 6): string {
  const kind = kinds[kindName];
  const shown = (value * coherentFactor(kind.dimension, set)) / shownFactor(kindName, set);
  const number = Number(shown.toPrecision(figures)).toString();
  const unit = kind.unit[set].replace('*', '·').replace('^2', '²').replace('^4', '⁴');
  return unit === '' || unit.startsWith('1/') ? number : `${number} ${unit}`;
}

/** How many coherent units one shown unit is: 1/12 for inches of a sheet in feet. */
export function shownFactor(kindName: KindName, set: UnitSetName): number {
  const unit = kinds[kindName].unit[set];
  if (unit === '') return 1;
  return evaluateExpression(parseExpression(unit.startsWith('1/') ? unit : `1 ${unit}`), {}).si;
}

/**
 * The same quantity in the other unit set, to eight significant figures, as text with its unit; arithmetic and blank
 * or unreadable text are the caller's to keep.
 */
export function convertCoherent(
  value: number,
  kindName: KindName,
  from: UnitSetName,
  to: UnitSetName,
): number {
  const dimension = kinds[kindName].dimension;
  return (value * coherentFactor(dimension, from)) / coherentFactor(dimension, to);
}
