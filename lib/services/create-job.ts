// server only
import { randomUUID } from 'node:crypto';
import { z } from 'zod';
import { database } from '@/db/connection';
import { authorityById, insertJob } from '@/db/queries/jobs';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { done, mend, type Result, unread } from './result';

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
  const authority = authorityId ? await authorityById(database(), actor.officeId, authorityId) : undefined;
  if (authorityId && !authority) return mend('authorityId', 'This authority is not known in the office.');
  const id = randomUUID();
  try {
    await inTransaction({ officeId: actor.officeId, person: actor.name }, async (trx, record) => {
      await insertJob(trx, {
        ...job,
        id,
        office_id: actor.officeId,
        page_size: pageSize,
        authority_id: authority?.id ?? null,
        changed_at: new Date(),
      });
      await record('opened job', job.number);
    });
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'ER_DUP_ENTRY')
      return mend('number', `There is a job ${job.number} already.`);
    throw error;
  }
  return done({ id });
}
