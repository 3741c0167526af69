'use client';

import { ChoiceField } from '../choice-field';
import { useDesk } from '../desk-context';
import { QuantityField } from '../quantity-field';

const bases = [
  { value: 'relative', label: 'multiples of one EI₀' },
  { value: 'absolute', label: 'E and I of each member' },
] as const;

/** How stiffness is given on this sheet, with what all members share. */
export function StiffnessFields() {
  const { draft } = useDesk();
  const s = draft.stiffness;
  const relative = s.kind === 'relative';
  return (
    <div className="fields">
      <ChoiceField path="stiffness.kind" label="Stiffness is given as" value={s.kind} options={bases} />
      {relative ? (
        <QuantityField
          path="stiffness.EI0"
          label="EI₀"
          text={s.EI0}
          kind="bendingStiffness"
          optional
          hint="Needed for deflections, settlement, temperature and springs."
        />
      ) : (
        <QuantityField path="stiffness.E" label="E of every member" text={s.E} kind="modulus" />
      )}
      <QuantityField
        path="stiffness.alpha"
        label="Expansion per degree"
        text={s.alpha}
        kind="expansion"
        optional
      />
    </div>
  );
}
