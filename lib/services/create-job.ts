// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { isDuplicate } from '@/db/is-duplicate';
import { authorityById, insertJob } from '@/db/queries/jobs';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { refuse } from './service-error';

const input = z.object({
  number: z.string().trim().min(1, 'A job needs its number.').max(20),
  title: z.string().trim().min(1, 'A job needs a title.').max(120),
  place: z.string().trim().max(160),
  units: z.enum(['US', 'SI']),
  pageSize: z.enum(['Letter', 'A4']),
  jurisdiction: z.string().trim().min(1, 'Which jurisdiction governs? The seal depends on it.').max(80),
  authorityId: z.string().max(36).optional(),
  codes: z.string().trim().max(2000),
});

/** Opens a job. */
export async function createJob(actor: Actor, raw: unknown): Promise<Result<{ id: string }>> {
  requireRole(actor, 'administrator', ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { authorityId, pageSize, ...job } = parsed.data;
  return inTransaction(actor, async (trx, record) => {
    const authority = authorityId ? await authorityById(trx, actor.officeId, authorityId) : undefined;
    if (authorityId && !authority)
      refuse('unknown-authority', 'authorityId', 'This authority is not known in the office.');
    const id = randomUUID();
    await insertJob(trx, {
      ...job,
      id,
      office_id: actor.officeId,
      page_size: pageSize,
      authority_id: authority?.id ?? null,
      changed_at: new Date(),
    }).catch((error: unknown) => {
      if (isDuplicate(error)) refuse('number-taken', 'number', `There is a job ${job.number} already.`);
      throw error;
    });
    await record('opened job', `${job.number} ${job.title}`, { jobId: id });
    return { id };
  });
}
