// server only
import { verify } from '@node-rs/argon2';
import { z } from 'zod';
import { database } from '@/db/connection';
import { personByEmail } from '@/db/queries/people';
import { inTransaction } from './in-transaction';
import { allowAttempt, forgiveAttempts, tooOften } from './limit-attempts';
import { mend, type Result, unread } from './result';
import { startSession } from './session';

const input = z.object({
  email: z.string().trim().toLowerCase().min(3, 'Type your e-mail address.').max(190),
  password: z.string().min(1, 'Type your password.').max(200),
});

/** A hash of nobody's password, so that an unknown address takes as long as a wrong password. */
const nobody =
  '$argon2id$v=19$m=19456,t=2,p=1$WviAjEgGEl4P8WwypbrP+A$W4gYzK1WqumbEcGQMdkJtwm2re2LBdYO05zXA/YYSfQ';

/** Signs a person in by e-mail and password (argon2id). Wrong address and wrong password are answered alike. */
export async function signIn(
  raw: unknown,
  from: string,
): Promise<Result<{ token: string; expiresAt: Date }>> {
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
  await inTransaction(who, (_, record) => record('signed in', person.name, { aboutId: person.id }));
  return { ok: true, value: await startSession(person.id, person.office_id) };
}
