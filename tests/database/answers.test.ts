import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { database } from '@/db/connection';
import { answerComment } from '@/lib/services/answer-comment';
import { commentOnReview } from '@/lib/services/comment-on-review';
import { openComments } from '@/lib/services/open-comments';
import { printResponses } from '@/lib/services/print-responses';
import { readSubmittalFile } from '@/lib/services/read-file';
import { settleComment } from '@/lib/services/settle-comment';
import { makeJob, makeOffice, need } from './office-factory';
import { checkedSheet } from './sheet-factory';
import { draftedSubmittal, reviewLinkOf, sealSubmittal, sendTo } from './submittal-factory';

afterAll(() => database().destroy());

/** What pdftotext (poppler) reads in a file, in one line. */
function textOf(bytes: Uint8Array): string {
  const folder = mkdtempSync(join(tmpdir(), 'fairhand-text-'));
  const file = join(folder, 'file.pdf');
  writeFileSync(file, bytes);
  const text = execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' });
  rmSync(folder, { recursive: true });
  return text.replace(/\s+/g, ' ');
}

describe('the answers to the comments of a job', () => {
  it('stand in one register over all rounds, in a letter of their own, and in the next package', async () => {
    const office = await makeOffice();
    const { engineer } = office.people;
    const jobId = await makeJob(office);
    const { revisionId } = await checkedSheet(office, jobId);
    const first = await draftedSubmittal(office, jobId, [revisionId]);
    await sealSubmittal(office, first);
    const link = await reviewLinkOf(await sendTo(office, first));
    const asked = { revisionId, line: '2.1', text: 'Name the drawing of the span.', code: 'Clause 9' };
    need(await commentOnReview(link, asked));
    const [open] = (await openComments(engineer, jobId)).comments;
    expect(open).toMatchObject({ round: 1, number: 1, state: 'open', about: 'S-01 revision 0, line 2.1' });
    const commentId = open?.id as string;
    const place = 'S-01.1, revision 0';
    need(await answerComment(engineer, { commentId, answer: 'It is drawing A-201.', place }));
    need(await settleComment(link, { commentId, outcome: 'reopened', text: 'Which issue of it?' }));
    need(await answerComment(engineer, { commentId, answer: 'Issue C.', place }));
    const [answered] = (await openComments(engineer, jobId)).comments;
    expect(answered?.state).toBe('answered');
    expect(answered?.said.map((s) => s.kind)).toEqual(['answered', 'reopened', 'answered']);

    const second = await draftedSubmittal(office, jobId, [revisionId]);
    for (const bytes of [await printResponses(engineer, jobId), await readSubmittalFile(engineer, second)]) {
      const text = textOf(bytes);
      expect(text).toContain('Answers to comments on submittal 1');
      for (const words of [
        'Name the drawing of the span.',
        'Clause 9',
        'It is drawing A-201.',
        'Issue C.',
        place,
      ])
        expect(text).toContain(words);
      expect(text.indexOf('A-201')).toBeLessThan(text.indexOf('Which issue of it?'));
    }
    expect(textOf(await readSubmittalFile(engineer, first))).not.toContain('Answers to comments');
  });
});
