/** What the fields of a draft are called on the desk; a key that is not here is called by itself. */
const names: Record<string, string> = {
  title: 'title',
  units: 'unit set',
  basis: 'basis',
  stiffness: 'stiffness',
  kind: 'kind',
  EI0: 'EI₀',
  alpha: 'expansion per degree',
  As: 'shear area',
  geometry: '',
  shape: 'starting sheet',
  spans: 'span',
  supports: 'support',
  support: 'support',
  joints: 'joint',
  members: 'member',
  leftHeight: 'left height',
  rightHeight: 'right height',
  leftBase: 'left base',
  rightBase: 'right base',
  leftColumn: 'left column',
  rightColumn: 'right column',
  start: 'from',
  end: 'to',
  startHinge: 'hinge at its start',
  endHinge: 'hinge at its end',
  springX: 'spring along x',
  springY: 'spring along y',
  springTurn: 'spring against rotation',
  cases: 'case',
  loads: 'load',
  first: 'value',
  second: 'second value',
  on: 'where',
  per: 'measured per',
  combinationSet: 'published set of combinations',
  patterns: 'live load on spans in turn',
  combinations: 'own combination',
  redundants: 'redundants',
  displacements: 'displacement',
  at: 'place',
};

/** A place of a draft in words: `['cases', 'D', 'loads', 2, 'first']` is "case D, load 2, value". */
export function namePlace(path: readonly (string | number)[]): string {
  const parts: string[] = [];
  path.forEach((key, i) => {
    const table = i > 0 && rowsOf.has(String(path[i - 1]));
    if (table) parts[parts.length - 1] += ` ${key}`;
    else {
      const name = names[key] ?? String(key);
      if (name !== '') parts.push(name);
    }
  });
  return parts.join(', ');
}

/** Keys whose next part names a row. */
const rowsOf = new Set([
  'spans',
  'supports',
  'joints',
  'members',
  'cases',
  'loads',
  'combinations',
  'redundants',
  'displacements',
]);
