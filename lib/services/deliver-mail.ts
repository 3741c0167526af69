// server only
import { database } from '@/db/connection';
import { claimMail, type MailRow, settleMail } from '@/db/queries/mails';
import { fileOf, submittalById } from '@/db/queries/submittals';
import { log } from '@/lib/log';
import { isRefusedForGood, sendMail } from '@/lib/mail/send-mail';

/** Minutes to wait after each failed try; then the refusal stands and its words are shown to the sender. */
const waits = [1, 5, 30, 120];
/** Longer than the longest that one try can take (see lib/mail/send-mail.ts). */
const abandonedAfter = 5 * 60_000;

/**
 * Sends one queued mail, if one is due. Answers whether there was one. A server that dies between the mail server's "ok"
 * and its own note of it leaves the mail to be sent again, under the same Message-ID, by which mailboxes know it.
 */
export async function deliverMail(): Promise<boolean> {
  const now = new Date();
  const mail = await claimMail(database(), now, new Date(now.getTime() - abandonedAfter));
  if (!mail) return false;
  const settle = (outcome: Parameters<typeof settleMail>[3]) =>
    settleMail(database(), mail.id, mail.attempts, outcome);
  try {
    const words = await sendMail({
      id: mail.id,
      to: mail.recipient,
      subject: mail.subject,
      text: mail.body,
      attachment: await attachmentOf(mail),
    });
    await settle({ state: 'accepted', words });
  } catch (error) {
    const words = error instanceof Error ? error.message : String(error);
    const wait = isRefusedForGood(error) ? undefined : waits[mail.attempts - 1];
    log.warn({ err: error, mail: mail.id, attempt: mail.attempts }, 'mail was not taken');
    if (wait === undefined) await settle({ state: 'refused', words });
    else await settle({ state: 'queued', words, nextTry: new Date(Date.now() + wait * 60_000) });
  }
  return true;
}

/** The sealed file that goes with a letter. */
async function attachmentOf(mail: MailRow) {
  if (!Number(mail.attached) || !mail.submittal_id) return undefined;
  const submittal = await submittalById(database(), mail.office_id, mail.submittal_id);
  const file = await fileOf(database(), mail.office_id, mail.submittal_id, 'sealed');
  if (!submittal || !file) throw new Error(`letter ${mail.id} has no sealed file to go with it`);
  return { filename: `submittal-${submittal.number}.pdf`, content: file.bytes };
}
