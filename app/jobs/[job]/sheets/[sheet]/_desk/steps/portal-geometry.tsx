'use client';

import type { DraftGeometry, DraftStiffness } from '@/lib/model/draft';
import { useDesk } from '../desk-context';
import { QuantityField } from '../quantity-field';
import type { Column } from '../table/column';
import { stiffnessColumns } from './stiffness-columns';

type Portal = Extract<DraftGeometry, { shape: 'portal' }>;

const parts = [
  { key: 'leftColumn', name: 'left column 1–2', id: '1-2' },
  { key: 'beam', name: 'beam 2–3', id: '2-3' },
  { key: 'rightColumn', name: 'right column 3–4', id: '3-4' },
] as const;

/** Two columns and a beam. */
export function PortalGeometry({ geometry: g }: { geometry: Portal }) {
  const { draft, light } = useDesk();
  const columns: Column<{ stiffness: DraftStiffness }>[] = stiffnessColumns(draft);
  return (
    <>
      <div className="fields">
        <QuantityField path="geometry.span" label="Span" text={g.span} kind="length" />
        <QuantityField path="geometry.leftHeight" label="Left height" text={g.leftHeight} kind="length" />
        <QuantityField path="geometry.rightHeight" label="Right height" text={g.rightHeight} kind="length" />
      </div>
      {parts.map(({ key, name, id }) => (
        <fieldset key={key} onFocus={() => light({ of: 'member', id })}>
          <legend className="mt-3 font-semibold">{name}</legend>
          <div className="fields">
            {columns.map((c) => (
              <QuantityField
                key={c.key}
                path={`geometry.${key}.${c.field.replace('stiffness.', '')}`}
                label={c.head}
                text={c.read({ stiffness: g[key] })}
                kind={typeof c.kind === 'string' ? c.kind : 'number'}
                optional={c.key !== 'k' && c.key !== 'I'}
              />
            ))}
          </div>
        </fieldset>
      ))}
    </>
  );
}
