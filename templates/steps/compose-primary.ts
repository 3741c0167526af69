import type { PrimaryStep } from '@/lib/engine/derivation/primary-step';
import { drawPrimary } from '@/lib/figures/draw-primary';
import { quantityNumber } from '@/lib/typeset/quantity-tex';
import { caseTex } from '@/lib/typeset/write-symbol';
import { unitHead } from '@/lib/typeset/write-unit';
import { endTable } from './end-table';
import { notWrittenWords } from './not-written';
import { narrow, runsOf, type Scene, wide } from './scene';
import type { StepWriter } from './step-writer';
import { capital, listWords, plain, releaseWords } from './words';
import { findsHingeForce, inline, staticsRows, staticsWords, valueCell } from './write-lines';

/** Step 5: the primary structure and its forces, one unknown at a time. */
export function composePrimary(step: PrimaryStep, out: StepWriter, scene: Scene): void {
  const { analysis, units, placed, names } = scene;
  out.heading('Primary structure');
  if (step.released.length === 0) out.paragraph('The structure itself. One unknown at a time:');
  else if (step.released.length <= 12) {
    const acts = step.released.map((r) => releaseWords(r.quantity, analysis, placed, names.beam));
    out.paragraph(
      `${capital(listWords(acts))}. What is left is determinate and stable. Subscript 0 marks its forces under the loads.`,
    );
  } else
    out.paragraph(
      `With the ${step.released.length} redundants of step 4 released, what is left is determinate and stable. Subscript 0 marks its forces under the loads.`,
    );
  if (hasHingeForces(step)) {
    out.paragraph(
      '$F$ with the name of a member is the force on its end at a hinge, in $x$ or $y$; the piece beyond the hinge feels it with the opposite sign.',
    );
  }
  if (scene.figures) figures(step, out, scene);
  if (step.notWritten) {
    out.paragraph(notWrittenWords(step.notWritten));
    return;
  }
  step.cases.forEach((c, k) => {
    // What keeps one case from being written keeps all; cases like those before it need no word.
    if (c.notWritten && c.notWritten.why !== 'alike' && (k === 0 || c.notWritten.why === 'couple'))
      out.paragraph(`**Case ${plain(c.id)}.** ${notWrittenWords(c.notWritten)}`);
    if (c.steps.length === 0) return;
    if (k === 0) {
      c.steps.forEach((s, i) => {
        const lead = i === 0 ? `**Case ${plain(c.id)}.** ` : '';
        out.equations(`${lead}${staticsWords(s, placed, units)}`, staticsRows(s, units));
      });
      return;
    }
    const rows = c.steps.flatMap((s) => staticsRows(s, units));
    const arms = c.steps.flatMap((s) => s.arms);
    const armed =
      arms.length === 0
        ? ''
        : ` Arms: ${listWords(arms.map((a) => `${a.symbol ? inline(a.symbol) : ''} $=${quantityNumber(a, units)}\\unit{${units === 'US' ? 'ft' : 'm'}}$`))}.`;
    out.equations(`**Case ${plain(c.id)}.** The same way.${armed}`, rows);
  });
  reactions(step, out, scene);
  for (const c of step.cases) {
    out.table(
      endTable(c.ends, scene, {
        caption: `End forces of the primary structure, case ${plain(c.id)}.`,
        mark: '_0',
      }),
    );
  }
}

const hasHingeForces = (step: PrimaryStep): boolean => step.cases.some((c) => c.steps.some(findsHingeForce));

function figures(step: PrimaryStep, out: StepWriter, { analysis, solution }: Scene): void {
  const draw = (width: number) =>
    analysis.cases
      .slice(0, 2)
      .map((loadCase) =>
        drawPrimary(analysis, solution.redundants, { width, loadCase, title: `case ${plain(loadCase.id)}` }),
      );
  const pair = analysis.cases.slice(0, 2).length;
  if (step.released.length > 0)
    out.figure(
      'Primary structure with its loads; what is released is shown by its redundant.',
      draw(wide / Math.max(1, pair)),
      () => draw(narrow),
    );
}

function reactions(step: PrimaryStep, out: StepWriter, { units }: Scene): void {
  const [first] = step.cases;
  if (!first || step.cases.length < 2) return;
  const kept = first.reactions.filter((_, k) =>
    step.cases.some((c) => Math.abs(c.reactions[k]?.value ?? 0) > 0),
  );
  const index = first.reactions.flatMap((r, k) => (kept.includes(r) ? [k] : []));
  for (const run of runsOf(step.cases))
    out.table({
      caption: 'Reactions of the primary structure.',
      columns: [
        { head: 'reaction', align: 'left' },
        { head: 'unit', align: 'left' },
        ...run.map((c) => ({ head: `$${caseTex(c.id)}$`, align: 'right' as const })),
      ],
      rows: index.map((k) => {
        const r = first.reactions[k];
        const symbol = r?.symbol ? { ...r.symbol, super: undefined } : undefined;
        return {
          cells: [
            symbol ? inline(symbol) : '',
            r ? `$${unitHead(r.dimension, units) ?? ''}$` : '',
            ...run.map((c) => {
              const v = c.reactions[k];
              return v ? valueCell(v, units) : '–';
            }),
          ],
        };
      }),
      note: 'Reactions that are not in the table are zero.',
    });
}
