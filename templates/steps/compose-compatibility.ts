import type { CompatibilityStep } from '@/lib/engine/derivation/compatibility-step';
import { quantityTex } from '@/lib/typeset/quantity-tex';
import { caseTex, symbolTex } from '@/lib/typeset/write-symbol';
import { unitHead } from '@/lib/typeset/write-unit';
import type { EquationRow } from '../block';
import { notWrittenWords } from './not-written';
import { runsOf, type Scene } from './scene';
import type { StepWriter } from './step-writer';
import { countWords, plain } from './words';
import { inline, inlineValue, relationRow, valueCell } from './write-lines';

/** Coefficients stand side by side up to this many. */
const abreast = 6;
const written = 12;

/** Step 9: the gaps are closed; in symbols, then with figures. */
export function composeCompatibility(step: CompatibilityStep, out: StepWriter, scene: Scene): void {
  out.heading('Compatibility');
  const n = step.redundants.length;
  const { units } = scene;
  if (n === 0) {
    out.paragraph(
      'There is nothing to solve: the structure is determinate, and equilibrium has already given every force.',
    );
    return;
  }
  if (step.notWritten) {
    out.paragraph(notWrittenWords(step.notWritten));
    return;
  }
  const moved = step.cases.some((c) => c.rightSides.some((r) => r.value !== 0));
  const closing = moved
    ? 'At each release the movement is the one prescribed there, $\\Delta_i$, or none:'
    : n === 1
      ? 'The structure is whole at the release: the redundant closes the gap.'
      : 'The structure is whole at every release: the redundants close the gaps.';
  const threeMoments = scene.names.beam && step.redundants.every((r) => r.quantity.kind === 'moment');
  const source =
    threeMoments && n > 1 ? 'with rigid supports: the three-moment equation (Clapeyron 1857)' : undefined;
  if (n <= written) {
    out.equations(
      `${closing} In symbols:`,
      step.redundants.map((_, i) => symbolic(step, i, moved)),
      source,
    );
  } else {
    out.equations(
      `${closing} In symbols, for $i=1$ to $${n}$:`,
      [{ lhs: `\\sum_{j=1}^{${n}}f_{ij}\\,X_j+\\delta_{i0}=${moved ? '\\Delta_i' : '0'}`, chain: [] }],
      source,
    );
  }
  out.equations(
    'Prescribed movements in the sense of the redundants, times $EI_0$:',
    step.movements.map((r) => relationRow(r, units)),
  );
  if (n === 1) {
    const rows = step.cases.map((c): EquationRow => {
      const f = step.matrix[0]?.[0];
      const [gap, right] = [c.gaps[0], c.rightSides[0]];
      const X = symbolTex({ letter: 'X', sub: ['1'], super: c.id });
      const lhs =
        gap && f
          ? `${quantityTex(gap, units)}+${quantityTex(f, units)}\\times ${X}=${right && right.value !== 0 ? quantityTex(right, units) : '0'}`
          : '';
      return { lhs: `\\text{${plain(c.id)}:}\\quad ${lhs}`, chain: [] };
    });
    out.equations('With figures, times $EI_0$:', rows);
    return;
  }
  if (n > written) {
    out.paragraph(
      'The coefficients and gaps are those of the tables of step 8; they stand once for every case.',
    );
    return;
  }
  withFigures(step, out, scene, moved);
}

function symbolic(step: CompatibilityStep, i: number, moved: boolean): EquationRow {
  const terms = step.redundants.flatMap((r, j) => {
    const f = step.matrix[i]?.[j];
    return f && f.value !== 0 && f.symbol
      ? [`${symbolTex({ ...f.symbol, timesEI0: undefined })}\\,${symbolTex(r.symbol)}`]
      : [];
  });
  const gap = symbolTex({ letter: 'δ', sub: i > 8 ? [`${i + 1}`, ',', '0'] : [`${i + 1}0`] });
  return { lhs: `${[...terms, gap].join('+')}=${moved ? `\\Delta_{${i + 1}}` : '0'}`, chain: [] };
}

/** b_i = −EI0 δ_i0, with the prescribed movement where there is one. */
export function rightSideTex(i: number, moved: boolean): string {
  const gap = symbolTex({ letter: 'δ', sub: i > 8 ? [`${i + 1}`, ',', '0'] : [`${i + 1}0`], timesEI0: true });
  const own = symbolTex({ letter: 'Δ', sub: [`${i + 1}`], timesEI0: true });
  return `b_{${i + 1}}=${moved ? own : ''}-${gap}`;
}

function withFigures(step: CompatibilityStep, out: StepWriter, { units }: Scene, moved: boolean): void {
  const cases = step.cases.length;
  const said = `With figures, times $EI_0$; ${cases > 1 ? `the equations stand once for ${cases === 2 ? 'both' : `all ${countWords(cases)}`} cases` : 'the right side is the gap with its sign turned'}:`;
  out.paragraph(said);
  runsOf(
    step.redundants.map((r, j) => ({ ...r, j })),
    abreast,
  ).forEach((run) => {
    out.table({
      caption: 'Coefficients $EI_0f_{ij}$.',
      columns: [
        { head: 'equation', align: 'left' },
        ...run.map((r) => ({ head: inline(r.symbol), align: 'right' as const })),
      ],
      rows: step.redundants.map((_, i) => ({
        cells: [`$${i + 1}$`, ...run.map(({ j }) => cellOf(step, i, j, units))],
      })),
      note: mixed(step)
        ? 'A coefficient without figures is zero.'
        : `In $${unitHead(step.matrix[0]?.[0]?.dimension ?? { force: 0, length: 1, temperature: 0 }, units) ?? '1'}$. A coefficient without figures is zero.`,
    });
  });
  runsOf(step.cases).forEach((run) => {
    out.table({
      caption: 'Right sides $b_i$.',
      columns: [
        { head: 'equation', align: 'left' },
        { head: 'unit', align: 'left' },
        ...run.map((c) => ({ head: `$${caseTex(c.id)}$`, align: 'right' as const })),
      ],
      rows: step.redundants.map((_, i) => ({
        cells: [
          `$${rightSideTex(i, moved)}$`,
          `$${unitHead(step.cases[0]?.gaps[i]?.dimension ?? { force: 0, length: 0, temperature: 0 }, units) ?? ''}$`,
          ...run.map((c) => {
            const [gap, right] = [c.gaps[i], c.rightSides[i]];
            return gap && right ? valueCell({ ...gap, value: right.value - gap.value }, units) : '–';
          }),
        ],
      })),
    });
  });
}

const mixed = (step: CompatibilityStep): boolean => {
  const dims = step.matrix.flatMap((row) => row.flatMap((v) => (v ? [JSON.stringify(v.dimension)] : [])));
  return new Set(dims).size > 1;
};

function cellOf(step: CompatibilityStep, i: number, j: number, units: Scene['units']): string {
  const f = step.matrix[i]?.[j];
  if (!f || f.value === 0) return '';
  return mixed(step) ? inlineValue(f, units) : valueCell(f, units);
}
