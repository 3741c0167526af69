import type { CombinationsStep } from '@/lib/engine/derivation/combinations-step';
import type { CombinedRow } from '@/lib/engine/derivation/combined-rows';
import { drawDiagram } from '@/lib/figures/draw-diagram';
import { drawEnvelope } from '@/lib/figures/draw-envelope';
import { writeNumber } from '@/lib/figures/write-number';
import { caseTex } from '@/lib/typeset/write-symbol';
import { unitHead } from '@/lib/typeset/write-unit';
import type { TableColumn, TableRow } from '../block';
import { narrow, type Scene, wide } from './scene';
import type { StepWriter } from './step-writer';
import { memberWords, plain } from './words';
import { cell, inline, relationRow } from './write-lines';

/** Combinations stand as columns up to this many together with their cases; more are named by their extremes. */
const abreast = 7;

/** Step 14: factors with their sources, one combination in full, all quantities, what governs. */
export function composeCombinations(step: CombinationsStep, out: StepWriter, scene: Scene): void {
  out.heading('Combinations');
  if (step.combinations.length === 0) {
    out.paragraph('No combination is asked for on this sheet; the cases stand by themselves.');
    return;
  }
  factors(step, out, scene);
  if (step.example) {
    out.equations(
      `**Combination ${plain(step.example.id)}** worked in full:`,
      step.example.lines.map((r) => relationRow(r, scene.units)),
    );
  }
  out.paragraph(
    'Every end force and reaction is linear in the cases, so each combination is one line from the columns of the cases. Greatest values within a span do not superpose, since their place moves; they are taken from the summed diagrams.',
  );
  rows('Reactions in the combinations.', step.reactions, step, out, scene);
  rows(
    'End forces in the combinations. What is the same at both ends of a member stands once.',
    step.ends,
    step,
    out,
    scene,
  );
  if (step.notWritten)
    out.paragraph(
      `The end forces of ${scene.analysis.members.length} members in every combination are not tabled; the greatest of each member follow below and in step 16.`,
    );
  spans(step, out, scene);
  if (scene.figures) figures(step, out, scene);
}

function sumTex(factorOf: Record<string, number>, decimals: number, units: Scene['units']): string {
  return Object.entries(factorOf)
    .map(([id, f], i) => `${i > 0 && f >= 0 ? '+' : ''}${writeNumber(f, decimals, units)}\\,${caseTex(id)}`)
    .join('');
}

function factors(step: CombinationsStep, out: StepWriter, { units }: Scene): void {
  out.table({
    caption: 'Combinations.',
    columns: [
      { head: 'combination', align: 'left' },
      { head: 'for', align: 'left' },
      { head: 'sum', align: 'left' },
      { head: 'source', align: 'left' },
    ],
    rows: step.combinations.map((c) => ({
      cells: [
        plain(c.id),
        c.purpose,
        `$${sumTex(c.factors, step.factorDecimals, units)}$`,
        plain(c.source ?? ''),
      ],
    })),
  });
}

function rows(
  caption: string,
  list: readonly CombinedRow[],
  step: CombinationsStep,
  out: StepWriter,
  scene: Scene,
): void {
  const { units, analysis } = scene;
  const cases = analysis.cases.map((c) => c.id);
  const side = cases.length + step.combinations.length <= abreast;
  const caseColumns = cases.length <= abreast ? cases : [];
  const columns: TableColumn[] = [
    { head: 'quantity', align: 'left' },
    { head: 'unit', align: 'left' },
    ...caseColumns.map((id): TableColumn => ({ head: `$${caseTex(id)}$`, align: 'right' })),
  ];
  if (side) {
    columns.push(
      ...step.combinations.map(
        (c): TableColumn => ({
          head: `${plain(c.id)}: $${sumTex(c.factors, step.factorDecimals, units)}$`,
          align: 'right',
        }),
      ),
    );
    columns.push({ head: 'most, least', align: 'left' });
  } else {
    columns.push(
      { head: 'greatest', align: 'right' },
      { head: 'by', align: 'left' },
      { head: 'least', align: 'right' },
      { head: 'by', align: 'left' },
    );
  }
  const of = (row: CombinedRow): TableRow => {
    const lead = [
      inline(row.symbol),
      `$${unitHead(row.dimension, units) ?? ''}$`,
      ...caseColumns.map((id) => cell(row.cases[id], row.caseDecimals, units)),
    ];
    const shown = (id: string) => cell(row.combinations[id], row.decimals, units);
    if (!side)
      return {
        cells: [...lead, shown(row.greatest), plain(row.greatest), shown(row.least), plain(row.least)],
      };
    const bold = (id: string) => (id === row.greatest || id === row.least ? `**${shown(id)}**` : shown(id));
    return {
      cells: [
        ...lead,
        ...step.combinations.map((c) => bold(c.id)),
        `${plain(row.greatest)}, ${plain(row.least)}`,
      ],
    };
  };
  out.table({ caption, columns, rows: list.map(of) });
}

function spans(step: CombinationsStep, out: StepWriter, { units, placed, plan }: Scene): void {
  const moment = unitHead({ force: 1, length: 1, temperature: 0 }, units);
  const length = unitHead({ force: 0, length: 1, temperature: 0 }, units);
  out.table({
    caption: 'Greatest and least moments along each member over the strength combinations.',
    columns: [
      { head: 'member', align: 'left' },
      { head: 'greatest $M$', unit: moment, align: 'right' },
      { head: 'at $s$', unit: length, align: 'right' },
      { head: 'by', align: 'left' },
      { head: 'least $M$', unit: moment, align: 'right' },
      { head: 'at $s$', unit: length, align: 'right' },
      { head: 'by', align: 'left' },
    ],
    rows: step.spans.slice(0, 150).map(({ member, max, min }) => {
      const p = placed.get(member);
      return {
        cells: [
          p ? memberWords(p) : plain(member),
          cell(max.M, plan.moment, units),
          cell(max.s, plan.length, units),
          plain(max.by),
          cell(min.M, plan.moment, units),
          cell(min.s, plan.length, units),
          plain(min.by),
        ],
      };
    }),
  });
}

function figures(step: CombinationsStep, out: StepWriter, { analysis, solution, names, plan }: Scene): void {
  const strength = solution.envelopes.filter((e) => e.purpose === 'strength');
  if (strength.length > 0 && step.combinations.length > 1) {
    const moment = (width: number) =>
      drawEnvelope(analysis, strength, { which: 'M', width, decimals: plan.moment });
    const shear = (width: number) =>
      drawEnvelope(analysis, strength, { which: 'V', width, decimals: plan.force });
    if (names.beam) {
      out.figure('Envelope of $M$ over the strength combinations.', [moment(wide)], () => [moment(narrow)]);
      out.figure('Envelope of $V$ over the strength combinations.', [shear(wide)], () => [shear(narrow)]);
    } else
      out.figure(
        'Envelopes of $M$ and $V$ over the strength combinations.',
        [moment(wide / 2), shear(wide / 2)],
        () => [moment(narrow), shear(narrow)],
      );
    return;
  }
  const [only] = solution.combinations;
  if (only) {
    const draw = (width: number) =>
      drawDiagram(analysis, only.members, { which: 'M', width, decimals: plan.moment });
    out.figure(`$M$ of combination ${plain(only.id)}.`, [draw(wide)], () => [draw(narrow)]);
  }
}
