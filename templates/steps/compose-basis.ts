import type { BasisStep } from '@/lib/engine/derivation/basis-step';
import { drawSigns } from '@/lib/figures/draw-signs';
import { narrow, type Scene, wide } from './scene';
import type { StepWriter } from './step-writer';
import { countWords, listWords, plain, turning, unitNames } from './words';

/** Step 1: assumptions, signs, units, figures, sources. */
export function composeBasis(step: BasisStep, out: StepWriter, scene: Scene): void {
  out.heading('Basis');
  out.paragraph(opening(step));
  out.paragraph(`**Assumptions.** ${assumptions(step)}`);
  if (scene.basis && scene.basis.trim() !== '') out.paragraph(plain(scene.basis.trim()));
  out.paragraph(`**Signs.** ${signs(step)}`);
  if (scene.figures) {
    out.figure('Positive senses.', [drawSigns({ width: wide })], () => [drawSigns({ width: narrow })]);
  }
  out.paragraph(`**Units.** ${unitWords(step)}`);
  out.paragraph(`**Figures.** ${figureWords(step)}`);
  const sources = sourcesOf(scene);
  if (sources.length > 0) {
    out.paragraph(
      `**Sources** stand in this margin. Those of the loads, limits and combinations: ${sources.join('; ')}.`,
    );
  }
}

function opening(s: BasisStep): string {
  const what = ['Forces', 'reactions'];
  if (s.displacements > 0)
    what.push(`${countWords(s.displacements)} displacement${s.displacements > 1 ? 's' : ''}`);
  const method = s.degree > 0 ? 'by consistent deformations' : 'by equilibrium';
  const cases = s.cases.slice(0, 8).map((c) => `${plain(c.title)} (${plain(c.id)})`);
  const more = s.cases.length > 8 ? ` and ${s.cases.length - 8} more` : '';
  const n = s.combinations.length;
  const sums = n > 0 ? `, and ${countWords(n)} combination${n > 1 ? 's' : ''} of them` : '';
  const under = s.cases.length > 0 ? `, under ${listWords(cases)}${more}${sums}` : '';
  return `${listWords(what)} ${method}${under}. Step 16 gives the demands.`;
}

function assumptions(s: BasisStep): string {
  const what = s.beam ? 'A straight beam in one plane' : 'A plane frame';
  const said = [
    `${what} of linear elastic material; displacements are small and equilibrium is written on the undeformed shape (first order).`,
    'Members are straight; joints are rigid where no hinge is drawn.',
  ];
  if (!s.stretches && !s.shears)
    said.push(
      'Members bend, but neither stretch nor shear; what that leaves out is not measured on this sheet.',
    );
  else if (s.stretches && s.shears)
    said.push('Members bend; those that state EA also stretch, those that state GA also shear.');
  else if (s.stretches) said.push('Members bend and do not shear; those that state EA also stretch.');
  else said.push('Members bend and do not stretch; those that state GA also shear.');
  if (s.springs) said.push('Spring supports yield in proportion to their force.');
  if (!s.settlements) said.push('Supports do not move otherwise.');
  return said.join(' ');
}

function signs(s: BasisStep): string {
  const turn = turning(s.units);
  if (s.beam) {
    return `$x$ runs to the right, $y$ up, moments of forces and rotations ${turn}. $M$ is positive with tension below, $V=\\mathrm{d}M/\\mathrm{d}s$, $N$ in tension. Reactions are forces of the supports on the beam, positive upward and to the right; fixing moments ${turn}. Moments are drawn on the tension side.`;
  }
  return `$x$ runs to the right, $y$ up, moments of forces and rotations ${turn}. Walk each member from its first joint to its second: $N$ is positive in tension, $M$ with tension on the right-hand side of the walk, and $V=\\mathrm{d}M/\\mathrm{d}s$. Reactions are forces of the supports on the frame. Moments are drawn on the tension side.`;
}

function unitWords(s: BasisStep): string {
  const u = unitNames(s.units);
  const small = s.units === 'US' ? 'inches (1 ft = 12 in)' : 'millimetres';
  const said = [`${u.force} and ${u.length}; deflections in ${small}.`];
  if (s.relative) said.push('Bending stiffnesses are multiples $k$ of one reference $EI_0$.');
  else said.push('$EI_0$ is the bending stiffness of the reference member; $k=EI/EI_0$.');
  if (s.needsEI0)
    said.push(
      `The forces depend on $EI_0$ itself, not only on the multiples, because of ${reasons(s)}; its value enters in step 2.`,
    );
  else if (s.degree > 0) said.push('The forces depend only on the multiples.');
  if (!s.needsEI0 && s.displacements > 0) {
    said.push(
      s.EI0Given
        ? 'The value of $EI_0$ enters in step 13 and not before.'
        : 'No value of $EI_0$ is given: displacements stay multiplied by it.',
    );
  }
  return said.join(' ');
}

function reasons(s: BasisStep): string {
  const all: [boolean, string][] = [
    [s.springs, 'the springs'],
    [s.settlements, 'the settlements'],
    [s.temperature, 'the temperature'],
    [s.misfits, 'the misfit'],
    [s.stretches, 'stretching'],
    [s.shears, 'shearing'],
  ];
  return listWords(all.flatMap(([is, word]) => (is ? [word] : [])));
}

function figureWords({ figures, degree }: BasisStep): string {
  const decimals = (n: number) => `${countWords(n)} decimal${n === 1 ? '' : 's'}`;
  const redundants =
    degree === 0 ? '' : `Redundants are printed with one more decimal than what they produce. `;
  return `The arithmetic is carried at full precision. Forces are printed with ${decimals(figures.force)}, moments with ${decimals(figures.moment)}, and more where a difference or a product needs them. ${redundants}Any printed substitution, worked again with the figures printed in it, gives the printed result to within one unit of its last figure; a sum in a table to within one unit.`;
}

function sourcesOf({ analysis }: Scene): string[] {
  const all = [
    ...analysis.cases.flatMap((c) => c.loads.map((l) => l.source)),
    ...analysis.combinations.map((c) => c.source),
    ...analysis.displacements.map((d) => d.limit?.source),
  ];
  return [...new Set(all.flatMap((s) => (s === undefined || s.trim() === '' ? [] : [plain(s.trim())])))];
}
