// server only
import type { Knex } from 'knex';
import { type JobRow, jobById } from '@/db/queries/jobs';
import { NotFound, refuse } from './service-error';

/** The job that something new is to be made in; a closed one is refused. */
export async function jobOpenToWork(
  trx: Knex.Transaction,
  officeId: string,
  jobId: string,
): Promise<JobRow & { authority: string | null }> {
  const job = await jobById(trx, officeId, jobId);
  if (!job) throw new NotFound(`job ${jobId}`);
  if (job.state === 'closed')
    refuse('job-closed', '', `Job ${job.number} is closed. Open it again to go on with it.`);
  return job;
}
