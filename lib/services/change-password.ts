// server only
import { hash, verify } from '@node-rs/argon2';
import { z } from 'zod';
import { database } from '@/db/connection';
import { personByEmail, setPassword } from '@/db/queries/people';
import type { Actor } from './actor';
import { newPassword } from './choose-password';
import { inTransaction } from './in-transaction';
import { allowAttempt, forgiveAttempts, tooOften } from './limit-attempts';
import { everyone, requireRole } from './require-role';
import { done, mend, type Result, unread } from './result';
import { endAllSessions } from './session';

const input = z.object({
  current: z.string().min(1, 'Type the password you have now.').max(200),
  password: newPassword,
});

/** Changes one's own password. Every session of the person ends, this one too. */
export async function changePassword(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, ...everyone);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { officeId, personId, email, name } = actor;
  if (!(await allowAttempt(`password:${personId}`, 8))) return mend('too-often', '', tooOften);
  const person = await personByEmail(database(), email);
  if (!person?.password_hash || !(await verify(person.password_hash, parsed.data.current)))
    return mend('password', 'current', 'That is not the password you have now.');
  await forgiveAttempts(`password:${personId}`);
  const hashed = await hash(parsed.data.password);
  const changed = await inTransaction(actor, async (trx, record) => {
    await setPassword(trx, officeId, personId, hashed);
    await record('changed the password', name, { aboutId: personId });
  });
  if (!changed.ok) return changed;
  await endAllSessions(personId);
  return done(null);
}
