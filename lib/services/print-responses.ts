// server only
import { database } from '@/db/connection';
import { jobById } from '@/db/queries/jobs';
import { composeResponses } from '@/templates/compose-responses';
import { renderSheet } from '@/templates/paper/render-sheet';
import type { Actor } from './actor';
import { registerOfJob } from './register-of-job';
import { everyone, requireRole } from './require-role';
import { NotFound } from './service-error';

/** The itemised answers to all comments on a job, as PDF; the next package carries the same pages. */
export async function printResponses(actor: Actor, jobId: string): Promise<Uint8Array> {
  requireRole(actor, ...everyone);
  const job = await jobById(database(), actor.officeId, jobId);
  if (!job) throw new NotFound(`job ${jobId}`);
  const blocks = composeResponses(await registerOfJob(database(), actor, jobId));
  if (blocks.length === 0) throw new NotFound(`comments of job ${jobId}`);
  const { bytes } = await renderSheet({
    sheet: { number: 'answers', unnumbered: true, title: `Answers to comments, ${job.title}`, blocks },
    imprint: { office: actor.officeName, job: job.number, mode: 'final' },
    jobTitle: job.title,
    size: job.page_size,
    language: job.units === 'US' ? 'en-US' : 'en-GB',
    date: new Date(),
  });
  return bytes;
}
