// server only
import { z } from 'zod';
import { commentById, insertResponse } from '@/db/queries/reviews';
import { submittalById } from '@/db/queries/submittals';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound, refuse } from './service-error';

const input = z.object({
  commentId: z.string().max(36),
  answer: z.string().trim().min(1, 'An answer is missing.').max(2000),
  /** Where it was answered: sheet, page, revision. */
  place: z.string().trim().max(120).optional(),
});

/** The office's answer to a reviewer's comment. Answers are added; none takes the place of another. */
export async function answerComment(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { commentId, answer, place } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const found = await commentById(trx, officeId, commentId);
    if (!found) throw new NotFound(`comment ${commentId}`);
    await submittalById(trx, officeId, found.submittal_id, true);
    // Read again under the lock of its submittal, since the reviewer may be accepting it at this instant.
    const comment = (await commentById(trx, officeId, commentId)) ?? found;
    if (comment.state === 'accepted')
      refuse('comment-accepted', '', 'The reviewer accepted the answer already; it stands.');
    await insertResponse(trx, {
      office_id: officeId,
      comment_id: commentId,
      kind: 'answered',
      text: answer,
      place: place ?? '',
      author: actor.name,
      at: new Date(),
    });
    const about = { jobId: comment.job_id, aboutId: comment.submittal_id };
    await record('answered', `comment ${comment.number}: ${answer}`.slice(0, 400), about);
    return null;
  });
}
