// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { authorityById, jobById } from '@/db/queries/jobs';
import { queueMail } from '@/db/queries/mails';
import { insertReviewLink } from '@/db/queries/reviews';
import { type RevisionLine, revisionsOfSubmittal } from '@/db/queries/revisions';
import {
  fileOf,
  insertTransmittal,
  nextTransmittal,
  setSubmittalState,
  submittalById,
} from '@/db/queries/submittals';
import type { Actor } from './actor';
import { blockingComments, sayBlocking } from './blocking-comments';
import { type Changes, changesSince, sayChange } from './changes-since';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';
import { newToken, tokenHash } from './token';
import { writeTransmittal } from './write-transmittal';

const howLong = 'Type a number of days, 1 to 180.';
const usualAction = 'Review and record your decision.';

const input = z.object({
  submittalId: z.string().max(36),
  reviewer: z.string().trim().min(2, 'Who reviews it?').max(120),
  email: z.email('Type the e-mail address of the reviewer.').max(190),
  days: z.coerce.number<string | number>(howLong).int(howLong).min(1, howLong).max(180, howLong),
  action: z.string().trim().min(3, 'Say what you ask the reviewer to do.').max(200).default(usualAction),
  seenTo: z.array(z.string().max(200)).max(40).default([]),
});

/** Larger files go by link alone: mail servers commonly take 10 MB or a little more, and mail adds a third (from memory). */
const mostAttached = 7 * 1024 * 1024;

/**
 * Sends a sealed submittal with a numbered transmittal: the reviewer gets a link that needs no account, and the file with
 * it when the authority wishes so and it is small enough. Refused while a comment on an earlier submittal of the job waits
 * for its answer, or a line of the authority's list is not ticked off.
 */
export async function sendSubmittal(actor: Actor, raw: unknown): Promise<Result<{ transmittal: number }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { submittalId, reviewer, email, days, action, seenTo } = parsed.data;
  const { officeId } = actor;
  return inTransaction(actor, async (trx, record) => {
    const submittal = await submittalById(trx, officeId, submittalId, true);
    const job = submittal && (await jobById(trx, officeId, submittal.job_id));
    if (!submittal || !job) throw new NotFound(`submittal ${submittalId}`);
    if (submittal.state === 'void')
      refuse('submittal-void', '', `This submittal is void: ${submittal.void_reason}. Gather a new one.`);
    if (submittal.state === 'drafted')
      refuse('not-sealed', '', 'This submittal is not sealed. Only a sealed package is sent.');
    const blocked = sayBlocking(await blockingComments(trx, submittal));
    if (blocked) refuse('comments-open', '', blocked);
    const authority = job.authority_id ? await authorityById(trx, officeId, job.authority_id) : undefined;
    const checklist = authority?.checklist ?? [];
    const missing = checklist.find((line) => !seenTo.includes(line));
    if (missing !== undefined)
      refuse('not-seen-to', 'seenTo', `The authority wants this seen to first: ${missing}`);
    const file = await fileOf(trx, officeId, submittalId, 'sealed');
    if (!file) throw new Error(`submittal ${submittalId} has no sealed file`);
    const attached = authority?.wish === 'attachment' && file.bytes.length <= mostAttached;
    const number = await nextTransmittal(trx, officeId, job.id);
    const revisions = await revisionsOfSubmittal(trx, officeId, submittalId);
    const contents = listContents(revisions, await changesSince(trx, submittal, revisions));
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
      action,
      seen_to: checklist,
      attached,
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
    const letter = writeTransmittal(actor, {
      job,
      submittal,
      number,
      contents,
      action,
      attached,
      tooLarge: authority?.wish === 'attachment' && !attached,
      reviewer,
      token,
      expires,
    });
    const linkId = tokenHash(token);
    await queueMail(trx, { officeId, submittalId, recipient: email, attached, linkId, ...letter });
    if (submittal.state === 'sealed') await setSubmittalState(trx, officeId, submittalId, 'sent');
    const words = `${job.number} submittal ${submittal.number}, transmittal ${number} to ${email}`;
    await record('sent', words, { jobId: job.id, aboutId: submittalId });
    return { transmittal: number };
  });
}

/** One sheet a line, changed ones flagged, and what an earlier submittal held that this one does not. */
function listContents(revisions: readonly RevisionLine[], changes: Changes): string {
  const name = (r: RevisionLine) => `${sheetName(r.sheet_number)} ${r.title}, revision ${r.number}`;
  const flagged = (r: RevisionLine) => {
    const change = sayChange(changes, r.id);
    return change === '' ? name(r) : `${name(r)} (${change})`;
  };
  return [
    ...revisions.map(flagged),
    ...changes.leftOut.map((r) => `left out since submittal ${changes.since}: ${name(r)}`),
  ].join('\n');
}
