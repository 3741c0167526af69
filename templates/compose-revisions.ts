import type { Block } from './block';
import { plain } from './plain-text';

export interface RevisedSheet {
  number: string;
  revisions: readonly { number: number; date: string; reason: string; originator: string }[];
}

/** The revision history of a package, on its last pages; nothing when every sheet is as first issued. */
export function composeRevisions(sheets: readonly RevisedSheet[]): Block[] {
  if (sheets.every((s) => s.revisions.length < 2)) return [];
  const rows = sheets.flatMap((sheet) =>
    sheet.revisions.map((r, i) => ({
      cells: [i === 0 ? sheet.number : '', `${r.number}`, r.date, r.originator, plain(r.reason)],
      ...(i === 0 ? { emphasis: 'group' as const } : {}),
    })),
  );
  return [
    { kind: 'heading', id: 'R', text: 'Revisions of the sheets' },
    {
      kind: 'table',
      id: 'R.1',
      columns: [
        { head: 'sheet', align: 'left' },
        { head: 'rev', align: 'left' },
        { head: 'date', align: 'left' },
        { head: 'by', align: 'left' },
        { head: 'reason', align: 'left' },
      ],
      rows,
      note: 'A line that changed after the first issue bears a triangle in the margin with the number of the revision in which it last changed.',
    },
  ];
}
