// server only
import { hash } from '@node-rs/argon2';
import { z } from 'zod';
import { database } from '@/db/connection';
import { setPassword } from '@/db/queries/people';
import { oneTimeToken, takeOneTimeToken } from '@/db/queries/tokens';
import { inTransaction } from './in-transaction';
import { done, mend, type Result, unread } from './result';
import { refuse } from './service-error';
import { endAllSessions } from './session';
import { tokenHash } from './token';

export const newPassword = z.string().min(12, 'A password has at least 12 characters.').max(200);

const input = z.object({ token: z.string().min(10).max(100), password: newPassword });

const over = 'This link was used already or its time is over. Ask for a new one.';

/** Sets a password by a link that works once. All sessions of the person end. */
export async function choosePassword(
  raw: unknown,
  purpose: 'invitation' | 'password',
): Promise<Result<null>> {
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const id = tokenHash(parsed.data.token);
  const found = await oneTimeToken(database(), id, purpose);
  if (!found) return mend('link-over', '', over);
  const { office_id: officeId, person_id: personId, name } = found;
  const hashed = await hash(parsed.data.password);
  const chosen = await inTransaction({ officeId, personId, name }, async (trx, record) => {
    if (!(await takeOneTimeToken(trx, officeId, id, personId, new Date()))) refuse('link-over', '', over);
    await setPassword(trx, officeId, personId, hashed);
    const verb = purpose === 'invitation' ? 'accepted the invitation' : 'chose a new password';
    await record(verb, name, { aboutId: personId });
  });
  if (!chosen.ok) return chosen;
  await endAllSessions(personId);
  return done(null);
}
