// server only
import { z } from 'zod';
import { answerComment as writeAnswer } from '@/db/queries/reviews';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { done, type Result, unread } from './result';
import { NotFound } from './service-error';

const input = z.object({
  commentId: z.string().max(36),
  answer: z.string().trim().min(1, 'An answer is missing.').max(2000),
});

/** The office's answer to a reviewer's comment. */
export async function answerComment(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  await inTransaction({ officeId: actor.officeId, person: actor.name }, async (trx, record) => {
    if ((await writeAnswer(trx, actor.officeId, parsed.data.commentId, parsed.data.answer)) !== 1)
      throw new NotFound('comment');
    await record('answered a comment', parsed.data.commentId);
  });
  return done(null);
}
