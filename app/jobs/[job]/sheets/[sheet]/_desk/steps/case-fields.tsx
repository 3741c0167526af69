'use client';

import { useId } from 'react';
import type { DraftCase } from '@/lib/model/draft';
import { ChoiceField } from '../choice-field';
import { useDesk, useFieldError } from '../desk-context';

const natures: readonly { value: DraftCase['nature']; label: string }[] = [
  { value: 'dead', label: 'dead' },
  { value: 'live', label: 'live' },
  { value: 'roof-live', label: 'roof live' },
  { value: 'snow', label: 'snow' },
  { value: 'rain', label: 'rain' },
  { value: 'wind', label: 'wind' },
  { value: 'seismic', label: 'seismic' },
  { value: 'soil', label: 'soil' },
  { value: 'temperature', label: 'temperature' },
  { value: 'settlement', label: 'settlement' },
  { value: 'other', label: 'other' },
];

const senses = [
  { value: 'no', label: 'one sense' },
  { value: 'yes', label: 'either sense' },
] as const;

/** Symbol, name and nature of one case. */
export function CaseFields({
  index,
  chosen,
  onRemove,
}: {
  index: number;
  chosen: DraftCase;
  onRemove: () => void;
}) {
  const id = useId();
  const { edit } = useDesk();
  const path = `cases.${index}`;
  const error = useFieldError(`${path}.id`, chosen.id);
  return (
    <div className="fields">
      <div className="fld narrow">
        <label htmlFor={`${id}-id`}>Symbol</label>
        <div className={error ? 'wr err' : 'wr'}>
          <input
            id={`${id}-id`}
            className="val num"
            value={chosen.id}
            maxLength={8}
            aria-invalid={error ? true : undefined}
            aria-describedby={`${id}-said`}
            onChange={(e) => edit(`${path}.id`, e.target.value)}
          />
        </div>
        <p id={`${id}-said`} className={error ? 'ans e' : 'ans'}>
          {error ?? ''}
        </p>
      </div>
      <div className="fld">
        <label htmlFor={`${id}-title`}>Name</label>
        <div className="wr">
          <input
            id={`${id}-title`}
            className="val"
            value={chosen.title}
            maxLength={80}
            onChange={(e) => edit(`${path}.title`, e.target.value)}
          />
        </div>
      </div>
      <ChoiceField path={`${path}.nature`} label="Nature" value={chosen.nature} options={natures} />
      <ChoiceField
        path={`${path}.reversible`}
        label="Acts in"
        value={chosen.reversible ? 'yes' : 'no'}
        options={senses}
        onChoose={(v) => edit(`${path}.reversible`, v === 'yes')}
      />
      <button type="button" className="linkish" onClick={onRemove}>
        Remove this case
      </button>
    </div>
  );
}
