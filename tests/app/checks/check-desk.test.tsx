import { renderToStaticMarkup } from 'react-dom/server';
import { expect, test } from 'vitest';
import { CheckDesk } from '@/app/jobs/[job]/checks/[check]/check-desk';
import type { Block } from '@/templates/block';

const blocks: Block[] = [
  { id: '1', kind: 'heading', text: 'Loads' },
  { id: '1.1', kind: 'paragraph', text: 'Characteristic values.' },
];
const never = () => Promise.reject(new Error('no form is sent here'));
const query = { id: 'm', line: '1.1', kind: 'query' as const, text: 'From where?', answer: null };

function page(check: { state: 'open' | 'agreed' | 'returned' | 'void'; mine: boolean }, mayAnswer = false) {
  return renderToStaticMarkup(
    <CheckDesk
      title="S-01 Beam, revision 0"
      blocks={blocks}
      check={{ ...check, checker: 'A. Checker', note: '' }}
      marks={[query]}
      onMark={never}
      onConclude={never}
      onAnswer={never}
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
