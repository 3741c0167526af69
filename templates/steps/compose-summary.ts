import type { Demand, SummaryStep } from '@/lib/engine/derivation/summary-step';
import { caseTex } from '@/lib/typeset/write-symbol';
import { unitHead } from '@/lib/typeset/write-unit';
import type { TableColumn } from '../block';
import type { Scene } from './scene';
import type { StepWriter } from './step-writer';
import { listWords, memberWords, plain, turning } from './words';
import { cell } from './write-lines';

const abreast = 7;

/** Step 16: demands on members, forces on foundations. */
export function composeSummary(step: SummaryStep, out: StepWriter, scene: Scene): void {
  out.heading('Summary of demands');
  if (scene.analysis.cases.length === 0) {
    out.paragraph('There is no load case, so there are no demands.');
    return;
  }
  members(step, out, scene);
  supports(step, out, scene);
  const pulled = [...new Set(step.uplift.map((u) => u.joint))];
  const said =
    pulled.length === 0
      ? 'Every vertical reaction presses its foundation in every state of the table: no uplift.'
      : `**Uplift**: ${listWords(pulled.map((j) => `the support at ${plain(j)} is pulled upward under ${listWords(step.uplift.filter((u) => u.joint === j).map((u) => plain(u.by)))}`))}. The support must be able to hold down, or this analysis does not apply.`;
  out.paragraph(`${said} Weights that are not among the loads of step 2 are to be added.`);
}

function members(step: SummaryStep, out: StepWriter, scene: Scene): void {
  const { units, placed, plan, names } = scene;
  const force = unitHead({ force: 1, length: 0, temperature: 0 }, units);
  const moment = unitHead({ force: 1, length: 1, temperature: 0 }, units);
  const right = (head: string, unit: string | undefined): TableColumn => ({ head, unit, align: 'right' });
  const by: TableColumn = { head: 'by', align: 'left' };
  const positive = names.beam ? '$|M|$, tension below' : '$|M|$, tension right of the walk';
  const negative = names.beam ? '$|M|$, tension above' : '$|M|$, tension left of the walk';
  const pair = (d: Demand | undefined, decimals: number, sign = 1) => [
    d ? cell(sign * d.value, decimals, units) : '–',
    d ? spaced(plain(d.by)) : '',
  ];
  out.table({
    caption: `Demands on members, from the ${step.from === 'combinations' ? 'strength combinations' : 'single cases'}.`,
    columns: [
      { head: 'member', align: 'left' },
      right('compression', force),
      by,
      right('tension', force),
      by,
      right('$|V|$', force),
      by,
      right(positive, moment),
      by,
      right(negative, moment),
      by,
    ],
    rows: step.members.map((m) => {
      const p = placed.get(m.member);
      return {
        cells: [
          p ? memberWords(p) : plain(m.member),
          ...pair(m.compression, plan.force, -1),
          ...pair(m.tension, plan.force),
          ...pair({ ...m.V, value: Math.abs(m.V.value) }, plan.force),
          ...pair(m.positive, plan.moment),
          ...pair(m.negative, plan.moment, -1),
        ],
      };
    }),
  });
}

const senses = {
  x: 'horizontal, to the right',
  y: 'vertical, down',
} as const;

function supports(step: SummaryStep, out: StepWriter, scene: Scene): void {
  const { units, analysis } = scene;
  const cases = analysis.cases.map((c) => c.id).slice(0, abreast);
  const combinations = Object.keys(step.supports[0]?.combinations ?? {});
  const side = cases.length + combinations.length <= abreast;
  const columns: TableColumn[] = [
    { head: 'support', align: 'left' },
    { head: 'on the foundation', align: 'left' },
    { head: 'unit', align: 'left' },
    ...cases.map((id): TableColumn => ({ head: `$${caseTex(id)}$`, align: 'right' })),
    ...(side
      ? combinations.map((id): TableColumn => ({ head: plain(id), align: 'right' }))
      : ([
          { head: 'greatest', align: 'right' },
          { head: 'least', align: 'right' },
        ] as const)),
  ];
  out.table({
    caption: 'Forces of the structure on its supports, cases unfactored, combinations factored.',
    columns,
    rows: step.supports.map((s) => {
      const q = s;
      const values = Object.values(s.combinations);
      const tail = side
        ? combinations.map((id) => cell(s.combinations[id], q.decimals, units))
        : [cell(Math.max(...values), q.decimals, units), cell(Math.min(...values), q.decimals, units)];
      return {
        cells: [
          plain(s.joint),
          s.component === 'turn' ? `moment, ${turning(units)}` : senses[s.component],
          `$${unitHead(q.dimension, units) ?? ''}$`,
          ...cases.map((id) => cell(s.cases[id], q.decimals, units)),
          ...tail,
        ],
      };
    }),
  });
}

/** A sum of cases with room to break: "1.2D + 1.6S". */
function spaced(sum: string): string {
  return sum.replace(/(\w)([+−])(?=[\d\w])/g, '$1 $2 ');
}
