import { describe, expect, it } from 'vitest';
import { blocks } from '@/templates/block';
import { type CertifiedCheck, composeCertificate, composeChecks } from '@/templates/compose-certificate';

const check: CertifiedCheck = {
  sheet: 'S-03',
  title: 'Portal at grid 3',
  revision: 1,
  digest: 'ab'.repeat(32),
  originator: 'Eno Gin',
  frozen: '20 Nov 2026',
  checker: 'Che Ker',
  organisation: 'Other Engineers (invented)',
  category: 3,
  standardSolution: '',
  blind: true,
  given: '21 Nov 2026',
  standing: 'agreed, 24 Nov 2026',
  note: '',
  declaration: 'I was not consulted.',
  lines: 40,
  marks: [
    {
      place: 'line',
      where: 'line 7.5',
      kind: 'correct',
      text: 'Costs $5 more',
      drawing: '',
      state: 'accepted',
      steps: [{ word: 'answered', text: 'See A-201.', by: 'EG', at: '22 Nov 2026' }],
    },
    { place: 'line', where: 'line 1.2', kind: 'agrees', text: '', drawing: '', state: 'agrees', steps: [] },
    {
      place: 'basis',
      where: 'roof load',
      kind: 'query',
      text: 'Which?',
      drawing: '',
      state: 'open',
      steps: [],
    },
  ],
  inputs: [
    { place: 'span', value: '6 m', mark: 'agrees', drawing: 'A-201' },
    { place: 'left height', value: '4 m' },
  ],
  comparison: {
    own: 'S-07 revision 0',
    at: '23 Nov 2026',
    pairs: [
      { name: 'reaction at 1 along y, case D', unit: 'kN', before: -1234.5, after: -1240, change: -0.0045 },
    ],
  },
};

const words = (of: { blocks: unknown[] }) => JSON.stringify(of.blocks);

describe('a check certificate', () => {
  it('names sheet, people, category with its source, method and outcome from the record', () => {
    const said = words(composeCertificate(check));
    for (const part of [
      'S-03 Portal at grid 3, revision 1',
      'Eno Gin, frozen 20 Nov 2026',
      'Che Ker, Other Engineers (invented)',
      'category 3, another organisation (BS 5975-1:2024',
      'own derivation, without the designer’s sheet',
      'agreed, 24 Nov 2026',
      '2 of 40 lines; 1 of 2 inputs',
      'I was not consulted.',
    ])
      expect(said).toContain(part);
  });

  it('gives each mark a line of its own with its shape in the margin and its word beside', () => {
    const { blocks: lines, marks } = composeCertificate(check);
    const marked = lines.flatMap((b) =>
      b.kind === 'paragraph' && marks[b.id] ? [[b.text, marks[b.id]?.mark]] : [],
    );
    expect(marked).toEqual([
      [
        '**line 7.5**, correct this (accepted): Costs \\$5 more. Answered by EG, 22 Nov 2026: See A-201.',
        'correct',
      ],
      ['**roof load**, query (open): Which?', 'query'],
      ['Agrees without remark: 1.2.', 'agrees'],
    ]);
  });

  it('shows an input that was not held, and every value of the comparison with its difference', () => {
    const said = words(composeCertificate(check));
    expect(said).toContain('"left height","4 m","not held"');
    expect(said).toContain('$-1{,}234.500$');
    expect(said).toContain('$-0.5\\\\%$');
  });

  it('leaves out what the check does not have', () => {
    const bare = { ...check, marks: [], inputs: [], comparison: undefined, declaration: '' };
    const heads = composeCertificate(bare).blocks.filter((b) => b.kind === 'heading');
    expect(heads.map((h) => h.text)).toEqual(['Certificate']);
  });

  it('keeps every line of a package of several checks apart', () => {
    const { blocks: lines, marks } = composeChecks([check, { ...check, sheet: 'S-04' }]);
    const ids = blocks.parse(lines).map((b) => b.id);
    expect(new Set(ids).size).toBe(ids.length);
    expect(Object.keys(marks).every((id) => ids.includes(id))).toBe(true);
    expect(composeChecks([]).blocks).toEqual([]);
  });
});
