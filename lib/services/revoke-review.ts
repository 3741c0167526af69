// server only
import { z } from 'zod';
import { revokeLinks } from '@/db/queries/reviews';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { done, type Result, unread } from './result';

const input = z.object({ submittalId: z.string().max(36) });

/** Closes every review link of a submittal. What was said through them stays. */
export async function revokeReview(actor: Actor, raw: unknown): Promise<Result<{ links: number }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const links = await inTransaction({ officeId: actor.officeId, person: actor.name }, async (trx, record) => {
    const n = await revokeLinks(trx, actor.officeId, parsed.data.submittalId, new Date());
    await record('revoked review links', `${n} of ${parsed.data.submittalId}`);
    return n;
  });
  return done({ links });
}
