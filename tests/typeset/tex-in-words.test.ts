import { describe, expect, it } from 'vitest';
import { texInWords } from '@/lib/typeset/tex-in-words';
import { FORMULAS } from './formulas';

describe('TeX in plain characters', () => {
  it.each([
    ['EI_0\\,f_{11}=\\frac{7.20}{3\\times 2}=1.200\\unit{m}', 'EI_0 f_11 = 7.20/(3 × 2) = 1.200 m'],
    ['w_D=1.20\\unit{kN/m^2}\\times4.50\\unit{m}', 'w_D = 1.20 kN/m² × 4.50 m'],
    ['{=}\\;\\mathopen{}-\\frac{4.20}{2}+1', '= −4.20/2 + 1'],
    ['\\bar m_1', 'm̄_1'],
    ['\\boxed{3.9083\\unit{kip}}', '3.9083 kip'],
    ['\\begin{bmatrix}1&2\\\\3&4\\end{bmatrix}', '[1 2; 3 4]'],
    ['30.016\\times10^{-6}', '30.016 × 10⁻⁶'],
    ['\\sqrt{M_x^2+M_y^2}', '√(M_x² + M_y²)'],
    ['\\mathrm{kN\\per m}', 'kN·m'],
  ])('%s', (tex, words) => {
    expect(texInWords(tex)).toBe(words);
  });

  it.each(FORMULAS)('leaves no command and no brace of %s', (tex) => {
    expect(texInWords(tex)).not.toMatch(/\\/);
  });
});
