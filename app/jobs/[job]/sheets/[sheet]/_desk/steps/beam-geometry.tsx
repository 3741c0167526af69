'use client';

import { useEffect } from 'react';
import type { DraftSpan, DraftSupport } from '@/lib/model/draft';
import { blankStiffness, blankSupport } from '@/lib/model/starting-draft';
import { useDesk } from '../desk-context';
import { CellTable } from '../table/cell-table';
import type { Column } from '../table/column';
import { writeAtPath } from '../write-at-path';
import { stiffnessColumns } from './stiffness-columns';

/** A new span is as stiff as the one before it. */
const blank = (rows: readonly DraftSpan[]): DraftSpan => ({
  length: '',
  stiffness: { ...(rows.at(-1)?.stiffness ?? blankStiffness()) },
});

/** Spans from left to right. */
export function BeamGeometry({ spans, supports }: { spans: DraftSpan[]; supports: DraftSupport[] }) {
  const { draft, edit, change } = useDesk();
  const unit = draft.units === 'US' ? 'ft' : 'm';

  // A beam has one support more than spans; spans come and go by many ways (rows, paste, undo).
  useEffect(() => {
    const wanted = spans.length + 1;
    if (supports.length === wanted) return;
    const more = Array.from({ length: Math.max(0, wanted - supports.length) }, () => blankSupport('roller'));
    edit('geometry.supports', [...supports, ...more].slice(0, wanted));
  }, [spans.length, supports, edit]);

  const columns: Column<DraftSpan>[] = [
    {
      key: 'length',
      head: 'length',
      unit,
      width: '112px',
      align: 'right',
      kind: 'length',
      field: 'length',
      read: (row) => row.length,
      write: (row, length) => ({ ...row, length }),
    },
    ...stiffnessColumns<DraftSpan>(draft),
  ];
  return (
    <CellTable
      pathOf={(i) => `geometry.spans.${i}`}
      label="Spans, from left to right"
      rows={spans}
      columns={columns}
      onRows={(next, place) => change(place, (d) => writeAtPath(d, 'geometry.spans', next))}
      add={{ label: 'Add a span', blank }}
      refOf={(_, i) => ({ of: 'member', id: `${i + 1}-${i + 2}` })}
    />
  );
}
