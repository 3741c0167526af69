'use client';

import type { DraftAsk } from '@/lib/model/draft';
import { DrawingView } from '@/templates/screen/drawing-view';
import { RichText } from '@/templates/screen/rich-text';
import { useDesk } from '../desk-context';
import { type Shown, shownNames } from '../drawing-tools';
import { CellTable } from '../table/cell-table';
import type { Column } from '../table/column';
import { writeAtPath } from '../write-at-path';
import { overlays, type Writing } from '../writing';

const directions = [
  { value: 'across', label: 'across the member' },
  { value: 'x', label: 'sideways' },
  { value: 'y', label: 'vertical' },
  { value: 'rotation', label: 'rotation' },
];

function askColumns(members: readonly string[]): Column<DraftAsk>[] {
  const text = (field: 'at' | 'limit', head: string): Column<DraftAsk> => ({
    key: field,
    head,
    width: '92px',
    align: 'right',
    kind: 'length',
    field,
    read: (r) => r[field],
    write: (r, value) => ({ ...r, [field]: value }),
  });
  return [
    {
      key: 'member',
      head: 'On',
      width: '76px',
      field: 'member',
      options: members.map((value) => ({ value, label: value })),
      read: (r) => r.member,
      write: (r, member) => ({ ...r, member }),
    },
    text('at', 'at'),
    {
      key: 'direction',
      head: 'Movement',
      width: '148px',
      field: 'direction',
      options: directions,
      read: (r) => r.direction,
      write: (r, d) => ({ ...r, direction: d as DraftAsk['direction'] }),
    },
    text('limit', 'limit'),
    {
      key: 'source',
      head: 'Source of the limit',
      width: 'auto',
      field: 'source',
      read: (r) => r.source,
      write: (r, source) => ({ ...r, source }),
    },
  ];
}

function blankAsk(members: readonly string[]): DraftAsk {
  return { member: members[0] ?? '', at: 'L/2', direction: 'across', limit: '', source: '' };
}

/** Reactions at a glance, diagrams, and the deflections that are asked for. */
export function ResultsStep({
  pages,
  members,
  onShow,
}: {
  pages: Extract<Writing, { state: 'written' }> | undefined;
  members: readonly string[];
  onShow: (shown: Shown) => void;
}) {
  const { draft, change } = useDesk();
  return (
    <>
      {pages ? (
        <>
          <table className="rl" aria-label="Reactions">
            <thead>
              <tr>
                <th scope="col">Reaction</th>
                {draft.cases.map((c) => (
                  <th key={c.id} scope="col" className="r num">
                    {c.id}
                  </th>
                ))}
                <th scope="col">unit</th>
              </tr>
            </thead>
            <tbody>
              {pages.reactions.map((r) => (
                <tr key={r.symbol}>
                  <th scope="row">
                    <RichText text={r.symbol} />
                  </th>
                  {r.values.map((v) => (
                    <td key={v.case} className="r num">
                      {v.value}
                    </td>
                  ))}
                  <td className="num">{r.unit}</td>
                </tr>
              ))}
            </tbody>
          </table>
          <div className="drawtools mt-5">
            <fieldset>
              <legend className="sr-only">Diagram of each case</legend>
              {overlays.map((which) => (
                <button
                  key={which}
                  type="button"
                  aria-pressed={pages.overlay.which === which}
                  onClick={() => onShow(which)}
                >
                  {shownNames[which]}
                </button>
              ))}
            </fieldset>
          </div>
          {pages.overlay.drawings.map((d, i) => (
            <figure key={draft.cases[i]?.id ?? d.alt} className="mt-3">
              <figcaption className="ans">
                <span className="num">{draft.cases[i]?.id}</span> {draft.cases[i]?.title}
              </figcaption>
              <DrawingView drawing={d} />
            </figure>
          ))}
        </>
      ) : (
        <p className="ans">Results stand here when the sheet can be solved.</p>
      )}
      <h3 className="mt-5">Deflections asked for</h3>
      <CellTable
        pathOf={(i) => `displacements.${i}`}
        label="Deflections asked for"
        rows={draft.displacements}
        columns={askColumns(members)}
        onRows={(next, place) => change(place, (d) => writeAtPath(d, 'displacements', next))}
        add={{
          label: 'Ask for a deflection',
          blank: () => blankAsk(members),
        }}
      />
      <p className="ans">
        A limit may be written as part of the span: L/360. Its source is printed beside it.
      </p>
    </>
  );
}
