import type { NamedPart, PartDecimals, PartsStep } from '@/lib/engine/derivation/parts-step';
import type { MomentPart, PartShape } from '@/lib/engine/force-method/work';
import { drawMomentParts } from '@/lib/figures/draw-moment-parts';
import { fractionTex } from '@/lib/typeset/number';
import { unitHead } from '@/lib/typeset/write-unit';
import { notWrittenWords } from './not-written';
import { narrow, type Scene, wide } from './scene';
import type { StepWriter } from './step-writer';
import { memberWords, plain } from './words';
import { cell, relationRow } from './write-lines';

/** Step 6: the primary moments as named shapes with their areas and centroids. */
export function composeParts(step: PartsStep, out: StepWriter, scene: Scene): void {
  out.heading('Moments of the primary structure, by parts');
  if (step.notWritten) {
    out.paragraph(notWrittenWords(step.notWritten));
    return;
  }
  const filled = step.cases.filter((c) => c.parts.length > 0);
  if (filled.length === 0) {
    out.paragraph('No load bends the primary structure.');
    return;
  }
  const shapes = new Set(filled.flatMap((c) => c.parts.map((p) => p.part.shape)));
  out.paragraph(
    `Each load draws one simple shape on each member it bends, and each end moment a triangle. $\\hat{M}$ is the height of a shape, $L$ here its length. ${areas(shapes)}`,
    'areas and centroids by integration',
  );
  const { units } = scene;
  for (const c of filled) {
    out.equations(
      `**Case ${plain(c.id)}.** Heights:`,
      c.heights.map((r) => relationRow(r, units)),
    );
    if (scene.figures) figure(c.id, c.parts, out, scene);
    table(c.id, c.parts, c.decimals, out, scene);
  }
}

const said: Partial<Record<PartShape, string>> = {
  rectangle: 'a rectangle $L\\hat{M}$, at the middle',
  triangle: 'a triangle $\\tfrac{1}{2}L\\hat{M}$, at the third point on the side of its peak',
  parabola: 'a parabola $\\tfrac{2}{3}L\\hat{M}$, at the middle',
  spandrel: 'a spandrel $\\tfrac{1}{3}L\\hat{M}$, at the quarter point from its high end',
  cubic:
    'the cubic of a load that grows from zero $\\tfrac{1}{4}L\\hat{M}$ with $\\hat{M}=wL^2/6$, at $\\tfrac{8}{15}L$ from the end without load',
};

function areas(shapes: ReadonlySet<PartShape>): string {
  const all = [...shapes].flatMap((s) => said[s] ?? []);
  return `Area and place of the centroid: ${all.join('; ')}.${shapes.has('triangle') ? ' A triangle with its peak at $a$ from one end has its centroid at $(L+a)/3$ from that end.' : ''}`;
}

function figure(id: string, parts: readonly NamedPart[], out: StepWriter, scene: Scene): void {
  const draw = (width: number) =>
    drawMomentParts(
      scene.analysis,
      parts.map((p) => p.part),
      { width, label: (_, i) => plain(parts[i]?.name ?? '') },
    );
  const layers = draw(wide).length;
  const across = layers > 1 ? wide / 2 : wide;
  if (layers <= 4)
    out.figure(
      `Parts of case ${plain(id)} on the tension side; crossed circles mark the centroids.`,
      draw(across),
      () => draw(narrow),
    );
}

function table(
  id: string,
  parts: readonly NamedPart[],
  decimals: PartDecimals,
  out: StepWriter,
  scene: Scene,
): void {
  const { units, placed } = scene;
  const length = unitHead({ force: 0, length: 1, temperature: 0 }, units);
  out.table({
    caption: `Parts of case ${plain(id)}.`,
    columns: [
      { head: 'part', align: 'left' },
      { head: 'member', align: 'left' },
      { head: 'shape', align: 'left' },
      { head: '$c$', align: 'right' },
      { head: '$L$', unit: length, align: 'right' },
      { head: '$\\hat{M}$', unit: unitHead({ force: 1, length: 1, temperature: 0 }, units), align: 'right' },
      {
        head: '$A=c\\,L\\,\\hat{M}$',
        unit: unitHead({ force: 1, length: 2, temperature: 0 }, units),
        align: 'right',
      },
      { head: 'centroid', unit: length, align: 'right' },
    ],
    rows: parts.map(({ name, part, length: l }) => {
      const p = placed.get(part.member);
      return {
        cells: [
          plain(name),
          p ? memberWords(p) : plain(part.member),
          shapeWords(part, p?.start.id ?? '', p?.end.id ?? ''),
          `$${fractionTex(part.factor.n, part.factor.d)}$`,
          cell(l.value, decimals.length, units),
          cell(part.height, decimals.height, units),
          cell(part.area, decimals.area, units),
          cell(part.centroid, decimals.centroid, units),
        ],
      };
    }),
    note: 'The centroid is measured along the member from its first joint.',
  });
}

function shapeWords(part: MomentPart, start: string, end: string): string {
  const { shape, tall } = part;
  if (shape === 'parabola' || shape === 'rectangle') return shape;
  if (tall === 'peak') return `${shape}, peak inside`;
  return `${shape}, high at ${plain(tall === 'start' ? start : end)}`;
}
