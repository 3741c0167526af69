// server only
import { z } from 'zod';
import { putSecondFactor, secondFactorOf } from '@/db/queries/second-factors';
import type { Actor } from '../actor';
import { inTransaction } from '../in-transaction';
import { allowAttempt, forgiveAttempts, tooOften } from '../limit-attempts';
import { everyone, requireRole } from '../require-role';
import { done, mend, type Result, unread } from '../result';
import { refuse } from '../service-error';
import { endOtherSessions } from '../session';
import { passCode, wrongCode } from './pass-code';

const input = z.object({
  code: z
    .string()
    .trim()
    .regex(/^\d{3}\s?\d{3}$/, 'Type the six figures of the code.'),
});

/**
 * Turns the second factor on by a first code of the device. Every other session of the person ends, since only the one of
 * `token` gave a code.
 */
export async function confirmSecondFactor(actor: Actor, raw: unknown, token: string): Promise<Result<null>> {
  requireRole(actor, ...everyone);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { officeId, personId } = actor;
  if (!(await allowAttempt(`second-factor:${personId}`, 8))) return mend('too-often', '', tooOften);
  const confirmed = await inTransaction(actor, async (trx, record) => {
    const now = new Date();
    if ((await passCode(trx, officeId, personId, parsed.data.code, now)) !== 'device')
      refuse('wrong-code', 'code', wrongCode);
    const factor = await secondFactorOf(trx, officeId, personId, true);
    if (!factor || factor.confirmed_at) refuse('second-factor-on', '', 'Your second factor is on already.');
    await putSecondFactor(trx, { ...factor, confirmed_at: now });
    await record('turned the second factor on', actor.name, { aboutId: personId });
  });
  if (!confirmed.ok) return confirmed;
  await forgiveAttempts(`second-factor:${personId}`);
  await endOtherSessions(personId, token);
  return done(null);
}
