// server only
import { z } from 'zod';
import { database } from '@/db/connection';
import { personByEmail } from '@/db/queries/people';
import { inTransaction } from './in-transaction';
import { allowAttempt, tooOften } from './limit-attempts';
import { done, mend, type Result, unread } from './result';
import { sendToken } from './send-token';

const input = z.object({
  email: z.string().trim().toLowerCase().min(3, 'Type your e-mail address.').max(190),
});

/** Mails a link for a new password. The answer is the same whether the address is known or not. */
export async function askPasswordReset(raw: unknown, from: string): Promise<Result<null>> {
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  if (!(await allowAttempt(`reset:${from}`, 10))) return mend('too-often', '', tooOften);
  const person = await personByEmail(database(), parsed.data.email);
  // The same person is not written to again and again by strangers.
  if (!person?.active || !(await allowAttempt(`reset-of:${person.id}`, 3))) return done(null);
  const who = { officeId: person.office_id, personId: person.id, name: person.name };
  await inTransaction(who, async (trx, record) => {
    await sendToken(trx, { ...who, email: person.email }, 'password', 2);
    await record('asked for a new password', person.name, { aboutId: person.id });
  });
  return done(null);
}
