// server only
import { z } from 'zod';
import { commentById, insertResponse, type ReviewLinkRow } from '@/db/queries/reviews';
import { submittalById } from '@/db/queries/submittals';
import { inTransaction } from './in-transaction';
import { type Result, unread } from './result';
import { reviewer } from './reviewer';
import { NotFound, refuse } from './service-error';

const input = z
  .object({
    commentId: z.string().max(36),
    outcome: z.enum(['accepted', 'reopened']),
    text: z.string().trim().max(2000).default(''),
  })
  .refine((s) => s.outcome === 'accepted' || s.text !== '', {
    path: ['text'],
    message: 'Say what is still asked for.',
  });

/**
 * The reviewer's back-check of an answer: accepted, or opened again. It is done through the link of the comment's own
 * submittal or of a later one of the same job.
 */
export async function settleComment(link: ReviewLinkRow, raw: unknown): Promise<Result<null>> {
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { commentId, outcome, text } = parsed.data;
  const officeId = link.office_id;
  return inTransaction(reviewer(link), async (trx, record) => {
    const found = await commentById(trx, officeId, commentId);
    const through = await submittalById(trx, officeId, link.submittal_id);
    if (!found || through?.job_id !== found.job_id) throw new NotFound(`comment ${commentId}`);
    const own = await submittalById(trx, officeId, found.submittal_id, true);
    if (!own || own.number > through.number) throw new NotFound(`comment ${commentId}`);
    const comment = (await commentById(trx, officeId, commentId)) ?? found;
    if (comment.state !== 'answered') refuse('not-answered', '', 'There is no new answer to this comment.');
    await insertResponse(trx, {
      office_id: officeId,
      comment_id: commentId,
      kind: outcome,
      text,
      place: '',
      author: link.reviewer,
      at: new Date(),
    });
    const verb = outcome === 'accepted' ? 'accepted an answer' : 'opened a comment again';
    const about = { jobId: comment.job_id, aboutId: comment.submittal_id };
    await record(verb, `comment ${comment.number}${text === '' ? '' : `: ${text}`}`.slice(0, 400), about);
    return null;
  });
}
