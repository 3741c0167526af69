// server only
import { randomUUID } from 'node:crypto';
import type { Knex } from 'knex';

export interface MailRow {
  id: string;
  office_id: string;
  submittal_id: string | null;
  recipient: string;
  subject: string;
  body: string;
  state: 'queued' | 'sending' | 'accepted' | 'refused';
  attempts: number;
  server_words: string;
  next_try: Date;
  claimed_at: Date | null;
  /** Whether the sealed file of its submittal goes with it. */
  attached: number;
  /** The review link it carries. */
  link_id: string | null;
}

export async function queueMail(
  trx: Knex,
  m: {
    officeId: string;
    submittalId?: string;
    recipient: string;
    subject: string;
    body: string;
    attached?: boolean;
    linkId?: string;
  },
): Promise<void> {
  await trx('mails').insert({
    id: randomUUID(),
    office_id: m.officeId,
    submittal_id: m.submittalId ?? null,
    recipient: m.recipient,
    subject: m.subject,
    body: m.body,
    state: 'queued',
    next_try: new Date(),
    attached: m.attached ?? false,
    link_id: m.linkId ?? null,
  });
}

/** Claims one mail that is due, or one whose sender vanished; of several servers each gets its own. */
export async function claimMail(db: Knex, now: Date, abandoned: Date): Promise<MailRow | undefined> {
  return db.transaction(async (trx) => {
    const row: MailRow | undefined = await trx('mails')
      .where((q) => q.where({ state: 'queued' }).where('next_try', '<=', now))
      .orWhere((q) => q.where({ state: 'sending' }).where('claimed_at', '<', abandoned))
      .orderBy('next_try')
      .forUpdate()
      .skipLocked()
      .first();
    if (!row) return undefined;
    await trx('mails')
      .where({ id: row.id })
      .update({ state: 'sending', claimed_at: now, attempts: row.attempts + 1 });
    return { ...row, attempts: row.attempts + 1 };
  });
}

/**
 * Writes down what became of a claimed mail. A sender that was so slow that another took the mail over changes nothing:
 * `attempt` is the number of the try that it claimed.
 */
export async function settleMail(
  db: Knex,
  id: string,
  attempt: number,
  outcome: { state: 'accepted' | 'refused' | 'queued'; words: string; nextTry?: Date },
): Promise<boolean> {
  const settled = await db('mails')
    .where({ id, attempts: attempt, state: 'sending' })
    .update({
      state: outcome.state,
      server_words: outcome.words.slice(0, 500),
      ...(outcome.nextTry ? { next_try: outcome.nextTry } : {}),
    });
  return settled === 1;
}

export async function mailsOfSubmittal(db: Knex, officeId: string, submittalId: string): Promise<MailRow[]> {
  return db('mails').where({ office_id: officeId, submittal_id: submittalId }).orderBy('next_try');
}

export async function mailById(db: Knex, officeId: string, id: string): Promise<MailRow | undefined> {
  return db('mails').where({ office_id: officeId, id }).first();
}

/** Queues a letter again that was refused, with all its tries before it. Answers whether it was refused. */
export async function requeueMail(trx: Knex, officeId: string, id: string, at: Date): Promise<boolean> {
  const queued = await trx('mails')
    .where({ office_id: officeId, id, state: 'refused' })
    .update({ state: 'queued', attempts: 0, next_try: at });
  return queued === 1;
}
