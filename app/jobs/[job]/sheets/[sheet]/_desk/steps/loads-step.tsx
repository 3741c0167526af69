'use client';

import { useState } from 'react';
import type { DraftCase, DraftLoad } from '@/lib/model/draft';
import { FieldReader } from '@/lib/model/field-reader';
import { memberLengths } from '@/lib/model/read-draft';
import { readGeometry } from '@/lib/model/read-geometry';
import { useDesk } from '../desk-context';
import { CellTable } from '../table/cell-table';
import { writeAtPath } from '../write-at-path';
import { CaseFields } from './case-fields';
import { loadColumns } from './load-columns';

const usual: readonly { nature: DraftCase['nature']; title: string; US: string; SI: string }[] = [
  { nature: 'dead', title: 'Dead', US: 'D', SI: 'G' },
  { nature: 'live', title: 'Live', US: 'L', SI: 'Q' },
  { nature: 'snow', title: 'Snow', US: 'S', SI: 'S' },
  { nature: 'wind', title: 'Wind', US: 'W', SI: 'W' },
  { nature: 'roof-live', title: 'Roof live', US: 'Lr', SI: 'H' },
];

/** Cases by nature, and the loads of each. */
export function LoadsStep({ current, onCase }: { current: number; onCase: (index: number) => void }) {
  const { draft, change } = useDesk();
  const [removed, setRemoved] = useState<string | undefined>();
  const chosen = draft.cases[current];
  const geometry = readGeometry(new FieldReader(draft.units), draft);
  const members = geometry.members.map((m) => m.id);
  const columns = loadColumns(
    members,
    geometry.joints.map((j) => j.id),
    memberLengths(geometry),
  );

  const addCase = () => {
    const free = usual.find((u) => !draft.cases.some((c) => c.id === u[draft.units]));
    const id = free ? free[draft.units] : `X${draft.cases.length + 1}`;
    const made: DraftCase = {
      id,
      title: free?.title ?? 'Other',
      nature: free?.nature ?? 'other',
      category: '',
      reversible: false,
      loads: [],
    };
    change('case added', (d) => ({ ...d, cases: [...d.cases, made] }));
    onCase(draft.cases.length);
  };
  const removeCase = () => {
    setRemoved(chosen?.id);
    change('case removed', (d) => ({ ...d, cases: d.cases.filter((_, i) => i !== current) }));
    onCase(Math.max(0, current - 1));
  };

  return (
    <>
      <div className="casehead">
        <div className="tabs" role="tablist" aria-label="Load cases">
          {draft.cases.map((c, i) => (
            <button
              key={`${c.id}-${c.title}`}
              type="button"
              role="tab"
              aria-selected={i === current}
              onClick={() => onCase(i)}
            >
              <span className="num">{c.id}</span> {c.title}
            </button>
          ))}
        </div>
        <button type="button" className="addcase" onClick={addCase}>
          Add a case
        </button>
      </div>
      {chosen ? (
        <div role="tabpanel" aria-label={`Case ${chosen.id}`}>
          <CaseFields index={current} chosen={chosen} onRemove={removeCase} />
          <CellTable
            pathOf={(i) => `cases.${current}.loads.${i}`}
            label={`Loads of case ${chosen.id}`}
            rows={chosen.loads}
            columns={columns}
            onRows={(next, place) => change(place, (d) => writeAtPath(d, `cases.${current}.loads`, next))}
            add={{ label: 'Add a load', blank: (rows) => blankLoad(rows, members) }}
            refOf={(row) => ({
              of: row.kind === 'joint' || row.kind === 'settlement' ? 'joint' : 'member',
              id: row.on,
            })}
          />
          <p className="ans">
            Enter goes to the next row, Ctrl D fills down, Ctrl Enter copies the row, Ctrl Backspace removes
            it. Places may be written with L: L/2. Blank from and to mean the whole member.
          </p>
        </div>
      ) : (
        <p className="ans">No case yet. A sheet without loads has nothing to resist.</p>
      )}
      {removed ? <p className="ans">Case {removed} is removed; Undo brings it back.</p> : null}
    </>
  );
}

/** A new load is of the last one's kind, on the member after its own. */
function blankLoad(rows: readonly DraftLoad[], members: readonly string[]): DraftLoad {
  const last = rows.at(-1);
  const next = last ? members[members.indexOf(last.on) + 1] : undefined;
  return {
    kind: last?.kind ?? 'uniform',
    on: next ?? last?.on ?? members[0] ?? '',
    direction: last?.direction ?? 'down',
    per: last?.per ?? 'length',
    first: last?.kind === 'uniform' ? last.first : '',
    second: '',
    from: '',
    to: '',
    source: last?.source ?? '',
  };
}
