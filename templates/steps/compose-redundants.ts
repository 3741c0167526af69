import type { RedundantsStep } from '@/lib/engine/derivation/redundants-step';
import { drawMechanism } from '@/lib/figures/draw-mechanism';
import { symbolTex } from '@/lib/typeset/write-symbol';
import { narrow, type Scene, wide } from './scene';
import type { StepWriter } from './step-writer';
import { capital, listWords, quantityWords, turning } from './words';
import { inline, inlineValue } from './write-lines';

/** Names of one sentence; beyond, they are counted. */
const most = 14;

/** Step 4: what equilibrium fixes, what would be unstable, what is chosen and why. */
export function composeRedundants(step: RedundantsStep, out: StepWriter, scene: Scene): void {
  const { redundants } = step;
  const n = redundants.length;
  out.heading(n === 1 ? 'The redundant' : 'The redundants');
  if (n === 0) {
    out.paragraph(
      'There is none: equilibrium alone gives every force. The structure itself is the primary structure of the steps below.',
    );
    return;
  }
  fixedQuantities(step, out, scene);
  refusals(step, out, scene);
  if (step.good.length > 1) {
    const some = step.good.slice(0, most).map(inline);
    out.paragraph(
      `**Good choices** are ${listWords(some)}${step.good.length > most ? ' and others' : ''}: each leaves a stable structure.`,
    );
  }
  const chosen = redundants.map((r) => ({
    lhs: symbolTex(r.symbol),
    chain: [symbolTex(r.is)],
    note: quantityWords(r.quantity, scene.analysis, scene.placed, scene.names.beam),
  }));
  const whose = step.proposed ? '' : ' by the engineer';
  if (n <= 12) out.equations(`**Chosen**${whose}${n === 1 ? ' is' : ' are'}:`, chosen);
  else {
    out.paragraph(`**Chosen**${whose} are ${n} redundants, $X_1$ to $X_{${n}}$:`);
    out.table({
      caption: 'Redundants.',
      columns: [
        { head: 'redundant', align: 'left' },
        { head: 'quantity', align: 'left' },
        { head: 'sense', align: 'left' },
      ],
      rows: redundants.map((r) => ({
        cells: [
          inline(r.symbol),
          inline(r.is),
          quantityWords(r.quantity, scene.analysis, scene.placed, scene.names.beam),
        ],
      })),
    });
  }
  out.paragraph(reasons(step, scene));
}

function fixedQuantities(step: RedundantsStep, out: StepWriter, { units }: Scene): void {
  const zero = step.fixedZero.map((f) => f.symbol);
  const said: string[] = [];
  if (zero.length > 0) {
    const some = zero.slice(0, most).map(inline);
    const more = zero.length > most ? ` and ${zero.length - most} more` : '';
    said.push(
      `${zero.length > most ? `${some.join(', ')}${more}` : listWords(some)} ${zero.length === 1 ? 'is' : 'are'} zero in every case.`,
    );
  }
  const [first] = step.fixed;
  if (first && step.fixed.length > 0) {
    const some = step.fixed.slice(0, most).map((f) => inline(f.symbol));
    const more = step.fixed.length > most ? ` and ${step.fixed.length - most} more` : '';
    const example = first.values.map(
      (v) => `${v.symbol ? inline(v.symbol) : ''} $=$ ${inlineValue(v, units)}`,
    );
    said.push(
      `${capital(listWords(some))}${more} ${step.fixed.length === 1 ? 'has one value' : 'have one value each'} whatever is released: ${listWords(example.slice(0, 3))}.`,
    );
  }
  if (said.length === 0) {
    out.paragraph('**Fixed by equilibrium** is nothing: every force depends on the redundants.');
    return;
  }
  out.paragraph(
    `**Fixed by equilibrium** are quantities that no choice of redundants changes; none of them can be a redundant. ${said.join(' ')}`,
  );
}

function refusals(step: RedundantsStep, out: StepWriter, scene: Scene): void {
  const { analysis, names } = scene;
  const n = step.redundants.length;
  if (step.refused.length === 0) return;
  const count = step.refused.reduce((t, r) => t + r.sets.length, 0);
  out.table({
    caption:
      n === 1
        ? 'Unstable choices.'
        : `Unstable choices: ${count} set${count === 1 ? '' : 's'} that differ${count === 1 ? 's' : ''} from the chosen one in one quantity.`,
    columns: [
      { head: 'refused', align: 'left' },
      { head: 'sets', align: 'right' },
      { head: 'what nothing stops', align: 'left' },
    ],
    rows: step.refused.map((r) => ({
      cells: [
        r.sets
          .slice(0, 3)
          .map((set) => set.map((q) => inline(names.quantity(q))).join(', '))
          .join('; ') + (r.sets.length > 3 ? ' …' : ''),
        `$${r.sets.length}$`,
        r.message.replaceAll('counterclockwise', turning(scene.units)),
      ],
    })),
  });
  if (!scene.figures) return;
  const shown = step.refused
    .slice(0, 2)
    .flatMap((r) =>
      r.mechanism && r.mechanism.pieces.length > 0 && r.sets[0]
        ? [{ set: r.sets[0], mechanism: r.mechanism }]
        : [],
    )
    .slice(0, 2);
  const draw = (width: number) =>
    shown.map((s) => drawMechanism(analysis, s.set, s.mechanism, { width: width / shown.length }));
  if (shown.length > 0) {
    const named = shown.map((s) => s.set.map((q) => inline(names.quantity(q))).join(', '));
    out.figure(
      `Refused: ${named.join('; ')}. The motion is drawn small; nothing resists it.`,
      draw(wide),
      () => shown.map((s) => drawMechanism(analysis, s.set, s.mechanism, { width: narrow })),
    );
  }
}

function reasons(step: RedundantsStep, scene: Scene): string {
  const { redundants, uncoupled, condition } = step;
  const said: string[] = [];
  const overSupports = scene.names.beam && redundants.every((r) => r.quantity.kind === 'moment');
  if (overSupports && redundants.length > 1) {
    said.push(
      'A hinge over each inner support leaves simple spans; each unit moment bends two spans only, so the equations are tridiagonal.',
    );
  } else if (overSupports) said.push('A hinge over the support leaves simple spans.');
  else if (redundants.length === 1)
    said.push(
      'With it released the structure is determinate and stable, and the unit-load moments are straight on every member.',
    );
  else
    said.push(
      'With these released the structure is determinate and stable, and the unit-load moments are straight on every member.',
    );
  if (uncoupled > 0 && !overSupports)
    said.push(
      `${uncoupled} pair${uncoupled === 1 ? '' : 's'} of unit states act on nothing in common; their $f_{ij}$ are zero.`,
    );
  if (redundants.length > 1)
    said.push(
      `The matrix of flexibilities, scaled to a unit diagonal, has the condition number $${condition.toPrecision(2).replace(/e\+?(-?\d+)/, '\\times10^{$1}')}$.`,
    );
  said.push('Another good set would change the figures of steps 5 to 10 and nothing after them.');
  return said.join(' ');
}
