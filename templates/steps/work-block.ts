import type { BendingLine, WorkTable } from '@/lib/engine/derivation/work-table';
import { fractionTex } from '@/lib/typeset/number';
import { unitHead } from '@/lib/typeset/write-unit';
import type { EquationRow, TableRow } from '../block';
import type { Scene } from './scene';
import type { StepWriter } from './step-writer';
import { memberWords, plain } from './words';
import { cell, inline, relationRow, valueCell } from './write-lines';

interface WorkWords {
  caption: string;
  /** TeX of the diagram the areas are of, and of the ordinates. */
  area: string;
  ordinate: string;
  /** Areas are worked out in the table; otherwise they come from the table of parts. */
  worked: boolean;
  note?: string;
  source?: string;
}

/** A table of virtual work: one row a part, a total for each group; terms beside bending as lines before it. */
export function writeWork(table: WorkTable, out: StepWriter, scene: Scene, words: WorkWords): void {
  const { units } = scene;
  const others: EquationRow[] = table.groups.flatMap((g) =>
    g.lines.flatMap((l) =>
      l.kind === 'other' ? [relationRow(l.relation, units, otherNote(l.row.kind))] : [],
    ),
  );
  out.equations(
    'Terms beside bending, each $EI_0$ times a unit force times the movement that goes with it:',
    others,
  );
  const d = table.decimals;
  const length = unitHead({ force: 0, length: 1, temperature: 0 }, units);
  const height = { ...table.area, length: table.area.length - 1 };
  const several = table.groups.length > 1;
  const rows = table.groups.flatMap((g): TableRow[] => [
    ...g.lines.map((l, k): TableRow => {
      const first = k === 0 && several ? inline({ ...g.symbol, timesEI0: undefined }) : '';
      const lead = several ? [first] : [];
      if (l.kind === 'other') {
        const blank = words.worked ? ['', '', '', '', '', ''] : ['', '', ''];
        return {
          cells: [
            ...lead,
            inline(l.relation.symbol),
            otherNote(l.row.kind),
            ...blank,
            cell(l.value, d.value, units),
          ],
        };
      }
      return { cells: [...lead, ...bendingCells(l, table, scene, words)] };
    }),
    {
      cells: [
        ...(several ? [''] : []),
        inline(g.symbol),
        ...Array.from({ length: words.worked ? 7 : 4 }, () => ''),
        valueCell(g.total, units),
      ],
      emphasis: 'total',
    },
  ]);
  const worked = words.worked
    ? [
        { head: '$c$', align: 'right' as const },
        { head: '$L$', unit: length, align: 'right' as const },
        { head: `$${words.area}$`, unit: unitHead(height, units), align: 'right' as const },
        { head: `$A=c\\,L\\,${words.area}$`, unit: unitHead(table.area, units), align: 'right' as const },
      ]
    : [{ head: '$A$', unit: unitHead(table.area, units), align: 'right' as const }];
  out.table({
    caption: words.caption,
    columns: [
      ...(several ? [{ head: 'of', align: 'left' as const }] : []),
      { head: words.worked ? 'member' : 'part', align: 'left' },
      { head: words.worked ? 'shape' : 'member, shape', align: 'left' },
      ...worked,
      { head: `$${words.ordinate}$`, unit: unitHead(table.ordinate, units), align: 'right' },
      { head: '$k$', align: 'right' },
      { head: `$A\\,${words.ordinate}/k$`, unit: unitHead(table.dimension, units), align: 'right' },
    ],
    rows,
    note: words.note,
    source: words.source,
  });
}

function bendingCells(
  l: BendingLine,
  table: WorkTable,
  { placed, units }: Scene,
  words: WorkWords,
): string[] {
  const p = placed.get(l.member);
  const member = p ? memberWords(p) : plain(l.member);
  const d = table.decimals;
  const tail = [
    cell(l.area, d.area, units),
    cell(l.ordinate, d.ordinate, units),
    cell(l.k, d.k, units),
    cell(l.value, d.value, units),
  ];
  if (!words.worked) return [plain(l.part ?? ''), `${member}, ${l.shape}`, ...tail];
  return [
    member,
    l.shape,
    `$${fractionTex(l.factor.n, l.factor.d)}$`,
    cell(l.length, d.length, units),
    cell(l.height, d.height, units),
    ...tail,
  ];
}

const notes = {
  axial: 'stretching',
  shear: 'shearing',
  spring: 'spring',
  temperature: 'temperature',
  gradient: 'temperature difference',
  misfit: 'misfit',
  settlement: 'settlement',
} as const;

const otherNote = (kind: keyof typeof notes): string => notes[kind];
