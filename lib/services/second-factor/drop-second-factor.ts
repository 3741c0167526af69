// server only
import { z } from 'zod';
import { removeSecondFactor } from '@/db/queries/second-factors';
import type { Actor } from '../actor';
import { inTransaction } from '../in-transaction';
import { allowAttempt, forgiveAttempts, tooOften } from '../limit-attempts';
import { everyone, requireRole } from '../require-role';
import { mend, type Result, unread } from '../result';
import { refuse } from '../service-error';
import { passCode, wrongCode } from './pass-code';

const input = z.object({ code: z.string().trim().min(1, 'Type a code.').max(60) });

/** Turns one's own second factor off; a code of the device or a recovery code says that it is oneself. */
export async function dropSecondFactor(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, ...everyone);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { officeId, personId } = actor;
  if (!(await allowAttempt(`second-factor:${personId}`, 8))) return mend('too-often', '', tooOften);
  const dropped = await inTransaction(actor, async (trx, record) => {
    if (!(await passCode(trx, officeId, personId, parsed.data.code, new Date())))
      refuse('wrong-code', 'code', wrongCode);
    await removeSecondFactor(trx, officeId, personId);
    await record('turned the second factor off', actor.name, { aboutId: personId });
    return null;
  });
  if (dropped.ok) await forgiveAttempts(`second-factor:${personId}`);
  return dropped;
}
