// server only
import { z } from 'zod';
import { database } from '@/db/connection';
import { oneTimeToken, takeOneTimeToken } from '@/db/queries/tokens';
import { inTransaction } from '../in-transaction';
import { allowAttempt, forgiveAttempts, tooOften } from '../limit-attempts';
import { done, mend, type Result, unread } from '../result';
import { refuse } from '../service-error';
import { startSession } from '../session';
import { tokenHash } from '../token';
import { passCode, wrongCode } from './pass-code';

const input = z.object({
  token: z.string().max(100),
  code: z.string().trim().min(1, 'Type the code.').max(60),
});

const over = 'More than five minutes went by. Sign in again.';

/** The second step of signing in: a code of the device or a recovery code, within five minutes of the password. */
export async function answerSecondStep(
  raw: unknown,
  from: string,
): Promise<Result<{ token: string; expiresAt: Date }>> {
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const id = tokenHash(parsed.data.token);
  const known = await oneTimeToken(database(), id, 'second-step');
  if (!(await allowAttempt(`second-step-from:${from}`, 60))) return mend('too-often', '', tooOften);
  if (!known) return mend('step-over', '', over);
  const { office_id: officeId, person_id: personId, name } = known;
  if (!(await allowAttempt(`second-factor:${personId}`, 8))) return mend('too-often', '', tooOften);
  const passed = await inTransaction({ officeId, personId, name }, async (trx, record) => {
    const now = new Date();
    const by = await passCode(trx, officeId, personId, parsed.data.code, now);
    if (!by) refuse('wrong-code', 'code', wrongCode);
    if (!(await takeOneTimeToken(trx, officeId, id, personId, now))) refuse('step-over', '', over);
    const words = by === 'recovery' ? `${name}, with a recovery code` : name;
    await record('signed in', words, { aboutId: personId });
  });
  if (!passed.ok) return passed;
  await forgiveAttempts(`second-factor:${personId}`);
  return done(await startSession(personId, officeId));
}
