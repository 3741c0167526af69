// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { decisionOf, insertComment, type ReviewLinkRow } from '@/db/queries/reviews';
import { revisionsOfSubmittal } from '@/db/queries/revisions';
import { submittalById } from '@/db/queries/submittals';
import { inTransaction } from './in-transaction';
import { type Result, unread } from './result';
import { reviewer } from './reviewer';
import { NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';

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
  const { office_id, submittal_id } = link;
  return inTransaction(reviewer(link), async (trx, record) => {
    const submittal = await submittalById(trx, office_id, submittal_id, true);
    if (!submittal) throw new NotFound('submittal of a link');
    const revision = (await revisionsOfSubmittal(trx, office_id, submittal_id)).find(
      (r) => r.id === revisionId,
    );
    if (!revision) refuse('not-in-submittal', '', 'This sheet is not part of the submittal.');
    if (await decisionOf(trx, office_id, submittal_id))
      refuse('decided', '', 'The decision is recorded; comments are closed.');
    const id = randomUUID();
    const at = new Date();
    const author = link.reviewer;
    const row = { id, office_id, submittal_id, revision_id: revisionId, line, code, text, author, at };
    const number = await insertComment(trx, row);
    const words = `comment ${number} on ${sheetName(revision.sheet_number)}, line ${line}: ${text}`;
    const about = { digest: revision.digest, jobId: submittal.job_id, aboutId: submittal_id };
    await record('left', words.slice(0, 400), about);
    return { number };
  });
}
