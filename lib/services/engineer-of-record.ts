// server only
import type { Knex } from 'knex';
import { type JobRow, jobPeople } from '@/db/queries/jobs';
import { licencesOf, type PersonRow } from '@/db/queries/people';
import type { Actor } from './actor';
import { licenceInForce } from './licence-in-force';
import { refuse } from './service-error';

/**
 * Who is named on the cover and seals: whom the job names; otherwise the only engineer of record of the office with a
 * licence in force for the job's jurisdiction.
 */
export async function engineerOfRecord(
  trx: Knex.Transaction,
  actor: Actor,
  job: JobRow,
  people: readonly PersonRow[],
  at: Date,
): Promise<PersonRow> {
  const named = (await jobPeople(trx, actor.officeId, job.id)).find((p) => p.part === 'engineer-of-record');
  const fit = people.filter((p) => Number(p.active) === 1 && p.roles.includes('engineer-of-record'));
  if (named) {
    const person = fit.find((p) => p.id === named.person_id);
    return (
      person ?? refuse('engineer-left', '', `${named.name} no longer seals for this office. Name another.`)
    );
  }
  const licences = await licencesOf(trx, actor.officeId);
  const licensed = fit.filter((p) =>
    licences.some(
      (l) => l.person_id === p.id && l.jurisdiction === job.jurisdiction && licenceInForce(l, at, actor.zone),
    ),
  );
  const [only, another] = licensed;
  if (!only)
    refuse(
      'no-engineer-of-record',
      '',
      `Nobody in the office has a licence in force for ${job.jurisdiction} who could seal it.`,
    );
  if (another)
    refuse(
      'several-engineers-of-record',
      '',
      `${licensed.map((p) => p.name).join(' and ')} could seal it. Name the engineer of record of the job.`,
    );
  return only;
}
