// server only
import { z } from 'zod';
import { peopleOf } from '@/db/queries/people';
import { removeSecondFactor } from '@/db/queries/second-factors';
import type { Actor } from '../actor';
import { inTransaction } from '../in-transaction';
import { requireRole } from '../require-role';
import { type Result, unread } from '../result';
import { NotFound } from '../service-error';
import { endAllSessions } from '../session';

const input = z.object({ personId: z.string().max(36) });

/** For a person who lost the device and the recovery codes: the second factor is off, and every session ends. */
export async function clearSecondFactor(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'administrator');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { personId } = parsed.data;
  const cleared = await inTransaction(actor, async (trx, record) => {
    const person = (await peopleOf(trx, actor.officeId)).find((p) => p.id === personId);
    if (!person) throw new NotFound(`person ${personId}`);
    await removeSecondFactor(trx, actor.officeId, personId);
    await record('took off a second factor', person.name, { aboutId: personId });
    return null;
  });
  if (cleared.ok) await endAllSessions(personId);
  return cleared;
}
