import type { Deflection, DeflectionsStep } from '@/lib/engine/derivation/deflections-step';
import { drawDeflected } from '@/lib/figures/draw-deflected';
import { writeNumber } from '@/lib/figures/write-number';
import { quantityTex } from '@/lib/typeset/quantity-tex';
import { narrow, type Scene, wide } from './scene';
import type { StepWriter } from './step-writer';
import { memberWords, plain, turning } from './words';
import { writeWork } from './work-block';
import { cell, inline, inlineValue, relationRow, valueCell } from './write-lines';

/** Step 13: displacements against their limits. */
export function composeDeflections(step: DeflectionsStep, out: StepWriter, scene: Scene): void {
  out.heading('Deflections');
  if (step.deflections.length === 0) out.paragraph('No displacement is asked for on this sheet.');
  else {
    out.paragraph(
      'The final moments are compatible, so the unit load may stand on any determinate structure that carries it; here it stands on the primary structure. On each length where the unit moments are straight the final $M$ is a triangle from each end and what the load adds; the ordinate is that of the unit moments $\\bar{m}$ at the centroid.',
      'reduction theorem',
    );
    if (!step.EI0)
      out.paragraph(
        'No value of $EI_0$ is given: the displacements stay multiplied by it, and no limit is checked.',
      );
  }
  for (const d of step.deflections) one(d, out, scene);
  if (scene.figures) shapes(out, scene);
}

function one(d: Deflection, out: StepWriter, scene: Scene): void {
  const { units } = scene;
  out.paragraph(`**${inline(d.symbol)}** is ${askWords(d, scene)}.`);
  for (const c of d.cases) {
    writeWork(c.table, out, scene, {
      caption: `${inline({ ...d.symbol, super: c.id })} times $EI_0$.`,
      area: 'M',
      ordinate: '\\bar{m}',
      worked: true,
    });
    if (c.result) out.equations(undefined, [relationRow(c.result, units)]);
  }
  limits(d, out, scene);
}

function limits(d: Deflection, out: StepWriter, { units, analysis }: Scene): void {
  const { limit, ask } = d;
  const service = d.combinations.filter(
    ({ id }) => analysis.combinations.find((c) => c.id === id)?.purpose === 'service',
  );
  const source = ask.limit ? plain(ask.limit.source) : undefined;
  if (limit && service.length === 0) {
    const rows = d.cases.flatMap(({ result }) => {
      const shown = result?.again ?? result?.result;
      if (!shown) return [];
      const ratio = Math.abs(shown.value) / limit.value;
      const size = { ...shown, value: Math.abs(shown.value) };
      return [
        {
          lhs: `\\left|${inline(shown.symbol ?? d.symbol).slice(1, -1)}\\right|/\\text{limit}`,
          chain: [
            `\\frac{${quantityTex(size, units)}}{${quantityTex(limit, units)}}`,
            `${writeNumber(ratio, 2, units)}`,
          ],
          note: ratio <= 1 ? '$\\le1$, satisfied' : '$>1$, **not satisfied**',
        },
      ];
    });
    out.equations(`Against the limit of ${inlineValue(limit, units)}, case by case:`, rows, source);
    return;
  }
  out.table({
    caption: `${inline(d.symbol)} in the combinations.`,
    columns: [
      { head: 'combination', align: 'left' },
      { head: inline(d.symbol), unit: units === 'US' ? '\\mathrm{in}' : '\\mathrm{mm}', align: 'right' },
      ...(limit
        ? [
            { head: 'ratio to the limit', align: 'right' as const },
            { head: '', align: 'left' as const },
          ]
        : []),
    ],
    rows: service.map((c) => ({
      cells: [
        plain(c.id),
        valueCell(c.value, units),
        ...(limit
          ? [cell(c.ratio?.value, 2, units), (c.ratio?.value ?? 0) <= 1 ? 'satisfied' : '**not satisfied**']
          : []),
      ],
    })),
    note: limit ? `Limit ${inlineValue(limit, units)}.` : undefined,
    source,
  });
}

const directions = {
  x: 'the displacement to the right',
  y: 'the displacement upward',
  across: 'the displacement across the member, to the left of the walk,',
} as const;

function askWords({ ask }: Deflection, { placed, units }: Scene): string {
  const p = placed.get(ask.member);
  const member = p ? memberWords(p) : plain(ask.member);
  const what = ask.direction === 'rotation' ? `the rotation (${turning(units)})` : directions[ask.direction];
  const unit = units === 'US' ? 'ft' : 'm';
  return `${what} of the section of ${member} at $${Number(ask.at.toFixed(4))}\\unit{${unit}}$ from ${plain(p?.start.id ?? '')}; the unit ${ask.direction === 'rotation' ? 'couple' : 'force'} acts there in that sense`;
}

function shapes(out: StepWriter, { analysis, solution }: Scene): void {
  for (const c of analysis.cases.slice(0, 4)) {
    const result = solution.cases[c.id];
    if (!result) continue;
    const draw = (width: number) =>
      drawDeflected(analysis, result.members, { width, timesEI0: result.displacementsTimesEI0 });
    out.figure(`Deflected shape under ${plain(c.id)}; dashes: at rest.`, [draw(wide)], () => [draw(narrow)]);
  }
}
