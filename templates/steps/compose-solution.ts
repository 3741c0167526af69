import type { EliminationRow } from '@/lib/engine/derivation/elimination';
import type { SolutionStep } from '@/lib/engine/derivation/solution-step';
import { formulaTex } from '@/lib/typeset/write-expression';
import { caseTex, symbolTex } from '@/lib/typeset/write-symbol';
import { unitHead } from '@/lib/typeset/write-unit';
import { rightSideTex } from './compose-compatibility';
import { runsOf, type Scene } from './scene';
import type { StepWriter } from './step-writer';
import { listWords, plain, quantityWords } from './words';
import { cell, inline, relationRow, valueCell } from './write-lines';

/** Step 10: the redundants, and what their signs mean. */
export function composeSolution(step: SolutionStep, out: StepWriter, scene: Scene): void {
  out.heading('Solution');
  const { units, solution } = scene;
  const n = solution.redundants.length;
  if (n === 0) {
    out.paragraph('Nothing to solve.');
    return;
  }
  if (step.single.length > 0)
    out.equations(
      undefined,
      step.single.map((r) => relationRow(r, units)),
    );
  else if (step.elimination) {
    out.equations(
      '**Elimination.** Row $i$ less $\\mu_{ij}$ times row $j$ takes $X_j$ out of row $i$. Multipliers, with $f_{ji}=f_{ij}$:',
      step.elimination.multipliers.map((r) => relationRow(r, units)),
    );
    out.equations(
      'The matrix stays symmetric, so only entries on and right of the diagonal are written. Those that change:',
      step.elimination.entries.map((r) => relationRow(r, units)),
    );
    const moved = solution.work.gaps.some((g) => g.rightSide !== 0);
    const ids = step.values.map((v) => v.id);
    for (const run of runsOf(ids.map((id, k) => ({ id, k })))) {
      out.table({
        caption: 'Right sides, and back from the last row to the first.',
        columns: [
          { head: 'row', align: 'left' },
          { head: 'unit', align: 'left' },
          ...run.map((c) => ({ head: `$${caseTex(c.id)}$`, align: 'right' as const })),
        ],
        rows: step.elimination.rows.map((row) => ({
          cells: [
            `$${rowTex(row, units, moved)}$`,
            `$${unitHead(row.dimension, units) ?? ''}$`,
            ...run.map((c) => cell(row.cells[c.k], row.decimals, units)),
          ],
          emphasis: row.back ? 'governing' : undefined,
        })),
      });
    }
  } else results(step, out, scene);
  out.paragraph(meaning(step, scene));
}

/** How a row of the table follows from the rows above: b_2 − μ_21 b_1, (b_1 − f_12 X_2)/f_11. */
function rowTex(row: EliminationRow, units: Scene['units'], moved: boolean): string {
  const label = symbolTex(row.label);
  if (row.less) {
    const { from, multiplier, other } = row.less;
    return `${label}=${symbolTex(from)}-${formulaTex(multiplier, units)}\\,${symbolTex(other)}`;
  }
  if (row.back) {
    const { from, terms, pivot } = row.back;
    const over = [
      symbolTex(from),
      ...terms.map((t) => `-${formulaTex(t.f, units)}\\,${symbolTex(t.X)}`),
    ].join('');
    return `${label}=(${over})/(${formulaTex(pivot, units)})`;
  }
  return rightSideTex(Number(row.label.sub?.[0]) - 1, moved);
}

function results(step: SolutionStep, out: StepWriter, { units }: Scene): void {
  out.paragraph(
    'The matrix is factored once (it is symmetric and positive definite) and every case is solved with it. The redundants:',
  );
  for (const run of runsOf(step.values)) {
    out.table({
      caption: 'Redundants.',
      columns: [
        { head: 'redundant', align: 'left' },
        { head: 'unit', align: 'left' },
        ...run.map((c) => ({ head: `$${caseTex(c.id)}$`, align: 'right' as const })),
      ],
      rows: (run[0]?.X ?? []).map((X, i) => ({
        cells: [
          inline({ ...(X.symbol ?? { letter: 'X' }), super: undefined }),
          `$${unitHead(X.dimension, units) ?? ''}$`,
          ...run.map((c) => {
            const v = c.X[i];
            return v ? valueCell(v, units) : '–';
          }),
        ],
      })),
    });
  }
}

function meaning(step: SolutionStep, scene: Scene): string {
  const { solution, analysis, placed, names } = scene;
  const [q] = solution.redundants;
  const all = step.values.flatMap((v) => v.X.map((X) => ({ id: v.id, X })));
  const negative = all.filter(({ X }) => X.value < 0 && Math.abs(X.value) > 10 ** -X.decimals);
  if (solution.redundants.length === 1 && q) {
    const sense = quantityWords(q, analysis, placed, names.beam);
    if (negative.length === 0)
      return `**Sign.** No result is negative: the redundant acts in its positive sense (${sense}). A negative result would have meant the opposite sense; it would be carried on with its sign, and nothing would be solved again.`;
    return `**Sign.** $X_1$ is the ${sense}. It is negative under ${listWords(negative.map((x) => plain(x.id)))}: there it acts in the opposite sense. It is carried on with its sign, and nothing is solved again.`;
  }
  const moments = names.beam && solution.redundants.every((r) => r.kind === 'moment');
  if (moments)
    return '**Sign.** A negative result means tension above, which is what support moments do under load on the spans beside them. A positive one means that this load lifts the beam over the support and relieves it. Nothing is solved again.';
  return `**Sign.** A negative result means the sense opposite to that of step 4 (${negative.length === 0 ? 'there is none here' : 'it is carried on with its sign'}); nothing is solved again.`;
}
