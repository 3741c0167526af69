// server only
import { z } from 'zod';
import { mailById, requeueMail } from '@/db/queries/mails';
import { reviewLink } from '@/db/queries/reviews';
import { submittalById } from '@/db/queries/submittals';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound, refuse } from './service-error';

const input = z.object({ mailId: z.string().max(36) });

/** Puts a letter that was refused into the queue again, as it was; its link must still be good. */
export async function resendLetter(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { mailId } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const mail = await mailById(trx, officeId, mailId);
    const submittal = mail?.submittal_id && (await submittalById(trx, officeId, mail.submittal_id));
    if (!mail || !submittal) throw new NotFound(`letter ${mailId}`);
    const link = mail.link_id ? await reviewLink(trx, mail.link_id) : undefined;
    if (link && (link.revoked_at || link.expires_at < new Date()))
      refuse('link-over', '', 'The link in this letter is no longer good. Send the submittal again instead.');
    if (!(await requeueMail(trx, officeId, mailId, new Date())))
      refuse('not-refused', '', 'This letter is on its way already.');
    const about = { jobId: submittal.job_id, aboutId: submittal.id };
    await record('sent a letter again', `${mail.subject} to ${mail.recipient}`.slice(0, 400), about);
    return null;
  });
}
