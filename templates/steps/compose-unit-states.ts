import { dimensionOf } from '@/lib/engine/derivation/dimensions';
import type { UnitStatesStep } from '@/lib/engine/derivation/unit-states-step';
import { drawUnit } from '@/lib/figures/draw-unit';
import { endTable } from './end-table';
import { notWrittenWords } from './not-written';
import { narrow, type Scene, wide } from './scene';
import type { StepWriter } from './step-writer';
import { listWords } from './words';
import { findsHingeForce, inline, inlineValue, staticsRows, staticsWords } from './write-lines';

/** Unit states drawn on one sheet. */
const drawn = 8;

/** Step 7: each redundant alone, of value 1. */
export function composeUnitStates(step: UnitStatesStep, out: StepWriter, scene: Scene): void {
  const { states } = step;
  out.heading(states.length === 1 ? 'Unit-load structure' : 'Unit-load structures');
  if (states.length === 0 && step.notWritten) {
    out.paragraph(notWrittenWords(step.notWritten));
    return;
  }
  if (states.length === 0) {
    out.paragraph('There is no redundant, so there is no unit-load structure.');
    return;
  }
  const { units, placed } = scene;
  const hinged = states.some((s) => s.steps.some(findsHingeForce));
  out.paragraph(
    `$X_i=1$ acts alone on the primary structure. A bar marks its effects: $\\bar{R}$, $\\bar{N}$, $\\bar{V}$ and $\\bar{m}$ are per unit of $X_i$. No load acts between the joints, so every $\\bar{m}$ is straight on each member.${hinged ? ' $\\bar{F}$ with the name of a member is the force on its end at a hinge.' : ''}`,
  );
  if (step.notWritten) out.paragraph(notWrittenWords(step.notWritten));
  for (const s of states) {
    if (s.steps.length > 0) {
      s.steps.forEach((line, k) => {
        const lead = k === 0 ? `**${inline(s.symbol)} $=1$.** ` : '';
        out.equations(`${lead}${staticsWords(line, placed, units)}`, staticsRows(line, units));
      });
    } else if (states.length <= 12) {
      const acting = s.reactions.filter((r) => r.value !== 0);
      const said = acting.map((r) => `${r.symbol ? inline(r.symbol) : ''} $=$ ${inlineValue(r, units)}`);
      out.paragraph(
        `**${inline(s.symbol)} $=1$.** ${said.length > 0 ? `In the same way ${listWords(said)}; other reactions are zero.` : 'No support feels it.'}`,
      );
    }
  }
  if (scene.figures) {
    for (let i = 0; i < Math.min(states.length, drawn); i += 2) figure(states.slice(i, i + 2), out, scene);
  }
  for (const s of states) {
    const bent = s.ends.filter((e, k) => {
      const other = s.ends[k % 2 === 0 ? k + 1 : k - 1];
      return [e, other].some((x) => x && (x.N !== 0 || x.V !== 0 || x.M !== 0));
    });
    out.table(
      endTable(bent, scene, {
        caption: `End forces of unit state ${s.index + 1}.`,
        mark: `_{${s.index + 1}}`,
        perUnit: dimensionOf(s.quantity),
        note: bent.length < s.ends.length ? 'Members that are not in the table carry nothing.' : undefined,
      }),
    );
  }
}

function figure(pair: UnitStatesStep['states'], out: StepWriter, { analysis, solution }: Scene): void {
  const draw = (width: number) =>
    pair.flatMap((s) => {
      const state = solution.primary.units[s.index];
      return state ? [drawUnit(analysis, solution.redundants, s.index, state, { width })] : [];
    });
  out.figure(
    `Unit moments ${listWords(pair.map((s) => `$\\bar{m}_{${s.index + 1}}$`))} with the reactions.`,
    draw(wide / pair.length),
    () => draw(narrow),
  );
}
