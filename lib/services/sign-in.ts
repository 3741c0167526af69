// server only
import { verify } from '@node-rs/argon2';
import { z } from 'zod';
import { database } from '@/db/connection';
import { personByEmail } from '@/db/queries/people';
import { secondFactorOf } from '@/db/queries/second-factors';
import { insertOneTimeToken } from '@/db/queries/tokens';
import { type Author, inTransaction } from './in-transaction';
import { allowAttempt, forgiveAttempts, tooOften } from './limit-attempts';
import { done, mend, type Result, unread } from './result';
import { startSession } from './session';
import { newToken, tokenHash } from './token';

const input = z.object({
  email: z.string().trim().toLowerCase().min(3, 'Type your e-mail address.').max(190),
  password: z.string().min(1, 'Type your password.').max(200),
});

/** A hash of nobody's password, so that an unknown address takes as long as a wrong password. */
const nobody =
  '$argon2id$v=19$m=19456,t=2,p=1$WviAjEgGEl4P8WwypbrP+A$W4gYzK1WqumbEcGQMdkJtwm2re2LBdYO05zXA/YYSfQ';

/**
 * Signs a person in by e-mail and password (argon2id). Wrong address and wrong password are answered alike. Whoever has a
 * second factor gets a token for the second step instead of a session.
 */
export async function signIn(
  raw: unknown,
  from: string,
): Promise<Result<{ step: 'in' | 'code'; token: string; expiresAt: Date }>> {
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { email, password } = parsed.data;
  if (!(await allowAttempt(`sign-in:${email}`, 8)) || !(await allowAttempt(`sign-in-from:${from}`, 60)))
    return mend('too-often', '', tooOften);
  const person = await personByEmail(database(), email);
  const right = await verify(person?.password_hash ?? nobody, password);
  if (!person?.active || !person.password_hash || !right)
    return mend(
      'sign-in',
      '',
      'E-mail and password do not go together. Check both, or ask for a new password.',
    );
  await forgiveAttempts(`sign-in:${email}`);
  const who = { officeId: person.office_id, personId: person.id, name: person.name };
  const factor = await secondFactorOf(database(), person.office_id, person.id);
  if (factor?.confirmed_at) return secondStep(who);
  await inTransaction(who, (_, record) => record('signed in', person.name, { aboutId: person.id }));
  return done({ step: 'in', ...(await startSession(person.id, person.office_id)) });
}

/** A token for the second step, good for five minutes. */
async function secondStep(
  who: Author & { personId: string },
): Promise<Result<{ step: 'code'; token: string; expiresAt: Date }>> {
  const token = newToken();
  const expiresAt = new Date(Date.now() + 5 * 60_000);
  return inTransaction(who, async (trx, record) => {
    await insertOneTimeToken(trx, {
      id: tokenHash(token),
      office_id: who.officeId,
      person_id: who.personId,
      purpose: 'second-step',
      expires_at: expiresAt,
    });
    await record('typed the right password', who.name, { aboutId: who.personId });
    return { step: 'code', token, expiresAt };
  });
}
