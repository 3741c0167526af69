import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { type Block, blocks } from '@/templates/block';
import { equalsColumn } from '@/templates/screen/equals-column';
import { layOutLabel } from '@/templates/screen/lay-out-label';
import { SheetView } from '@/templates/screen/sheet-view';

const drawing = {
  width: 200,
  height: 100,
  alt: 'A beam on two supports.',
  shapes: [
    {
      kind: 'line',
      x1: 0,
      y1: 50,
      x2: 200,
      y2: 50,
      stroke: 'ink',
      width: 2,
      ref: { of: 'member', id: 'A-B' },
    },
    {
      kind: 'label',
      x: 100,
      y: 20,
      text: '$5.40\\unit{kN/m}$',
      size: 10,
      anchor: 'middle',
      tone: 'pen',
      halo: true,
    },
    { kind: 'label', x: 10, y: 20, text: '$4.20$', size: 10, anchor: 'middle', turn: 90 },
  ],
};

const sheet = blocks.parse([
  { kind: 'heading', id: '2', text: 'Structure and loads' },
  { kind: 'paragraph', id: '2.1', source: 'EN 1991-1-3, 5.3.2', text: 'Snow $S$ on the roof.' },
  {
    kind: 'equations',
    id: '2.2',
    text: 'Dead load:',
    rows: [
      { lhs: 'w_D', chain: ['g\\,s', '1.20\\times4.50', '-5.40\\unit{kN/m}'], boxed: true, note: '(down)' },
      { lhs: 'M_{CE}', chain: ['0'] },
      { lhs: '\\sum M_1: R_{4y}\\ell-Pa=0', chain: [] },
    ],
  },
  {
    kind: 'figure',
    id: '2.3',
    caption: 'Figure 1.',
    drawings: [drawing],
    narrow: [{ ...drawing, width: 150 }],
  },
  {
    kind: 'table',
    id: '2.4',
    caption: 'Parts',
    columns: [
      { head: 'Part', align: 'left' },
      { head: 'Area $A$', unit: '\\mathrm{kN\\per m^2}', align: 'right' },
    ],
    rows: [{ cells: ['BC', '$167.962$'] }, { cells: ['Sum', '$167.962$'], emphasis: 'total' }],
    note: 'By integration.',
  },
  { kind: 'caution', id: '2.5', text: 'First-order analysis.' },
]);

const show = (extra: Partial<Parameters<typeof SheetView>[0]> = {}) =>
  renderToStaticMarkup(<SheetView blocks={sheet} {...extra} />);
const words = (markup: string) => markup.replace(/<[^>]+>/g, ' ').replace(/\s+/g, ' ');

describe('SheetView', () => {
  it('numbers every line so that a mark can find it', () => {
    for (const { id } of sheet) expect(show()).toContain(`id="line-${id}" data-line="${id}"`);
  });

  it('puts sources in the margin', () => {
    expect(show()).toContain('<div class="src">EN 1991-1-3, 5.3.2</div>');
  });

  it('gives every member of a chain its own place to break before, with its equals sign', () => {
    const links = show().match(/<span class="link" style="--piece:[\d.]+">/g);
    expect(links).toHaveLength(4);
    expect(words(show())).toContain('(down)');
  });

  it('boxes the result that goes on to another sheet', () => {
    expect(show()).toContain('\\boxed{-5.40');
    expect(show()).not.toContain('\\boxed{g');
  });

  it('repeats the unit under the head of a column and marks totals', () => {
    expect(show()).toMatch(/<th scope="col" class="to-right">.*?<span class="unit">/s);
    expect(show()).toContain('<tr class="total">');
  });

  it('says a figure in words, and lays it out again for narrow columns', () => {
    const markup = show();
    expect(markup.match(/role="img" aria-label="A beam on two supports\."/g)).toHaveLength(2);
    expect(markup).toContain('class="drawings when-narrow"');
  });

  it('lights what is in hand', () => {
    const lit = show({ lit: { of: 'member', id: 'A-B' } });
    expect(lit).toMatch(/<line[^>]*class="line-ink fill-none lit"/);
    expect(show()).not.toContain(' lit"');
  });

  it('gives a pointer something broad to meet, only where it is listened to', () => {
    expect(show({ onLight: () => undefined })).toMatch(
      /<line[^>]*class="hit" data-of="member" data-id="A-B"/,
    );
    expect(show()).not.toContain('class="hit"');
  });

  it('washes the line in hand and carries marks, deltas and answers of one line', () => {
    const at = (id: string, text: string) => (block: Block) => (block.id === id ? <i>{text}</i> : undefined);
    const markup = show({
      on: '2.2',
      marks: at('2.1', 'tick'),
      delta: at('2.2', 'two'),
      after: at('2.5', 'answer'),
    });
    expect(markup).toContain('class="blk equations on"');
    expect(markup).toContain('<span class="marks"><i>tick</i></span>');
    expect(markup.match(/<i>/g)).toHaveLength(3);
  });

  it('turns dimensions of columns upward', () => {
    expect(show()).toContain('transform="rotate(-90 10 20)"');
  });
});

describe('the column of equals signs', () => {
  it('is as wide as the longest left-hand side of a chain', () => {
    expect(equalsColumn(sheet)).toBeCloseTo(layOutLabel('$M_{CE}$').width, 1);
  });

  it('is not moved by one that is longer than any column', () => {
    const long = blocks.parse([
      { kind: 'equations', id: '1.1', rows: [{ lhs: 'a+b+c+d+e+f+g+h+i+j+k', chain: ['1'] }] },
    ]);
    expect(equalsColumn([...sheet, ...long])).toBe(equalsColumn(sheet));
  });
});
