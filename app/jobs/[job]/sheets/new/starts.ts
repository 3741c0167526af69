import type { StartName } from '@/lib/model/starting-choice';

export interface StartField {
  name: string;
  label: string;
  note?: string;
  /** Given: one of these; else a size that is typed. */
  choices?: { value: string; label: string }[];
}

const bases: StartField = {
  name: 'bases',
  label: 'Bases',
  choices: [
    { value: 'pinned', label: 'pinned' },
    { value: 'fixed', label: 'fixed' },
  ],
};

/** The starting sheets in the order of the gallery, each with what it asks for before the sheet is made. */
export const starts: { start: StartName; label: string; says: string; fields: StartField[] }[] = [
  {
    start: 'single',
    label: 'Single span',
    says: 'Propped, fixed at both ends, simply supported, or overhanging.',
    fields: [
      {
        name: 'ends',
        label: 'Ends',
        choices: [
          { value: 'propped', label: 'one fixed, one on a prop' },
          { value: 'fixed', label: 'both fixed' },
          { value: 'simple', label: 'simply supported' },
          { value: 'overhang', label: 'fixed, supported, overhanging' },
        ],
      },
    ],
  },
  { start: 'beam', label: 'Beam', says: 'Spans in a line on any number of supports.', fields: [] },
  {
    start: 'portal',
    label: 'Portal frame',
    says: 'One bay: two columns, one beam, bases of any kind.',
    fields: [],
  },
  {
    start: 'gable',
    label: 'Gable frame',
    says: 'Two columns and two rafters that meet at a ridge.',
    fields: [
      { name: 'span', label: 'Span' },
      { name: 'eaves', label: 'Height of the eaves' },
      { name: 'ridge', label: 'Height of the ridge' },
      bases,
    ],
  },
  {
    start: 'knee',
    label: 'Knee frame',
    says: 'A column and a beam that meet rigidly.',
    fields: [
      { name: 'height', label: 'Height of the column' },
      { name: 'span', label: 'Span of the beam' },
      { ...bases, label: 'Base' },
      {
        name: 'far',
        label: 'Far end of the beam',
        choices: [
          { value: 'roller', label: 'on a roller' },
          { value: 'pinned', label: 'pinned' },
          { value: 'fixed', label: 'fixed' },
        ],
      },
    ],
  },
  {
    start: 'storeys',
    label: 'Bays and storeys',
    says: 'Columns and beams in a grid, rigidly joined.',
    fields: [
      { name: 'bays', label: 'Widths of the bays', note: 'From the left; 3 @ means three of the same.' },
      { name: 'heights', label: 'Heights of the storeys', note: 'From the ground up.' },
      bases,
    ],
  },
  {
    start: 'frame',
    label: 'Frame',
    says: 'Any joints, members, hinges and supports in a plane.',
    fields: [],
  },
];
