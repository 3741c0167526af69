// server only
import { database } from '@/db/connection';
import { jobById } from '@/db/queries/jobs';
import type { Actor } from './actor';
import { registerOfJob } from './register-of-job';
import { everyone, requireRole } from './require-role';
import { NotFound } from './service-error';

/** The comment register of a job over all its submittals. */
export async function openComments(actor: Actor, jobId: string) {
  requireRole(actor, ...everyone);
  const job = await jobById(database(), actor.officeId, jobId);
  if (!job) throw new NotFound(`job ${jobId}`);
  return {
    job: { id: job.id, number: job.number, title: job.title },
    comments: await registerOfJob(database(), actor, jobId),
  };
}
