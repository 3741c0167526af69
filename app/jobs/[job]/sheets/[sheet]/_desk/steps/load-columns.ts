import type { DraftLoad } from '@/lib/model/draft';
import { loadFieldKinds } from '@/lib/model/load-field';
import type { Column } from '../table/column';

const loadKinds = [
  { value: 'uniform', label: 'uniform' },
  { value: 'varying', label: 'varying' },
  { value: 'point', label: 'point' },
  { value: 'couple', label: 'couple' },
  { value: 'joint', label: 'at a joint' },
  { value: 'self-weight', label: 'own weight' },
  { value: 'temperature', label: 'temperature' },
  { value: 'misfit', label: 'misfit' },
  { value: 'settlement', label: 'settlement' },
] as const;

const forces = [
  { value: 'down', label: '↓ down' },
  { value: 'up', label: '↑ up' },
  { value: 'right', label: '→ right' },
  { value: 'left', label: '← left' },
];
const local = [
  { value: 'across', label: 'across' },
  { value: 'along', label: 'along' },
];
const turns = [
  { value: 'counter-clockwise', label: '↺ turning' },
  { value: 'clockwise', label: '↻ turning' },
];

function directionsOf(row: DraftLoad) {
  switch (row.kind) {
    case 'couple':
      return turns;
    case 'joint':
    case 'settlement':
      return [...forces, ...turns];
    default:
      return [...forces, ...local];
  }
}

const atJoint = (row: DraftLoad) => row.kind === 'joint' || row.kind === 'settlement';
const directed = (row: DraftLoad) => !['self-weight', 'temperature', 'misfit'].includes(row.kind);
const spread = (row: DraftLoad) => row.kind === 'uniform' || row.kind === 'varying';
const placed = (row: DraftLoad) => spread(row) || row.kind === 'point' || row.kind === 'couple';

/** A row of another kind: what it cannot mean any more (a turning uniform load) goes back to the plain sense. */
function withKind(row: DraftLoad, kind: DraftLoad['kind']): DraftLoad {
  const next = { ...row, kind };
  const known = directionsOf(next).some((d) => d.value === row.direction);
  return known ? next : { ...next, direction: kind === 'couple' ? 'counter-clockwise' : 'down' };
}

const text = (
  field: 'first' | 'second' | 'from' | 'to',
  head: string,
  width: string,
  more: Partial<Column<DraftLoad>>,
): Column<DraftLoad> => ({
  key: field,
  head,
  width,
  align: 'right',
  field,
  read: (row) => row[field],
  write: (row, value) => ({ ...row, [field]: value }),
  ...more,
});

/** Columns of the load table; names of members and joints are offered, lengths of members stand behind L. */
export function loadColumns(
  members: readonly string[],
  joints: readonly string[],
  lengths: ReadonlyMap<string, number>,
): Column<DraftLoad>[] {
  const names = (list: readonly string[]) => list.map((value) => ({ value, label: value }));
  const spanOf = (row: DraftLoad) => lengths.get(row.on);
  return [
    {
      key: 'kind',
      head: 'Load',
      width: '88px',
      field: 'kind',
      options: loadKinds,
      read: (row) => row.kind,
      write: (row, kind) => withKind(row, kind as DraftLoad['kind']),
    },
    {
      key: 'on',
      head: 'On',
      width: '56px',
      field: 'on',
      options: (row) =>
        atJoint(row)
          ? names(joints)
          : row.kind === 'self-weight'
            ? [{ value: '', label: 'all' }, ...names(members)]
            : names(members),
      read: (row) => row.on,
      write: (row, on) => ({ ...row, on }),
    },
    {
      key: 'direction',
      head: 'Sense',
      width: '88px',
      field: 'direction',
      options: directionsOf,
      used: directed,
      read: (row) => row.direction,
      write: (row, direction) => ({ ...row, direction: direction as DraftLoad['direction'] }),
    },
    text('first', 'value', '88px', {
      kind: (row) => loadFieldKinds(row).first ?? 'number',
      used: (row) => loadFieldKinds(row).first !== undefined,
    }),
    text('second', 'to value', '64px', {
      kind: (row) => loadFieldKinds(row).second ?? 'number',
      used: (row) => loadFieldKinds(row).second !== undefined,
    }),
    text('from', 'from', '48px', { kind: 'length', used: placed, L: spanOf }),
    text('to', 'to', '48px', { kind: 'length', used: spread, L: spanOf }),
    {
      key: 'source',
      head: 'Source',
      width: '96px',
      field: 'source',
      read: (row) => row.source,
      write: (row, source) => ({ ...row, source }),
    },
  ];
}
