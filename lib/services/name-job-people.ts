// server only
import { z } from 'zod';
import { type JobPart, jobById, jobParts, setJobPeople } from '@/db/queries/jobs';
import { peopleOf } from '@/db/queries/people';
import type { Actor, Role } from './actor';
import { inTransaction } from './in-transaction';
import { makers, requireRole } from './require-role';
import { type Result, unread } from './result';
import { NotFound, refuse } from './service-error';

const input = z.object({
  jobId: z.string().max(36),
  part: z.enum(jobParts),
  personIds: z.array(z.string().max(36)).max(50),
});

const roleFor: { [P in JobPart]: Role } = {
  'engineer-of-record': 'engineer-of-record',
  originator: 'engineer',
  checker: 'checker',
};

/** Says who has a part in a job. A job has at most one engineer of record here, who is named on the cover and seals. */
export async function nameJobPeople(actor: Actor, raw: unknown): Promise<Result<null>> {
  requireRole(actor, 'administrator', ...makers);
  const parsed = input.safeParse(raw);
  if (!parsed.success) return unread(parsed.error);
  const { jobId, part } = parsed.data;
  const personIds = [...new Set(parsed.data.personIds)];
  return inTransaction(actor, async (trx, record) => {
    const job = await jobById(trx, actor.officeId, jobId);
    if (!job) throw new NotFound(`job ${jobId}`);
    if (part === 'engineer-of-record' && personIds.length > 1)
      refuse('one-engineer-of-record', 'personIds', 'A job has one engineer of record.');
    const people = await peopleOf(trx, actor.officeId);
    const named = personIds.map((id) => {
      const person = people.find((p) => p.id === id);
      if (!person) throw new NotFound(`person ${id}`);
      if (!person.roles.includes(roleFor[part]))
        refuse('lacks-role', 'personIds', `${person.name} does not have this role in the office.`);
      return person.name;
    });
    await setJobPeople(trx, actor.officeId, jobId, part, personIds);
    const words = `${job.number}, ${part}: ${named.join(', ') || 'nobody'}`;
    await record('named people of a job', words.slice(0, 400), { jobId });
    return null;
  });
}
