import type { ForcesStep } from '@/lib/engine/derivation/forces-step';
import { caseTex } from '@/lib/typeset/write-symbol';
import { unitHead } from '@/lib/typeset/write-unit';
import { endTable } from './end-table';
import { runsOf, type Scene } from './scene';
import type { StepWriter } from './step-writer';
import { plain } from './words';
import { inline, relationRow, valueCell } from './write-lines';

/** Step 11: superposition; one case in full, all cases in tables. */
export function composeForces(step: ForcesStep, out: StepWriter, scene: Scene): void {
  const { units, solution } = scene;
  out.heading('Reactions and end forces');
  if (solution.redundants.length === 0) out.paragraph('They are those of step 5.');
  else if (step.notWritten) {
    out.paragraph(
      'The forces under the loads and those of the self-stress states around single cells, times what the solution gives each, add up to those of the tables.',
    );
  } else {
    out.paragraph(
      'Everything follows by superposition: $R=R_0+\\sum X_i\\bar{R}_i$, and $N$, $V$, $M$ in the same way from the tables of steps 5, 7 and 10.',
    );
  }
  if (step.example) {
    const { id, reactions, moments } = step.example;
    out.equations(
      `**Case ${plain(id)}.** Reactions:`,
      reactions.map((r) => relationRow(r, units)),
    );
    out.equations(
      `**Case ${plain(id)}.** Moments at the ends of members:`,
      moments.map((r) => relationRow(r, units)),
    );
  }
  for (const run of runsOf(step.cases)) {
    const [first] = run;
    out.table({
      caption: 'Reactions.',
      columns: [
        { head: 'reaction', align: 'left' },
        { head: 'unit', align: 'left' },
        ...run.map((c) => ({ head: `$${caseTex(c.id)}$`, align: 'right' as const })),
      ],
      rows: (first?.reactions ?? []).map((r, k) => ({
        cells: [
          inline({ ...(r.symbol ?? { letter: 'R' }), super: undefined }),
          `$${unitHead(r.dimension, units) ?? ''}$`,
          ...run.map((c) => {
            const v = c.reactions[k];
            return v ? valueCell(v, units) : '–';
          }),
        ],
      })),
    });
  }
  for (const c of step.cases) {
    out.table(endTable(c.ends, scene, { caption: `End forces, case ${plain(c.id)}.` }));
  }
}
