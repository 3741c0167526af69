import { type KindName, kinds, type UnitSetName } from '@/lib/units/kind';
import { readQuantity } from '@/lib/units/read-quantity';
import { writeQuantity } from '@/lib/units/write-quantity';

/** What a field read, when that says more than what was typed: arithmetic, or another unit than the field's own. */
export function understood(text: string, kind: KindName, set: UnitSetName, L?: number): string | undefined {
  if (text.trim() === '') return undefined;
  const span = { kind: 'length' as const };
  const read = readQuantity(text, kind, set, L === undefined ? {} : { L: { value: L, ...span } });
  if (!read.ok) return undefined;
  const shown = writeQuantity(read.value, kind, set);
  const bare = /^[-−+]?\d[\d.,]*(?:e[-+]?\d+)?$/.test(text.trim());
  return bare && !read.arithmetic ? undefined : shown === text.trim() ? undefined : shown;
}

/** The unit a bare number is read in, as words on the screen: "kip·ft²"; nothing for pure numbers. */
export function unitWord(kind: KindName, set: UnitSetName): string {
  const unit = kinds[kind].unit[set];
  if (unit.startsWith('1/')) return '';
  return unit.replace('*', '·').replace('^2', '²').replace('^4', '⁴').replace('deg', '°');
}
