import { describe, expect, it } from 'vitest';
import { solve } from '@/lib/engine/solve';
import type { Analysis } from '@/lib/model/analysis';
import { type Block, blocks as schema } from '@/templates/block';
import { compose } from '@/templates/compose';
import { layOutLabel } from '@/templates/screen/lay-out-label';
import { odd } from '../engine/derivation/odd-structures';
import { fixedPortal, hingedPortal, samples, simpleBeam } from '../engine/derivation/sample-structures';

function blocksOf(analysis: Analysis, options: Parameters<typeof compose>[1] = { figures: false }): Block[] {
  const solved = solve(analysis);
  if (!solved.ok) throw new Error(solved.refusal.message);
  return compose(solved.value, options);
}

/** Every text of a block that may hold TeX. */
function textsOf(b: Block): string[] {
  const source = 'source' in b && b.source ? [b.source] : [];
  switch (b.kind) {
    case 'equations':
      return [
        ...source,
        b.text ?? '',
        ...b.rows.flatMap((r) => [`$${r.lhs}$`, ...r.chain.map((c) => `$${c}$`), r.note ?? '']),
      ];
    case 'table':
      return [
        ...source,
        b.caption ?? '',
        b.note ?? '',
        ...b.columns.flatMap((c) => [c.head, c.unit ? `$${c.unit}$` : '']),
        ...b.rows.flatMap((r) => r.cells),
      ];
    case 'figure':
      return [b.caption];
    default:
      return [...source, b.text];
  }
}

const said = (blocks: readonly Block[]) => blocks.flatMap(textsOf).join('\n');

describe.each(Object.entries<Analysis>({ ...samples, ...odd }))('the blocks of %s', (_, analysis) => {
  const blocks = blocksOf(analysis);

  it('are of the stored form, each line with a number of its own', () => {
    expect(schema.parse(blocks)).toEqual(blocks);
    const ids = blocks.map((b) => b.id);
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('have seventeen headings, none of them bare', () => {
    const headings = blocks.filter((b) => b.kind === 'heading');
    expect(headings.map((h) => h.id)).toEqual(Array.from({ length: 17 }, (_, i) => `${i + 1}`));
    blocks.forEach((b, i) => {
      if (b.kind === 'heading') expect(blocks[i + 1]?.kind).not.toBe('heading');
    });
  });

  it('hold TeX that can be set', () => {
    for (const text of blocks.flatMap(textsOf)) {
      for (const tex of text.split(/(?<!\\)\$/).filter((_, i) => i % 2 === 1)) {
        expect(() => layOutLabel(`$${tex}$`)).not.toThrow();
      }
    }
  });

  it('have as many cells in a row as columns, and no number that is none', () => {
    for (const b of blocks) {
      if (b.kind !== 'table') continue;
      for (const row of b.rows) expect(row.cells).toHaveLength(b.columns.length);
    }
    expect(said(blocks)).not.toMatch(/NaN|Infinity|undefined/);
  });
});

describe('compose', () => {
  it('says that a determinate structure leaves nothing to solve', () => {
    expect(said(blocksOf(simpleBeam))).toContain('There is nothing to solve: the structure is determinate');
  });

  it('writes the words and numbers of the country', () => {
    const us = said(blocksOf(hingedPortal));
    expect(us).toContain('counterclockwise');
    expect(us).toMatch(/\d\{,\}\d{3}/);
    const si = said(blocksOf(fixedPortal));
    expect(si).toContain('anticlockwise');
    expect(si).not.toContain('{,}');
    expect(si).toMatch(/\d{2}\\,\d{3}/);
  });

  it('draws its figures for pages and for phones', () => {
    const figures = blocksOf(hingedPortal, {}).filter((b) => b.kind === 'figure');
    expect(figures.length).toBeGreaterThan(8);
    expect(figures.every((f) => f.narrow?.length)).toBe(true);
    const wide = blocksOf(hingedPortal, { narrowFigures: false }).filter((b) => b.kind === 'figure');
    expect(wide.every((f) => f.narrow === undefined)).toBe(true);
  });

  it('prints the basis in the engineer’s own words, safe from marks of mathematics', () => {
    const text = said(blocksOf(simpleBeam, { figures: false, basis: 'Cost $5 a **metre**.' }));
    expect(text).toContain('Cost \\$5 a ∗∗metre∗∗.');
  });

  it('keeps the numbers of its lines when only loads change', () => {
    const heavier = structuredClone(hingedPortal);
    for (const load of heavier.cases[0]?.loads ?? []) if (load.kind === 'point') load.value *= 1.7;
    const ids = (a: Analysis) => blocksOf(a).map((b) => `${b.kind} ${b.id}`);
    expect(ids(heavier)).toEqual(ids(hingedPortal));
  });

  it('gives every combination the source of its factors', () => {
    const table = blocksOf(hingedPortal).find(
      (b) => b.kind === 'table' && b.caption?.endsWith('Combinations.'),
    );
    if (table?.kind !== 'table') throw new Error('no table of combinations');
    expect(table.rows.every((r) => r.cells[3] === 'ASCE/SEI 7-16, 2.3.1')).toBe(true);
  });
});
