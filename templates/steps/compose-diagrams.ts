import type { DiagramsStep } from '@/lib/engine/derivation/diagrams-step';
import { drawDiagram } from '@/lib/figures/draw-diagram';
import { unitHead } from '@/lib/typeset/write-unit';
import { narrow, type Scene, wide } from './scene';
import type { StepWriter } from './step-writer';
import { memberWords, plain } from './words';
import { cell } from './write-lines';

const length = { force: 0, length: 1, temperature: 0 };
const force = { force: 1, length: 0, temperature: 0 };
const moment = { force: 1, length: 1, temperature: 0 };
const intensity = { force: 1, length: -1, temperature: 0 };

/** Step 12: zeros and extremes as tables, then N, V and M drawn. */
export function composeDiagrams(step: DiagramsStep, out: StepWriter, scene: Scene): void {
  out.heading('Diagrams');
  out.paragraph(
    '$s$ runs along the member from its first joint. A stretch begins at $s_a$ with $V_a$ and $M_a$. Without load across it $M$ is straight: $M_b=M_a+V_a\\,l$, zero at $s_0=s_a-M_a/V_a$. Under a load $w$ across it (positive toward the right of the walk) $V$ is zero at $x_0=V_a/w$ from $s_a$, there $M_x=M_a+V_a^2/(2w)$, and the zeros of $M$ lie $e=\\sqrt{2M_x/w}$ on both sides of that place.',
  );
  for (const c of step.cases) {
    straight(c, step, out, scene);
    loaded(c, step, out, scene);
    other(c, step, out, scene);
    if (scene.figures) figures(c.id, out, scene);
  }
}

type Case = DiagramsStep['cases'][number];

const memberName = (id: string, { placed }: Scene): string => {
  const p = placed.get(id);
  return p ? memberWords(p) : plain(id);
};

function straight(c: Case, { decimals: d }: DiagramsStep, out: StepWriter, scene: Scene): void {
  const { units } = scene;
  const head = (name: string, unit: typeof length) => ({
    head: `$${name}$`,
    unit: unitHead(unit, units),
    align: 'right' as const,
  });
  out.table({
    caption: `Case ${plain(c.id)}: stretches without load across them.`,
    columns: [
      { head: 'member', align: 'left' },
      head('s_a', length),
      head('l', length),
      head('M_a', moment),
      head('V_a', force),
      head('M_b=M_a+V_a\\,l', moment),
      head('s_0=s_a-M_a/V_a', length),
    ],
    rows: c.straight.map((s) => ({
      cells: [
        memberName(s.member, scene),
        cell(s.from, d.from, units),
        cell(s.to - s.from, d.length, units),
        cell(s.startM, d.M, units),
        cell(s.V, d.V, units),
        cell(s.endM, d.top, units),
        cell(s.zero, d.zero, units),
      ],
    })),
  });
}

function loaded(c: Case, { decimals: d }: DiagramsStep, out: StepWriter, scene: Scene): void {
  const { units } = scene;
  const head = (name: string, unit: typeof length) => ({
    head: `$${name}$`,
    unit: unitHead(unit, units),
    align: 'right' as const,
  });
  out.table({
    caption: `Case ${plain(c.id)}: stretches under uniform load.`,
    columns: [
      { head: 'member', align: 'left' },
      head('s_a', length),
      head('M_a', moment),
      head('V_a', force),
      head('w', intensity),
      head('x_0=V_a/w', length),
      head('M_x=M_a+V_a^2/(2\\,w)', moment),
      head('e=\\sqrt{2\\,M_x/w}', length),
      head('s_a+x_0-e', length),
      head('s_a+x_0+e', length),
    ],
    rows: c.loaded.map((s) => ({
      cells: [
        memberName(s.member, scene),
        cell(s.from, d.from, units),
        cell(s.startM, d.M, units),
        cell(s.V, d.V, units),
        cell(s.w, d.w, units),
        cell(s.x, d.x, units),
        cell(s.top, d.top, units),
        cell(s.e, d.e, units),
        cell(s.before, d.before, units),
        cell(s.after, d.after, units),
      ],
    })),
    note: 'The last two columns are zeros of $M$; a dash: not on this stretch. Where $x_0$ lies outside the stretch, $M$ has no extreme on it.',
  });
}

function other(c: Case, { decimals: d }: DiagramsStep, out: StepWriter, scene: Scene): void {
  const { units } = scene;
  out.table({
    caption: `Case ${plain(c.id)}: greatest and least moments under varying load.`,
    columns: [
      { head: 'member', align: 'left' },
      { head: '$s$', unit: unitHead(length, units), align: 'right' },
      { head: '$M$', unit: unitHead(moment, units), align: 'right' },
    ],
    rows: c.other.map((s) => ({
      cells: [memberName(s.member, scene), cell(s.s, d.from, units), cell(s.M, d.M, units)],
    })),
  });
}

function figures(id: string, out: StepWriter, { analysis, solution, names, plan }: Scene): void {
  const members = solution.cases[id]?.members;
  if (!members) return;
  const kinds = names.beam ? (['M', 'V'] as const) : (['N', 'V', 'M'] as const);
  const draw = (width: number) =>
    kinds.map((which) => {
      const unit = which === 'M' ? unitHead(moment, analysis.units) : unitHead(force, analysis.units);
      const decimals = which === 'M' ? plan.moment : plan.force;
      return drawDiagram(analysis, members, { which, width, decimals, title: `$${which}$, $${unit}$` });
    });
  if (names.beam) {
    draw(wide).forEach((drawing, i) => {
      const small = () => draw(narrow).slice(i, i + 1);
      out.figure(`$${kinds[i]}$ of case ${plain(id)}; dots are zeros of $M$.`, [drawing], small);
    });
    return;
  }
  out.figure(
    `$N$, $V$ and $M$ of case ${plain(id)}; dots are zeros of $M$; every diagram has its own scale.`,
    draw(wide / 3),
    () => draw(narrow),
  );
}
