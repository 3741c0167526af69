import type { Draft, DraftStiffness } from '@/lib/model/draft';
import type { Column } from '../table/column';

type Has = { stiffness: DraftStiffness };
type Field = Exclude<keyof DraftStiffness, 'section'>;

function column<Row extends Has>(
  field: Field,
  head: string,
  unit: string | undefined,
  kind: NonNullable<Column<Row>['kind']>,
  width: string,
): Column<Row> {
  return {
    key: field,
    head,
    unit,
    width,
    align: 'right',
    kind,
    field: `stiffness.${field}`,
    read: (row) => row.stiffness[field],
    write: (row, text) => ({ ...row, stiffness: { ...row.stiffness, [field]: text } }),
  };
}

/** Columns that say how stiff a member is: a multiple of EI0, or I with E of the sheet; A only where stretching counts. */
export function stiffnessColumns<Row extends Has>(sheet: Draft): Column<Row>[] {
  const us = sheet.units === 'US';
  const area = us ? 'in²' : 'cm²';
  const first: Column<Row> =
    sheet.stiffness.kind === 'relative'
      ? column('k', 'EI / EI₀', undefined, 'number', '88px')
      : column('I', 'I', us ? 'in⁴' : 'cm⁴', 'inertia', '96px');
  return [
    first,
    column('A', 'A', area, 'area', '80px'),
    column('depth', 'depth', us ? 'in' : 'mm', 'sectionLength', '76px'),
    column('weight', 'weight', us ? 'kip/ft' : 'kN/m', 'distributed', '84px'),
  ];
}
