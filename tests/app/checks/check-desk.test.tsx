import { renderToStaticMarkup } from 'react-dom/server';
import { expect, test } from 'vitest';
import { CheckDesk } from '@/app/jobs/[job]/checks/[check]/check-desk';
import type { CheckMark } from '@/app/jobs/[job]/checks/[check]/check-mark';
import type { Block } from '@/templates/block';

const blocks: Block[] = [
  { id: '1', kind: 'heading', text: 'Loads' },
  { id: '1.1', kind: 'paragraph', text: 'Characteristic values.' },
];
const never = () => Promise.reject(new Error('no form is sent here'));
const query = {
  id: 'm',
  place: 'line' as const,
  line: '1.1',
  where: 'line 1.1',
  kind: 'query' as const,
  text: 'From where?',
  drawing: '',
};
const open = { ...query, state: 'open' as const, steps: [] };
const answered = {
  ...query,
  state: 'answered' as const,
  steps: [{ kind: 'answered' as const, text: 'From A-201.', by: 'E. Gineer', at: '1 Dec 2026' }],
};

function page(
  check: { state: 'open' | 'agreed' | 'returned' | 'void'; mine: boolean },
  mayAnswer = false,
  mark: CheckMark = open,
  category = 1,
) {
  return renderToStaticMarkup(
    <CheckDesk
      title="S-01 Beam, revision 0"
      blocks={blocks}
      check={{ ...check, checker: 'A. Checker', note: '', category, declaration: '' }}
      marks={[mark]}
      earlier={[{ id: 'e', where: 'line 2.1', revision: 0, kind: 'correct', text: 'The span is 7 m.' }]}
      inputs={{ href: '/inputs', all: 4, asked: true }}
      onMark={never}
      onConclude={never}
      onAnswer={never}
      certificate="/certificate"
      onSettle={never}
      onVerify={never}
      mayAnswer={mayAnswer}
    />,
  );
}

test('the checker of an open check marks lines and concludes', () => {
  const html = page({ state: 'open', mine: true });
  expect(html).toContain('Leave the mark');
  expect(html).toContain('Agree the sheet');
  expect(html).toContain('Take line 1.1 in hand');
});

test('a mark stands in the margin of its own line', () => {
  const html = page({ state: 'open', mine: false });
  const line = html.slice(html.indexOf('data-line="1.1"'));
  expect(line.slice(0, line.indexOf('class="bd"'))).toContain('Line 1.1 query');
  expect(html.slice(0, html.indexOf('data-line="1.1"'))).not.toContain('Line 1 query');
});

test('everyone else reads, and the originator answers', () => {
  const reader = page({ state: 'open', mine: false });
  expect(reader).not.toContain('Leave the mark');
  expect(reader).not.toContain('Record the answer');
  expect(page({ state: 'open', mine: false }, true)).toContain('Record the answer');
});

test.each(['agreed', 'returned', 'void'] as const)('nobody marks a check that is %s', (state) => {
  expect(page({ state, mine: true })).not.toContain('Leave the mark');
});

test('an answer waits for its checker alone', () => {
  expect(page({ state: 'open', mine: true }, false, answered)).toContain('Accept the answer');
  expect(page({ state: 'open', mine: false }, true, answered)).not.toContain('Accept the answer');
  expect(page({ state: 'open', mine: false }, true, answered)).not.toContain('Record the answer');
});

test('what an earlier revision left open is verified by the checker', () => {
  expect(page({ state: 'open', mine: true })).toContain('Not corrected: carry on');
  const reader = page({ state: 'open', mine: false });
  expect(reader).toContain('line 2.1, revision 0');
  expect(reader).not.toContain('Not corrected: carry on');
});

test('categories 2 and 3 ask for the declaration', () => {
  for (const [category, asks] of [
    [0, false],
    [1, false],
    [2, true],
    [3, true],
  ] as const)
    expect(page({ state: 'open', mine: true }, false, open, category).includes('name="declared"')).toBe(asks);
});
