// server only
import { createTransport } from 'nodemailer';
import { database } from '@/db/connection';
import { claimMail, settleMail } from '@/db/queries/mails';
import { env } from '@/lib/env';
import { log } from '@/lib/log';

/** Minutes to wait after each failed try; then the refusal stands and its words are shown to the sender. */
const waits = [1, 5, 30, 120];
const abandonedAfter = 5 * 60_000;

/** Sends one queued mail, if one is due. Answers whether there was one. */
export async function deliverMail(): Promise<boolean> {
  const now = new Date();
  const mail = await claimMail(database(), now, new Date(now.getTime() - abandonedAfter));
  if (!mail) return false;
  const transport = createTransport(env().smtpUrl);
  try {
    const sent = await transport.sendMail({
      messageId: `<${mail.id}@fairhand>`,
      from: env().mailFrom,
      to: mail.recipient,
      subject: mail.subject,
      text: mail.body,
    });
    await settleMail(database(), mail.id, { state: 'accepted', words: sent.response });
  } catch (error) {
    const words = error instanceof Error ? error.message : String(error);
    const wait = waits[mail.attempts - 1];
    log.warn({ err: error, mail: mail.id, attempt: mail.attempts }, 'mail was not taken');
    if (wait === undefined) await settleMail(database(), mail.id, { state: 'refused', words });
    else
      await settleMail(database(), mail.id, {
        state: 'queued',
        words,
        nextTry: new Date(Date.now() + wait * 60_000),
      });
  } finally {
    transport.close();
  }
  return true;
}
