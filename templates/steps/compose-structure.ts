import type { LoadSymbol, Sense } from '@/lib/engine/derivation/load-symbols';
import type { StructureStep } from '@/lib/engine/derivation/structure-step';
import { supportInWords } from '@/lib/figures/describe-structure';
import { drawLoads } from '@/lib/figures/draw-loads';
import { drawStructure } from '@/lib/figures/draw-structure';
import { unitHead } from '@/lib/typeset/write-unit';
import type { TableColumn } from '../block';
import { narrow, type Scene, wide } from './scene';
import type { StepWriter } from './step-writer';
import { listWords, memberWords, plain, turning } from './words';
import { cell, inline, inlineValue, relationRow, valueCell } from './write-lines';

/** Step 2: figure, joints, members, loads, and the lengths and slopes used below. */
export function composeStructure(step: StructureStep, out: StepWriter, scene: Scene): void {
  out.heading('Structure and loads');
  const { analysis, units } = scene;
  if (scene.figures) {
    const draw = (width: number) => drawStructure(analysis, { width });
    out.figure(
      'The structure, to scale; dashes mark the side where a positive $M$ gives tension.',
      [draw(wide)],
      () => [draw(narrow)],
    );
  }
  joints(out, scene);
  members(step, out, scene);
  loads(step, out, scene);
  if (scene.figures) {
    for (const c of analysis.cases) {
      const title = (width: number) => drawLoads(analysis, c, { width });
      if (c.loads.length > 0)
        out.figure(`Case ${plain(c.id)}, ${plain(c.title)}.`, [title(wide)], () => [title(narrow)]);
    }
  }
  if (step.geometry.length > 0) {
    out.equations(
      'Lengths and slopes of the inclined members, $\\ell$ being the plan length and $h$ the rise:',
      step.geometry.map((r) => relationRow(r, units)),
    );
  }
  if (step.places.length > 0) {
    const said = step.places.map(({ member, value }) => {
      const p = scene.placed.get(member);
      return `${value.symbol ? inline(value.symbol) : ''} $=$ ${inlineValue(value, units)} from ${plain(p?.start.id ?? '')} along ${p ? memberWords(p) : plain(member)}`;
    });
    out.paragraph(`Places of point loads and couples: ${listWords(said)}.`);
  }
  if (step.parts.length > 0) {
    const said = step.parts.map(
      (l) =>
        `${l.value.symbol ? inline(l.value.symbol) : ''} $=$ ${inlineValue(l.value, units)} on ${memberName(l.member, scene.placed)}`,
    );
    out.paragraph(`Loaded lengths: ${listWords(said)}.`);
  }
  if (step.EI0)
    out.equations('Reference stiffness:', [
      { lhs: 'EI_0', chain: [inlineValue(step.EI0, units).slice(1, -1)] },
    ]);
  if (step.springs.length > 0) {
    const rows = step.springs.map(({ stiffness }) => ({
      lhs: stiffness.symbol ? inline(stiffness.symbol).slice(1, -1) : '',
      chain: [inlineValue(stiffness, units).slice(1, -1)],
    }));
    out.equations('Stiffnesses of the spring supports:', rows);
  }
}

function joints(out: StepWriter, { analysis, units }: Scene): void {
  const unit = units === 'US' ? '\\mathrm{ft}' : '\\mathrm{m}';
  const decimals = (v: number) =>
    Number.isInteger(Number(v.toFixed(2)) * 100) && Math.abs(v - Number(v.toFixed(2))) < 1e-9 ? 2 : 4;
  const shown = Math.max(...analysis.joints.flatMap((j) => [decimals(j.x), decimals(j.y)]));
  out.table({
    caption: 'Joints.',
    columns: [
      { head: 'joint', align: 'left' },
      { head: '$x$', unit, align: 'right' },
      { head: '$y$', unit, align: 'right' },
      { head: 'support', align: 'left' },
    ],
    rows: analysis.joints.map((j) => ({
      cells: [
        plain(j.id),
        cell(j.x, shown, units),
        cell(j.y, shown, units),
        j.support ? supportInWords(j.support).replace(/^is /, '') : '',
      ],
    })),
  });
}

function members(step: StructureStep, out: StepWriter, { units }: Scene): void {
  const some = (pick: (m: StructureStep['members'][number]) => unknown) =>
    step.members.some((m) => pick(m) !== undefined);
  const unit = units === 'US' ? '\\mathrm{ft}' : '\\mathrm{m}';
  const stiffness = unitHead({ force: 1, length: 2, temperature: 0 }, units);
  const force = unitHead({ force: 1, length: 0, temperature: 0 }, units);
  const columns: { column: TableColumn; of: (m: StructureStep['members'][number]) => string }[] = [
    { column: { head: 'member', align: 'left' }, of: (m) => memberWords(m.placed) },
    {
      column: { head: 'length', align: 'left' },
      of: (m) => (m.length.symbol ? inline(m.length.symbol) : ''),
    },
    { column: { head: '', unit, align: 'right' }, of: (m) => valueCell(m.length, units) },
  ];
  if (some((m) => m.EI))
    columns.push({
      column: { head: '$EI$', unit: stiffness, align: 'right' },
      of: (m) => (m.EI ? valueCell(m.EI, units) : ''),
    });
  columns.push({ column: { head: '$k=EI/EI_0$', align: 'right' }, of: (m) => valueCell(m.k, units) });
  if (some((m) => m.EA))
    columns.push({
      column: { head: '$EA$', unit: force, align: 'right' },
      of: (m) => (m.EA ? valueCell(m.EA, units) : '–'),
    });
  if (some((m) => m.GAs))
    columns.push({
      column: { head: '$GA_s$', unit: force, align: 'right' },
      of: (m) => (m.GAs ? valueCell(m.GAs, units) : '–'),
    });
  if (some((m) => m.placed.member.section))
    columns.push({
      column: { head: 'section', align: 'left' },
      of: (m) => plain(m.placed.member.section ?? ''),
    });
  if (some((m) => m.placed.member.releases))
    columns.push({ column: { head: 'releases', align: 'left' }, of: (m) => releases(m) });
  out.table({
    caption: 'Members, walked from the first joint to the second.',
    columns: columns.map((c) => c.column),
    rows: step.members.map((m) => ({ cells: columns.map((c) => c.of(m)) })),
  });
}

