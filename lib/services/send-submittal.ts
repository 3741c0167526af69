// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { jobById } from '@/db/queries/jobs';
import { queueMail } from '@/db/queries/mails';
import { commentsOfJob, insertReviewLink } from '@/db/queries/reviews';
import { revisionsOfSubmittal } from '@/db/queries/revisions';
import {
  insertTransmittal,
  nextTransmittal,
  setSubmittalState,
  submittalById,
} from '@/db/queries/submittals';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';
import { newToken, tokenHash } from './token';
import { writeTransmittal } from './write-transmittal';

const input = z.object({
  submittalId: z.string().max(36),
  reviewer: z.string().trim().min(2, 'Who reviews it?').max(120),
  email: z.email('Type the e-mail address of the reviewer.').max(190),
  days: z.coerce.number().int().min(1).max(180),
});

/**
 * Sends a sealed submittal with a numbered transmittal: the reviewer gets a link that needs no account. Refused while a
 * comment on an earlier submittal of the job waits for its answer.
 */
export async function sendSubmittal(actor: Actor, raw: unknown): Promise<Result<{ transmittal: number }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { submittalId, reviewer, email, days } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const submittal = await submittalById(trx, officeId, submittalId, true);
    const job = submittal && (await jobById(trx, officeId, submittal.job_id));
    if (!submittal || !job) throw new NotFound(`submittal ${submittalId}`);
    if (submittal.state === 'void')
      refuse('submittal-void', '', `This submittal is void: ${submittal.void_reason}. Gather a new one.`);
    if (submittal.state === 'drafted')
      refuse('not-sealed', '', 'This submittal is not sealed. Only a sealed package is sent.');
    const waiting = (await commentsOfJob(trx, officeId, job.id)).filter(
      (c) => c.submittal < submittal.number && (c.state === 'open' || c.state === 'reopened'),
    );
    const [first] = waiting;
    if (first) {
      const others = waiting.length === 1 ? '' : ` and ${waiting.length - 1} more`;
      const said = `Comment ${first.number} on submittal ${first.submittal}${others} is not answered yet. Answer first, then send.`;
      refuse('comments-open', '', said);
    }
    const number = await nextTransmittal(trx, officeId, job.id);
    const contents = (await revisionsOfSubmittal(trx, officeId, submittalId))
      .map((r) => `${sheetName(r.sheet_number)} ${r.title}, revision ${r.number}`)
      .join('\n');
    const token = newToken();
    const sentAt = new Date();
    const expires = new Date(sentAt.getTime() + days * 86_400_000);
    await insertTransmittal(trx, {
      id: randomUUID(),
      office_id: officeId,
      job_id: job.id,
      submittal_id: submittalId,
      number,
      recipient: email,
      contents,
      sent_by: actor.personId,
      sent_at: sentAt,
    });
    await insertReviewLink(trx, {
      id: tokenHash(token),
      office_id: officeId,
      submittal_id: submittalId,
      reviewer,
      email,
      expires_at: expires,
      revoked_at: null,
      opened_at: null,
    });
    const letter = writeTransmittal(actor, { job, submittal, number, contents, reviewer, token, expires });
    await queueMail(trx, { officeId, submittalId, recipient: email, ...letter });
    if (submittal.state === 'sealed') await setSubmittalState(trx, officeId, submittalId, 'sent');
    const words = `${job.number} submittal ${submittal.number}, transmittal ${number} to ${email}`;
    await record('sent', words, { jobId: job.id, aboutId: submittalId });
    return { transmittal: number };
  });
}
