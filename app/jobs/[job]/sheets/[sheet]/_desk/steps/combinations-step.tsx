'use client';

import type { Draft } from '@/lib/model/draft';
import { ChoiceField } from '../choice-field';
import { useDesk } from '../desk-context';
import { CellTable } from '../table/cell-table';
import type { Column } from '../table/column';
import { writeAtPath } from '../write-at-path';
import type { Writing } from '../writing';

type Row = Draft['combinations'][number];

const purposes = [
  { value: 'strength', label: 'strength' },
  { value: 'service', label: 'service' },
];

const columns: Column<Row>[] = [
  {
    key: 'id',
    head: 'Name',
    width: '92px',
    field: 'id',
    read: (r) => r.id,
    write: (r, id) => ({ ...r, id }),
  },
  {
    key: 'sum',
    head: 'Sum of cases',
    width: '190px',
    field: 'sum',
    read: (r) => r.sum,
    write: (r, sum) => ({ ...r, sum }),
  },
  {
    key: 'purpose',
    head: 'For',
    width: '96px',
    field: 'purpose',
    options: purposes,
    read: (r) => r.purpose,
    write: (r, purpose) => ({ ...r, purpose: purpose === 'service' ? 'service' : 'strength' }),
  },
  {
    key: 'source',
    head: 'Source',
    width: 'auto',
    field: 'source',
    read: (r) => r.source,
    write: (r, source) => ({ ...r, source }),
  },
];

const blankSum = (): Row => ({ id: '', purpose: 'strength', sum: '', source: '' });

interface Props {
  sets: readonly { key: string; title: string }[];
  writing: Writing | undefined;
}

/** A published set of combinations, and the office's own. */
export function CombinationsStep({ sets, writing }: Props) {
  const { draft, change, edit } = useDesk();
  const fault =
    writing?.state === 'incomplete' ? writing.errors.find((e) => e.path === 'patterns')?.message : undefined;
  const options = [{ value: '', label: 'none' }, ...sets.map((s) => ({ value: s.key, label: s.title }))];
  return (
    <>
      <ChoiceField
        path="combinationSet"
        label="Published set"
        value={draft.combinationSet}
        options={options}
      />
      <p className="ans">Factors follow the nature of each case. The local code decides which set governs.</p>
      <label className="flex gap-2 items-center mt-3">
        <input
          type="checkbox"
          checked={draft.patterns}
          disabled={draft.combinationSet === ''}
          onChange={(event) => edit('patterns', event.target.checked)}
        />
        Live load on the spans in turn
      </label>
      <p className={fault ? 'ans e' : 'ans'}>
        {fault ??
          'The live case is split span by span and combined in the arrangements that give the greatest and least moments and reactions. The page grows with the spans.'}
      </p>
      {writing?.state === 'written' && writing.combinations.length > 0 ? (
        <ol className="plainlist">
          {writing.combinations.map((c) => (
            <li key={c.id}>
              <span className="num">{c.id}</span> <span className="text-ink3">{c.source}</span>
            </li>
          ))}
        </ol>
      ) : null}
      <h3 className="mt-5">Own combinations</h3>
      <CellTable
        pathOf={(i) => `combinations.${i}`}
        label="Own combinations"
        rows={draft.combinations}
        columns={columns}
        onRows={(next, place) => change(place, (d) => writeAtPath(d, 'combinations', next))}
        add={{
          label: 'Add a combination',
          blank: blankSum,
        }}
      />
    </>
  );
}
