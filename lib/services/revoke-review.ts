// server only
import { z } from 'zod';
import { revokeLinks } from '@/db/queries/reviews';
import { submittalById } from '@/db/queries/submittals';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound } from './service-error';

const input = z.object({ submittalId: z.string().max(36), linkId: z.string().max(64).optional() });

/** Closes every review link of a submittal, or the one of one reviewer. What was said through them stays. */
export async function revokeReview(actor: Actor, raw: unknown): Promise<Result<{ links: number }>> {
  requireRole(actor, ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { submittalId, linkId } = parsed.data;
  return inTransaction(actor, async (trx, record) => {
    const submittal = await submittalById(trx, actor.officeId, submittalId);
    if (!submittal) throw new NotFound(`submittal ${submittalId}`);
    const links = await revokeLinks(trx, actor.officeId, submittalId, new Date(), linkId);
    const about = { jobId: submittal.job_id, aboutId: submittalId };
    await record('revoked review links', `${links} of submittal ${submittal.number}`, about);
    return { links };
  });
}
