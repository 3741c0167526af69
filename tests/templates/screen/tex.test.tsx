import katex from 'katex';
import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';
import { MACROS } from '@/lib/typeset/macros';
import { RichText } from '@/templates/screen/rich-text';
import { Tex } from '@/templates/screen/tex';

const formulas = [
  'X_2=M_{CD}=\\frac{-25.013\\times5.400-1.500\\times33.502}{19.35}=-9.577\\unit{kN\\per m}',
  '\\begin{bmatrix}5.400&-1.500\\\\-1.500&4.000\\end{bmatrix}',
  '\\sqrt{(V_2^{\\mathrm D})^2+2w_nM_2}',
  '\\bar m_1\\le 1<2',
  '\\boxed{6.30\\unit{kN/m}}\\quad\\text{a \\& b, "quoted"}',
];

/** Tags, attributes and text of markup, whatever the order or spelling of attributes. */
const essence = (markup: string): string =>
  markup
    .replaceAll('&#x27;', "'")
    .replaceAll('&quot;', '"')
    .replace(/<([a-z]+)((?:\s+[\w:-]+="[^"]*")*)\s*\/?>/gi, (_, tag: string, attributes: string) => {
      const list = (attributes.match(/[\w:-]+="[^"]*"/g) ?? []).map((a) =>
        a.replace(/;(?=")|(?<=[:;])\s+/g, '').toLowerCase(),
      );
      return `<${tag} ${list.toSorted().join(' ')}>`;
    })
    .replace(/<\/(?:path|line|col|mspace|mpadded)>/g, '');

describe('Tex', () => {
  it.each(formulas)('is what KaTeX writes: %s', (tex) => {
    const own = katex.renderToString(tex, { output: 'htmlAndMathml', macros: { ...MACROS }, strict: false });
    expect(essence(renderToStaticMarkup(<Tex>{tex}</Tex>))).toBe(essence(own));
  });

  it('holds MathML for those who listen', () => {
    expect(renderToStaticMarkup(<Tex>{'\\frac{1}{2}'}</Tex>)).toContain('<mfrac>');
  });

  it('shows TeX it cannot set as it was written', () => {
    expect(renderToStaticMarkup(<Tex>{'\\nosuchthing{1}'}</Tex>)).toContain('nosuchthing');
  });

  it('runs nothing that stands in the TeX', () => {
    const markup = renderToStaticMarkup(
      <Tex>{'\\href{javascript:alert(1)}{x}\\text{<img src=x onerror=alert(1)>}'}</Tex>,
    );
    expect(markup).not.toMatch(/<img|<a /);
    expect(markup).not.toContain('href=');
  });
});

describe('RichText', () => {
  const show = (text: string) => renderToStaticMarkup(<RichText text={text} />);

  it('tells words, bold words and mathematics apart', () => {
    const markup = show('Walk **on** from $B$ for \\$5');
    expect(markup).toContain('Walk <b>on</b> from <span class="katex">');
    expect(markup).toContain(' for $5');
  });

  it('keeps a mark with the formula before it', () => {
    expect(show('about $A$, then')).toMatch(/<span class="keep">.*,<\/span> then/);
  });

  it('shows markup as text', () => {
    expect(show('a <b>bold</b> & more')).toContain('a &lt;b&gt;bold&lt;/b&gt; &amp; more');
  });
});
