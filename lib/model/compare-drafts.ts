import { alignRows } from './align-rows';
import type { Draft } from './draft';
import { namePlace } from './name-place';

/** One input that differs: where it stands in words, and what was and is written there. */
export interface DraftChangeNote {
  place: string;
  before?: string;
  after?: string;
}

type Leaf = string | number | boolean | null | undefined;
type Tree = Leaf | readonly Tree[] | { readonly [key: string]: Tree };

/** Every input in which two drafts differ, in the order of the sheet; rows of tables are matched, not counted off. */
export function compareDrafts(before: Draft, after: Draft): DraftChangeNote[] {
  return compare(before as Tree, after as Tree, []);
}

function compare(before: Tree, after: Tree, path: readonly (string | number)[]): DraftChangeNote[] {
  if (Array.isArray(before) && Array.isArray(after)) return compareRows(before, after, path);
  if (isBranch(before) && isBranch(after) && before.shape === after.shape) {
    const keys = [...new Set([...Object.keys(before), ...Object.keys(after)])];
    return keys.flatMap((key) => compare(before[key], after[key], [...path, key]));
  }
  if (JSON.stringify(before) === JSON.stringify(after)) return [];
  return [{ place: namePlace(path), ...said('before', before), ...said('after', after) }];
}

function compareRows(before: readonly Tree[], after: readonly Tree[], path: readonly (string | number)[]) {
  const equal = (a: Tree, b: Tree) => JSON.stringify(a) === JSON.stringify(b);
  return alignRows(before, after, equal).flatMap((pair): DraftChangeNote[] => {
    const place = [...path, nameOf(after, pair.after) ?? nameOf(before, pair.before) ?? ''];
    if (pair.before === undefined)
      return [{ place: namePlace(place), after: write(after[pair.after as number]) }];
    if (pair.after === undefined) return [{ place: namePlace(place), before: write(before[pair.before]) }];
    return compare(before[pair.before], after[pair.after], place);
  });
}

/** A row is called by its own name where it has one (a case, a joint), else by its number. */
function nameOf(rows: readonly Tree[], at: number | undefined): string | number | undefined {
  if (at === undefined) return undefined;
  const row = rows[at];
  return isBranch(row) && typeof row.id === 'string' ? row.id : at + 1;
}

function isBranch(value: Tree): value is { readonly [key: string]: Tree } {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function said(side: 'before' | 'after', value: Tree): Partial<DraftChangeNote> {
  const words = write(value);
  return words === '' ? {} : { [side]: words };
}

/** What stands in a field or a whole row, blanks left out. */
function write(value: Tree): string {
  if (value === undefined || value === null || value === false) return '';
  if (value === true) return 'yes';
  if (Array.isArray(value)) return value.map(write).filter(Boolean).join('; ');
  if (isBranch(value)) return Object.values(value).map(write).filter(Boolean).join(', ');
  return String(value);
}
