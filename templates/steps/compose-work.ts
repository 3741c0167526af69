import type { WorkStep } from '@/lib/engine/derivation/work-step';
import { unitHead } from '@/lib/typeset/write-unit';
import { notWrittenWords } from './not-written';
import type { Scene } from './scene';
import type { StepWriter } from './step-writer';
import { listWords, plain } from './words';
import { writeWork } from './work-block';
import { inline, valueCell } from './write-lines';

const theorem = 'unit-load theorem (Maxwell 1864, Mohr 1874); area times ordinate: Vereshchagin';

const beside = {
  axial: '\\sum\\frac{EI_0\\,\\bar{N}_i\\,N_0\\,L}{EA}',
  shear: '\\sum\\frac{EI_0\\,\\bar{V}_i\\,V_0\\,L}{GA_s}',
  spring: '\\sum\\frac{EI_0\\,\\bar{R}_i\\,R_0}{k_s}',
  temperature: '\\sum EI_0\\,\\bar{N}_i\\,\\alpha\\,T\\,L',
  gradient: '\\sum EI_0\\,\\bar{A}_i\\,\\kappa',
  misfit: '\\sum EI_0\\,\\bar{N}_i\\,d',
  settlement: '-\\sum EI_0\\,\\bar{R}_i\\,\\Delta',
} as const;

/** Step 8: the formula, then tables of f and of δ. */
export function composeWork(step: WorkStep, out: StepWriter, scene: Scene): void {
  out.heading('Virtual work');
  const n = scene.solution.redundants.length;
  if (n === 0) {
    out.paragraph('There is no release, so there is no gap to work out.');
    return;
  }
  const terms = [...step.terms].map((t) => beside[t]);
  const extra = terms.map((t) => (t.startsWith('-') ? t : `+${t}`)).join('');
  out.equations(
    `The movement at release $i$, in the sense of $X_i$, is the virtual work of unit state $i$: $\\delta_{i0}$ under the loads, $f_{ij}$ for $X_j=1$. Because every $\\bar{m}$ is straight, each integral is an area $A$ times the ordinate at its centroid, over $k$:`,
    [
      { lhs: 'EI_0\\,\\delta_{i0}', chain: [`\\sum\\int\\frac{M_0\\,\\bar{m}_i}{k}\\dd{s}${extra}`] },
      {
        lhs: 'EI_0\\,f_{ij}',
        chain: ['\\sum\\int\\frac{\\bar{m}_i\\,\\bar{m}_j}{k}\\dd{s}'],
        note: step.terms.has('spring') ? 'and the springs alike' : undefined,
      },
    ],
    theorem,
  );
  if (step.notWritten) {
    out.paragraph(notWrittenWords(step.notWritten));
    return;
  }
  explain(step, out);
  if (step.rows) {
    for (const table of step.flexibility) {
      writeWork(table, out, scene, {
        caption: 'Flexibility coefficients times $EI_0$.',
        area: '\\bar{m}_j',
        ordinate: '\\bar{m}_i',
        worked: true,
        note: 'In $f_{ij}$ the area is that of one unit diagram and the ordinate that of the other; $f_{ij}=f_{ji}$. Coefficients that are not in the table are zero: their unit states act on nothing in common.',
      });
    }
    for (const g of step.gaps) {
      for (const table of g.tables) {
        writeWork(table, out, scene, {
          caption: `Gaps under case ${plain(g.case)}, times $EI_0$.`,
          area: 'A',
          ordinate: '\\bar{m}_i',
          worked: false,
          note: 'Areas and centroids from step 6, ordinates from the end values of step 7.',
        });
      }
    }
    return;
  }
  totals(step, out, scene);
}

function explain(step: WorkStep, out: StepWriter): void {
  const said: string[] = [];
  if (step.terms.has('temperature')) said.push('a member warmed by $T$ grows by $\\alpha TL$');
  if (step.terms.has('gradient'))
    said.push(
      'a difference of temperature between the faces bends a member to the curvature $\\kappa$ and works on the area $\\bar{A}$ of the unit moments',
    );
  if (step.terms.has('misfit')) said.push('a member made too long by $d$ works with $\\bar{N}d$');
  if (step.terms.has('settlement'))
    said.push('a support that moves by $\\Delta$ takes the work $\\bar{R}\\Delta$ away');
  if (step.terms.has('spring'))
    said.push('a spring of stiffness $k_s$ shortens by its force over its stiffness');
  if (said.length > 0) out.paragraph(`Beside bending: ${listWords(said)}.`);
}

/** Many redundants: totals only, each from the end moments of steps 5 and 7. */
function totals(step: WorkStep, out: StepWriter, scene: Scene): void {
  const { units } = scene;
  out.paragraph(
    'With so many redundants the coefficients are tabled. Each is worked from the end moments of step 7: a member of length $L$ with $a_i$, $b_i$ at its ends in state $i$ and $a_j$, $b_j$ in state $j$ adds $L\\,(2a_ia_j+a_ib_j+b_ia_j+2b_ib_j)/(6k)$ to $EI_0f_{ij}$; a part of area $A$ adds $A\\,\\bar{m}_i/k$ to $EI_0\\delta_{i0}$.',
  );
  for (const table of step.flexibility) {
    out.table({
      caption: 'Flexibility coefficients times $EI_0$.',
      columns: [
        { head: 'coefficient', align: 'left' },
        { head: '$EI_0f_{ij}$', unit: unitHead(table.dimension, units), align: 'right' },
      ],
      rows: table.groups.map((g) => ({
        cells: [inline(g.symbol), valueCell(g.total, units)],
      })),
      note: 'Coefficients that are not in the table are zero; $f_{ij}=f_{ji}$.',
    });
  }
  for (const g of step.gaps) {
    for (const table of g.tables) {
      out.table({
        caption: `Gaps under case ${plain(g.case)}, times $EI_0$.`,
        columns: [
          { head: 'gap', align: 'left' },
          { head: '$EI_0\\delta_{i0}$', unit: unitHead(table.dimension, units), align: 'right' },
        ],
        rows: table.groups.map((w) => ({
          cells: [inline(w.symbol), valueCell(w.total, units)],
        })),
      });
    }
  }
}
