// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { jobById } from '@/db/queries/jobs';
import { queueMail } from '@/db/queries/mails';
import { insertReviewLink } from '@/db/queries/reviews';
import { revisionsOfSubmittal } from '@/db/queries/revisions';
import {
  insertTransmittal,
  nextTransmittal,
  setSubmittalState,
  submittalById,
} from '@/db/queries/submittals';
import { env } from '@/lib/env';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { done, mend, type Result, unread } from './result';
import { NotFound } from './service-error';
import { sheetName } from './sheet-state';
import { newToken, tokenHash } from './token';

const input = z.object({
  submittalId: z.string().max(36),
  reviewer: z.string().trim().min(2, 'Who reviews it?').max(120),
  email: z.email('Type the e-mail address of the reviewer.').max(190),
  days: z.coerce.number().int().min(1).max(180),
});

/** Sends a sealed submittal with a numbered transmittal: the reviewer gets a link that needs no account. */
export async function sendSubmittal(actor: Actor, raw: unknown): Promise<Result<{ transmittal: number }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { submittalId, reviewer, email, days } = parsed.data;
  return inTransaction(
    { officeId: actor.officeId, person: actor.name },
    async (trx, record): Promise<Result<{ transmittal: number }>> => {
      const submittal = await submittalById(trx, actor.officeId, submittalId, true);
      const job = submittal && (await jobById(trx, actor.officeId, submittal.job_id));
      if (!submittal || !job) throw new NotFound(`submittal ${submittalId}`);
      const name = `${job.number} submittal ${submittal.number}`;
      if (submittal.state === 'drafted') {
        await record('could not send', name);
        return mend('', 'This submittal is not sealed. Only a sealed package is sent.');
      }
      const number = await nextTransmittal(trx, actor.officeId, job.id);
      const revisions = await revisionsOfSubmittal(trx, actor.officeId, submittalId);
      const contents = revisions
        .map((r) => `${sheetName(r.sheet_number)} ${r.title}, revision ${r.number}`)
        .join('\n');
      const token = newToken();
      const sentAt = new Date();
      const expires = new Date(sentAt.getTime() + days * 86_400_000);
      await insertTransmittal(trx, {
        id: randomUUID(),
        office_id: actor.officeId,
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
        office_id: actor.officeId,
        submittal_id: submittalId,
        reviewer,
        email,
        expires_at: expires,
        revoked_at: null,
        opened_at: null,
      });
      await queueMail(trx, {
        officeId: actor.officeId,
        submittalId,
        recipient: email,
        subject: `${job.number} ${job.title}: submittal ${submittal.number}, transmittal ${number}`,
        body: [
          `${reviewer},`,
          '',
          `${actor.officeName} sends you submittal ${submittal.number} of ${job.number} ${job.title}, ${submittal.purpose}, ${submittal.pages} pages:`,
          '',
          contents,
          ...(submittal.remarks === '' ? [] : ['', submittal.remarks]),
          '',
          'Read it, comment on its lines and record your decision here; no account is needed:',
          `${env().appUrl}/review/${token}`,
          '',
          `The link is good until ${expires.toISOString().slice(0, 10)}. What is said there is the record; this letter only points to it.`,
          '',
          `${actor.name}, ${actor.officeName}`,
        ].join('\n'),
      });
      if (submittal.state === 'sealed') await setSubmittalState(trx, actor.officeId, submittalId, 'sent');
      await record('sent', `${name}, transmittal ${number} to ${email}`);
      return done({ transmittal: number });
    },
  );
}
