import { renderToStaticMarkup } from 'react-dom/server';
import { expect, test } from 'vitest';
import { CommentList } from '@/app/review/[token]/comment-list';
import type { ReviewComment } from '@/app/review/[token]/review-desk';

const comment = (state: ReviewComment['state']): ReviewComment => ({
  id: 'c',
  number: 1,
  revisionId: 'r',
  line: '2.5',
  code: '',
  text: 'State the wind zone.',
  answer: state === 'open' ? null : 'Line 3.4.',
  state,
  where: 'S-01, line 2.5',
});
const page = (state: ReviewComment['state']) =>
  renderToStaticMarkup(
    <CommentList title="Comments" comments={[comment(state)]} onSettle={() => Promise.reject()} />,
  );

test('an answered comment is accepted or opened again', () => {
  expect(page('answered')).toContain('Accept the answer');
  expect(page('answered')).toContain('Open it again');
});

test.each(['open', 'accepted', 'reopened'] as const)(
  'a comment that is %s waits for nothing of the reviewer',
  (state) => {
    expect(page(state)).not.toContain('Accept the answer');
  },
);
