// server only
import { z } from 'zod';
import { changeOffice as writeOffice } from '@/db/queries/offices';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { type Result, unread } from './result';

const days = 'Type a number of days, 1 to 365.';
const input = z.object({
  lateAfter: z.coerce.number<string | number>(days).int(days).min(1, days).max(365, days),
  sealNeedsSecond: z.boolean().default(false),
});

/** Changes what the office settles for all its people. */
export async function changeOffice(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'administrator');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { lateAfter, sealNeedsSecond } = parsed.data;
  return inTransaction(actor, async (trx, record) => {
    await writeOffice(trx, actor.officeId, { late_after: lateAfter, seal_needs_second: sealNeedsSecond });
    const words = `late after ${lateAfter} days, sealing ${sealNeedsSecond ? 'needs' : 'does not need'} a second factor`;
    await record('changed the office', words, { aboutId: actor.officeId });
    return null;
  });
}
