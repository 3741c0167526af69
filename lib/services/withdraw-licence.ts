// server only
import { z } from 'zod';
import { withdrawLicence as markWithdrawn } from '@/db/queries/people';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound } from './service-error';

const input = z.object({ licenceId: z.string().max(36) });

/** Takes a licence out of force. What was sealed with it stays sealed. */
export async function withdrawLicence(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'administrator');
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { licenceId } = parsed.data;
  return inTransaction(actor, async (trx, record) => {
    if ((await markWithdrawn(trx, actor.officeId, licenceId, new Date())) !== 1)
      throw new NotFound(`licence ${licenceId}`);
    await record('withdrew a licence', licenceId, { aboutId: licenceId });
    return null;
  });
}
