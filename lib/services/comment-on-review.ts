// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { decisionOf, insertComment, type ReviewLinkRow } from '@/db/queries/reviews';
import { revisionsOfSubmittal } from '@/db/queries/revisions';
import { inTransaction } from './in-transaction';
import { done, mend, type Result, unread } from './result';

const input = z.object({
  revisionId: z.string().max(36),
  line: z.string().min(1, 'Choose the line it is about.').max(40),
  text: z.string().trim().min(2, 'Say what you ask for.').max(2000),
  code: z.string().trim().max(200),
});

/** A reviewer's comment, pinned to a line of a sheet and numbered. */
export async function commentOnReview(
  link: ReviewLinkRow,
  raw: unknown,
): Promise<Result<{ number: number }>> {
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { revisionId, line, text, code } = parsed.data;
  return inTransaction(
    { officeId: link.office_id, person: link.reviewer },
    async (trx, record): Promise<Result<{ number: number }>> => {
      const revisions = await revisionsOfSubmittal(trx, link.office_id, link.submittal_id);
      const fault = !revisions.some((r) => r.id === revisionId)
        ? 'This sheet is not part of the submittal.'
        : (await decisionOf(trx, link.office_id, link.submittal_id))
          ? 'The decision is recorded; comments are closed.'
          : undefined;
      if (fault) {
        await record('could not comment', link.submittal_id);
        return mend('', fault);
      }
      const number = await insertComment(trx, {
        id: randomUUID(),
        office_id: link.office_id,
        submittal_id: link.submittal_id,
        revision_id: revisionId,
        line,
        code,
        text,
        author: link.reviewer,
        at: new Date(),
      });
      await record('commented', `comment ${number} on line ${line}`);
      return done({ number });
    },
  );
}