function releases({ placed }: StructureStep['members'][number]): string {
  const { releases: free } = placed.member;
  const ends = (['start', 'end'] as const).flatMap((end) =>
    (free?.[end] ?? []).map(
      (r) => `${r === 'moment' ? 'hinge' : `no ${r} force`} at ${plain(placed[end].id)}`,
    ),
  );
  return ends.join(', ');
}

function loads(step: StructureStep, out: StepWriter, scene: Scene): void {
  const { analysis, units } = scene;
  const anySource = analysis.cases.some((c) => c.loads.some((l) => l.source));
  out.table({
    caption: 'Loads.',
    columns: [
      { head: 'case', align: 'left' },
      { head: 'load', align: 'left' },
      { head: 'magnitude', align: 'left' },
      { head: 'sense', align: 'left' },
      { head: 'where', align: 'left' },
      ...(anySource ? [{ head: 'from', align: 'left' } as const] : []),
    ],
    rows: step.loads.map((l) => ({
      cells: [
        plain(l.case),
        l.value.symbol ? inline(l.value.symbol) : '',
        inlineValue(l.value, units),
        senseWords(l.sense, scene),
        whereWords(l, scene),
        ...(anySource ? [sourceOf(l, scene)] : []),
      ],
    })),
    note: analysis.cases.map((c) => `${plain(c.id)}: ${plain(c.title)}`).join('; '),
  });
}

const fixedWords: Partial<Record<Sense, string>> = {
  across: 'to the left of the walk',
  against: 'to the right of the walk',
  along: 'along the walk',
  back: 'against the walk',
  warmer: 'warmer',
  cooler: 'cooler',
  long: 'too long',
  short: 'too short',
};

function senseWords(sense: Sense, { units, names }: Scene): string {
  if (names.beam && sense === 'across') return 'up';
  if (names.beam && sense === 'against') return 'down';
  if (sense === 'right' || sense === 'left') return `to the ${sense}`;
  if (sense === 'anticlockwise') return turning(units);
  return fixedWords[sense] ?? sense;
}

function whereWords(l: LoadSymbol, scene: Scene): string {
  const { analysis, placed } = scene;
  const loads = analysis.cases.find((c) => c.id === l.case)?.loads ?? [];
  const places = l.loads.flatMap((i): string[] => {
    const load = loads[i];
    if (!load) return [];
    if (load.kind === 'joint') return [plain(load.joint)];
    if (load.kind === 'settlement') return [`support ${plain(load.joint)}`];
    if (load.kind === 'self-weight') {
      const own = analysis.members.filter(
        (m) => m.weight === l.value.value && (load.members === undefined || load.members.includes(m.id)),
      );
      return own.map((m) => memberName(m.id, placed));
    }
    return [`${memberName(load.member, placed)}${partWords(load, l)}`];
  });
  return listWords([...new Set(places)]);
}

const memberName = (id: string, placed: Scene['placed']): string => {
  const p = placed.get(id);
  return p ? memberWords(p) : plain(id);
};

type MemberLoad = Exclude<
  Scene['analysis']['cases'][number]['loads'][number],
  { kind: 'joint' | 'settlement' | 'self-weight' }
>;

function partWords(load: MemberLoad, l: LoadSymbol): string {
  if (load.kind === 'temperature') return l.part === 'difference' ? ', left face over right' : ', throughout';
  if (load.kind === 'misfit') return '';
  if (load.kind === 'point' || load.kind === 'couple') return `, at ${load.at}`;
  const range =
    load.from !== undefined || load.to !== undefined
      ? `, from ${load.from ?? 0} to ${load.to ?? 'the end'}`
      : '';
  const end = l.part === 'from' ? ', at its first end' : l.part === 'to' ? ', at its second end' : '';
  const per =
    load.per === 'projection'
      ? load.direction === 'y'
        ? ', per length of plan'
        : ', per length of elevation'
      : '';
  return `${range}${end}${per}`;
}

function sourceOf(l: LoadSymbol, { analysis }: Scene): string {
  const loads = analysis.cases.find((c) => c.id === l.case)?.loads ?? [];
  const all = l.loads.flatMap((i) => (loads[i]?.source ? [plain(loads[i]?.source ?? '')] : []));
  return [...new Set(all)].join('; ');
}
