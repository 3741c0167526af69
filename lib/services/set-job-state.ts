// server only
import { z } from 'zod';
import { jobById, setJobState as writeState } from '@/db/queries/jobs';
import type { Actor } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound } from './service-error';

const input = z.object({ jobId: z.string().max(36), state: z.enum(['open', 'closed']) });

/** Closes a job, or opens it again. A closed job can be read; nothing new is made in it. */
export async function setJobState(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'administrator', ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { jobId, state } = parsed.data;
  return inTransaction(actor, async (trx, record) => {
    const job = await jobById(trx, actor.officeId, jobId);
    if (!job) throw new NotFound(`job ${jobId}`);
    await writeState(trx, actor.officeId, jobId, state);
    await record(state === 'closed' ? 'closed job' : 'opened job again', job.number, { jobId });
    return null;
  });
}
