/** Largest difference of two results taken for rounding, relative to the greatest value of the same kind on the sheet. */
export const sameResult = 1e-6;

export interface ResultComparison {
  /** How many stored values were held against the new ones. */
  compared: number;
  /** Places, such as "reactions.D.reactions.0.value", where they differ or one is missing. */
  differing: string[];
  /** The greatest relative difference found. */
  greatest: number;
}

type Leaves = Map<string, number | string | boolean | null>;

/**
 * Every stored value against the value of the same place in a new solution. Residuals of checks are rounding itself and
 * are left out; whether each check holds is compared.
 */
export function compareResults(stored: unknown, solved: unknown): ResultComparison {
  const [before, after] = [leavesOf(stored), leavesOf(solved)];
  const sizes = sizesOf(after);
  const differing: string[] = [];
  let greatest = 0;
  for (const [place, value] of before) {
    const other = after.get(place);
    if (typeof value === 'number' && typeof other === 'number') {
      // The new solution gives the measure, so that a stored value cannot hide another.
      const size = sizes.get(kindOf(place)) as number;
      const difference = size === 0 ? 0 : Math.abs(value - other) / size;
      greatest = Math.max(greatest, difference);
      if (!(difference <= sameResult)) differing.push(place);
    } else if (value !== other) differing.push(place);
  }
  for (const place of after.keys()) if (!before.has(place)) differing.push(place);
  return { compared: before.size, differing, greatest };
}

function leavesOf(value: unknown, place = '', found: Leaves = new Map()): Leaves {
  if (typeof value === 'object' && value !== null) {
    for (const [key, inner] of Object.entries(value)) {
      if (key !== 'residual' && inner !== undefined)
        leavesOf(inner, place === '' ? key : `${place}.${key}`, found);
    }
    return found;
  }
  if (value === null || ['number', 'string', 'boolean'].includes(typeof value))
    found.set(place, value as number | string | boolean | null);
  return found;
}

const kinds: Record<string, string> = {
  N: 'force',
  V: 'force',
  M: 'moment',
  across: 'motion',
  along: 'motion',
  x: 'motion',
  y: 'motion',
  rotation: 'rotation',
  from: 'length',
  to: 'length',
  s: 'length',
};

/** Values of one kind are weighed against the greatest of them, so that rounding beside zero is not taken for a change. */
function kindOf(place: string): string {
  const parts = place.split('.').reverse();
  const named = parts.find((part) => part in kinds);
  return named === undefined ? (parts.at(-1) as string) : (kinds[named] as string);
}

function sizesOf(leaves: Leaves): Map<string, number> {
  const sizes = new Map<string, number>();
  for (const [place, value] of leaves) {
    if (typeof value !== 'number') continue;
    const kind = kindOf(place);
    const known = sizes.get(kind);
    sizes.set(kind, Math.max(known === undefined ? 0 : known, Math.abs(value)));
  }
  return sizes;
}
