// server only
import { hash } from '@node-rs/argon2';
import { z } from 'zod';
import { database } from '@/db/connection';
import { setPassword } from '@/db/queries/people';
import { takeOneTimeToken } from '@/db/queries/tokens';
import { inTransaction } from './in-transaction';
import { done, mend, type Result, unread } from './result';
import { endAllSessions } from './session';
import { tokenHash } from './token';

const input = z.object({
  token: z.string().min(10).max(100),
  password: z.string().min(12, 'A password has at least 12 characters.').max(200),
});

/** Sets a password by a link that works once. All sessions of the person end. */
export async function choosePassword(
  raw: unknown,
  purpose: 'invitation' | 'password',
): Promise<Result<null>> {
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const hashed = await hash(parsed.data.password);
  const found = await takeOneTimeToken(database(), tokenHash(parsed.data.token), purpose, new Date());
  if (!found) return mend('', 'This link was used already or its time is over. Ask for a new one.');
  await inTransaction({ officeId: found.office_id, person: found.name }, async (trx, record) => {
    await setPassword(trx, found.office_id, found.person_id, hashed);
    await record(
      purpose === 'invitation' ? 'accepted the invitation' : 'chose a new password',
      found.person_id,
    );
  });
  await endAllSessions(found.person_id);
  return done(null);
}
