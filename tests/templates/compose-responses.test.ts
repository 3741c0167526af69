import { describe, expect, it } from 'vitest';
import { type AnsweredComment, composeResponses } from '@/templates/compose-responses';

const comment: AnsweredComment = {
  round: 1,
  decision: 'Revise and Resubmit',
  number: 2,
  about: 'S-03 revision 0, line 7.5',
  code: 'Clause 1607',
  text: 'Why is $100 ** used?',
  author: 'R. Viewer',
  date: '2026-11-17',
  state: 'open',
  said: [],
};

const texts = (comments: AnsweredComment[]) =>
  composeResponses(comments).map((b) => ('text' in b ? b.text : undefined));

describe('the answers to comments', () => {
  it('are none where nothing was asked', () => {
    expect(composeResponses([])).toEqual([]);
  });

  it('say that a comment is not answered yet, and keep typed signs as they are', () => {
    expect(texts([comment])).toEqual([
      'Answers to comments on submittal 1, Revise and Resubmit',
      '**Comment 2**, S-03 revision 0, line 7.5, Clause 1607 (R. Viewer, 2026-11-17; open): Why is \\$100 * * used?',
      'Not answered yet.',
    ]);
  });

  it('give all that was said, in order, with the place where it was answered', () => {
    const said: AnsweredComment['said'] = [
      {
        kind: 'answered',
        text: 'Raised.',
        place: 'S-03.2, revision 1',
        author: 'E. Gin',
        date: '2026-11-18',
      },
      { kind: 'accepted', text: '', place: '', author: 'R. Viewer', date: '2026-11-20' },
    ];
    expect(texts([{ ...comment, state: 'accepted', said }]).slice(2)).toEqual([
      '**Answer** (E. Gin, 2026-11-18): Raised. Where: S-03.2, revision 1.',
      '**Accepted** (R. Viewer, 2026-11-20)',
    ]);
  });

  it('stand round by round, every line with an id of its own', () => {
    const blocks = composeResponses([comment, { ...comment, round: 2, decision: null, number: 1 }]);
    expect(blocks.filter((b) => b.kind === 'heading').map((b) => b.id)).toEqual(['C1', 'C2']);
    expect(new Set(blocks.map((b) => b.id)).size).toBe(blocks.length);
  });
});
