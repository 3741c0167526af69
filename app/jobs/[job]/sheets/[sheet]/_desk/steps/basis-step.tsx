'use client';

import { useId } from 'react';
import { convertDraft } from '@/lib/model/convert-draft';
import { ChoiceField } from '../choice-field';
import { useDesk } from '../desk-context';

const unitSets = [
  { value: 'US', label: 'kip, ft, in' },
  { value: 'SI', label: 'kN, m, mm' },
] as const;

/** What the sheet is about, in which units, and what it assumes. */
export function BasisStep() {
  const { draft, edit, change } = useDesk();
  const title = useId();
  const basis = useId();
  return (
    <>
      <div className="fld">
        <label htmlFor={title}>What this sheet calculates</label>
        <div className="wr">
          <input
            id={title}
            className="val"
            value={draft.title}
            maxLength={120}
            onChange={(e) => edit('title', e.target.value)}
          />
        </div>
        <p className="ans">As it stands in the index: Roof beam on grid C, three spans.</p>
      </div>
      <ChoiceField
        path="units"
        label="Units"
        value={draft.units}
        options={unitSets}
        onChoose={(to) => change('units', (d) => convertDraft(d, to))}
      />
      <p className="ans">
        Changing the units rewrites every value that was read; Undo brings the old ones back.
      </p>
      <div className="fld">
        <label htmlFor={basis}>Assumptions and references</label>
        <textarea
          id={basis}
          className="area"
          rows={6}
          value={draft.basis}
          maxLength={4000}
          onChange={(e) => edit('basis', e.target.value)}
        />
        <p className="ans">
          Printed in step 1, a paragraph a line: drawings, codes with edition, what is designed elsewhere. The
          assumptions of the method stand there already.
        </p>
      </div>
    </>
  );
}
