'use client';

import type { DraftSupport } from '@/lib/model/draft';
import { type SupportRow, supportPath, supportRows, writeSupports } from '@/lib/model/support-rows';
import { useDesk } from '../desk-context';
import { CellTable } from '../table/cell-table';
import type { Column } from '../table/column';

const kinds = [
  { value: 'free', label: 'free' },
  { value: 'fixed', label: 'fixed' },
  { value: 'pinned', label: 'pinned' },
  { value: 'roller', label: 'roller' },
  { value: 'guided', label: 'guided' },
  { value: 'spring', label: 'spring' },
];

type Row = SupportRow;

/** Where and how the structure is held. */
export function SupportsStep() {
  const { draft, change } = useDesk();
  const rows = supportRows(draft);
  const us = draft.units === 'US';
  const text = (
    field: 'angle' | 'springX' | 'springY' | 'springTurn',
    head: string,
    unit: string,
    kind: NonNullable<Column<Row>['kind']>,
  ): Column<Row> => ({
    key: field,
    head,
    unit,
    width: '92px',
    align: 'right',
    field,
    kind,
    used: (r) =>
      field === 'angle'
        ? r.support.kind !== 'free' && r.support.kind !== 'fixed'
        : r.support.kind === 'spring',
    read: (r) => r.support[field],
    write: (r, value) => ({ ...r, support: { ...r.support, [field]: value } }),
  });
  const columns: Column<Row>[] = [
    {
      key: 'joint',
      head: 'Joint',
      width: '64px',
      field: 'joint',
      read: (r) => r.joint,
      write: (r) => r,
      fixed: true,
    },
    {
      key: 'kind',
      head: 'Support',
      width: '112px',
      field: 'kind',
      options: kinds,
      read: (r) => r.support.kind,
      write: (r, kind) => ({ ...r, support: { ...r.support, kind: kind as DraftSupport['kind'] } }),
    },
    text('angle', 'turned by', 'deg', 'angle'),
    text('springX', 'kx', us ? 'kip/ft' : 'kN/m', 'spring'),
    text('springY', 'ky', us ? 'kip/ft' : 'kN/m', 'spring'),
    text('springTurn', 'turning', us ? 'kip·ft' : 'kN·m', 'turnSpring'),
  ];
  return (
    <>
      <CellTable
        pathOf={(i) => supportPath(draft, i)}
        label="Supports"
        rows={rows}
        columns={columns}
        onRows={(next, place) =>
          change(place, (d) =>
            writeSupports(
              d,
              next.map((r) => r.support),
            ),
          )
        }
        refOf={(row) => ({ of: 'joint', id: row.joint })}
      />
      <p className="ans">
        A roller holds across its plane, a guided support holds across and against turning. A turned support
        is turned counter-clockwise.
      </p>
    </>
  );
}
