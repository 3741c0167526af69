import type { ChecksStep } from '@/lib/engine/derivation/checks-step';
import type { Check } from '@/lib/engine/solution';
import { powerTex } from '@/lib/typeset/number';
import { quantityTex } from '@/lib/typeset/quantity-tex';
import { substitutionTex } from '@/lib/typeset/write-expression';
import type { Scene } from './scene';
import type { StepWriter } from './step-writer';
import { listWords, plain } from './words';
import { writeWork } from './work-block';
import { inline, sumTex } from './write-lines';

const subjects: Record<Check['kind'], string> = {
  equilibrium: 'equilibrium of every joint',
  'second-way': 'direct stiffness, all end forces and reactions',
  reciprocity: 'reciprocity, $f_{ij}-f_{ji}$',
  gap: 'every gap, integrated again from the final diagrams',
  'other-redundants': 'the same forces from other redundants',
};

/** Redundants named in one sentence. */
const named = 8;

/** Step 15: one table first, then what can be worked by hand. */
export function composeChecks(step: ChecksStep, out: StepWriter, scene: Scene): void {
  const { units } = scene;
  out.heading('Checks');
  out.paragraph(
    'All at one view. A residual is relative to the largest value of its kind, at full precision; the lines after the table work some of the checks with printed figures.',
  );
  out.table({
    caption: 'Checks.',
    columns: [
      { head: 'check', align: 'left' },
      { head: 'case', align: 'left' },
      { head: 'residual', align: 'right' },
      { head: 'tolerance', align: 'right' },
      { head: 'result', align: 'left' },
    ],
    rows: step.checks.map((c) => ({
      cells: [
        subjects[c.kind],
        plain(c.case ?? ''),
        `$${powerTex(c.residual)}$`,
        `$${powerTex(c.tolerance)}$`,
        c.holds ? 'holds' : '**does not hold**',
      ],
    })),
  });
  const { equilibrium, gap, other } = step;
  if (other) {
    const some = other.redundants.slice(0, named).map(inline);
    const more = other.redundants.length > named ? ` and ${other.redundants.length - named} more` : '';
    out.paragraph(
      `**Other redundants.** The structure was solved once more with ${listWords(some)}${more} released in place of the forces of step 4. Its equations are others (condition number $${other.condition.toPrecision(2)}$); the forces are the same to the residuals above.`,
    );
  }
  if (equilibrium) {
    const fresh = equilibrium.used ? '' : ', which no equation of step 5 used';
    const rows = equilibrium.lines.map(({ sum, relation }) => ({
      lhs: `${sumTex(sum)}\\;${substitutionTex(relation.formula, units)}=${quantityTex(relation.result, units)}`,
      chain: [],
    }));
    out.equations(
      `**Equilibrium of the whole structure** under ${plain(equilibrium.id)}, final reactions, with moments about ${plain(equilibrium.about.id)}${fresh}:`,
      rows,
    );
  }
  if (gap) {
    out.paragraph(
      `**Gap at ${inline(gap.redundant)}, integrated again** from the final moments of case ${plain(gap.id)}: triangles from both ends of each length and what the load adds, with the ordinates of $\\bar{m}_1$. The sum must be the movement of step 9.`,
    );
    writeWork(gap.table, out, scene, {
      caption: `Gap of case ${plain(gap.id)} from the final moments, times $EI_0$.`,
      area: 'M',
      ordinate: '\\bar{m}_1',
      worked: true,
    });
  }
  out.paragraph(
    '**Direct stiffness** is a path of the program of its own that shares nothing with the steps above but the input; it was run for every case and compared at every member end. The effects that step 1 leaves out are not sized here.',
  );
}
