// server only
import { z } from 'zod';
import { revokeApiToken as markRevoked } from '@/db/queries/api-tokens';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound } from './service-error';

const input = z.object({ id: z.string().length(64) });

/** Takes one of one's own tokens out of force. */
export async function revokeApiToken(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { id } = parsed.data;
  return inTransaction(actor, async (trx, record) => {
    if ((await markRevoked(trx, actor.officeId, actor.personId, id, new Date())) !== 1)
      throw new NotFound('token');
    await record('revoked a token', id.slice(0, 8), { aboutId: id });
    return null;
  });
}
