import type { Draft } from './draft';
import { namePlace } from './name-place';

/** One input as a checker holds it against a drawing: where it stands in words, unique on the sheet, and what is written. */
export interface ListedInput {
  place: string;
  value: string;
}

type Tree = string | number | boolean | null | undefined | readonly Tree[] | { readonly [key: string]: Tree };
type Path = readonly (string | number)[];

/**
 * The inputs of a sheet that come from drawings and the basis: stiffness, geometry, supports and loads, one entry a row of
 * a table or a single field. Blank fields are left out; choices of the method (redundants, combinations) are not inputs.
 */
export function listInputs(draft: Draft): ListedInput[] {
  const { kind: _kind, ...stiffness } = draft.stiffness;
  const loads = draft.cases.flatMap((c) =>
    c.loads.map((load, i) => entry(['cases', c.id, 'loads', i + 1], load)),
  );
  const { shape: _shape, ...geometry } = draft.geometry;
  const all = [...fields(['stiffness'], stiffness), ...fields(['geometry'], geometry), ...loads];
  return all.filter((i) => i.value !== '');
}

/** Every field of a group by itself; every row of a table by itself. */
function fields(path: Path, group: { readonly [key: string]: Tree }): ListedInput[] {
  return Object.entries(group).flatMap(([key, value]) =>
    isRows(value)
      ? value.map((row, i) => entry([...path, key, nameOf(row) ?? i + 1], row))
      : [entry([...path, key], value)],
  );
}

const entry = (path: Path, value: Tree): ListedInput => ({
  place: namePlace(path),
  value: write(value).join(', '),
});

const isRows = (value: Tree): value is readonly Tree[] => Array.isArray(value);

function nameOf(row: Tree): string | undefined {
  return typeof row === 'object' && row !== null && !isRows(row) && typeof row.id === 'string'
    ? row.id
    : undefined;
}

/** What stands in the fields of a row, each after its name; what is first or a kind speaks for itself. */
function write(value: Tree, name = ''): string[] {
  if (value === undefined || value === null || value === false || value === '') return [];
  if (isRows(value)) return value.flatMap((v) => write(v));
  if (typeof value === 'object')
    return Object.entries(value).flatMap(([key, v]) => write(v, plainNames.has(key) ? '' : namePlace([key])));
  if (value === true) return [name];
  return [name === '' ? String(value) : `${name} ${value}`];
}

/** Fields whose value needs no name beside it. */
const plainNames = new Set(['id', 'kind', 'direction', 'first', 'on', 'stiffness', 'support']);
