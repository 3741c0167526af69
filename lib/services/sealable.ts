// server only
import type { Knex } from 'knex';
import { uncheckedOf } from '@/db/queries/checks';
import { type JobRow, jobById } from '@/db/queries/jobs';
import { officeById } from '@/db/queries/offices';
import { type LicenceRow, licencesOf } from '@/db/queries/people';
import { revisionsOfSubmittal } from '@/db/queries/revisions';
import { secondFactorOf } from '@/db/queries/second-factors';
import { type SubmittalRow, submittalById } from '@/db/queries/submittals';
import type { Actor } from './actor';
import { licenceInForce } from './licence-in-force';
import { NotAllowed, NotFound, refuse } from './service-error';
import { sheetName } from './sheet-state';

/**
 * The submittal, its job and the licence it is sealed with, under a lock: only while it is drafted, its sheets are still
 * checked, the actor is its engineer of record, and the licence is in force for the job's jurisdiction.
 */
export async function sealable(
  trx: Knex.Transaction,
  actor: Actor,
  submittalId: string,
  now: Date,
): Promise<{ submittal: SubmittalRow; job: JobRow; licence: LicenceRow }> {
  const { officeId } = actor;
  const submittal = await submittalById(trx, officeId, submittalId, true);
  const job = submittal && (await jobById(trx, officeId, submittal.job_id));
  if (!submittal || !job) throw new NotFound(`submittal ${submittalId}`);
  if (submittal.state === 'void')
    refuse('submittal-void', '', `This submittal is void: ${submittal.void_reason}. Gather a new one.`);
  if (submittal.state !== 'drafted')
    refuse('sealed-already', '', 'This submittal is sealed already. A sealed file is never written again.');
  if (submittal.engineer_id !== actor.personId)
    throw new NotAllowed('only the engineer of record named on the cover seals');
  const office = await officeById(trx, officeId);
  const factor = await secondFactorOf(trx, officeId, actor.personId);
  if (Number(office?.seal_needs_second) === 1 && !factor?.confirmed_at)
    refuse(
      'second-factor-needed',
      '',
      'The office asks for a second factor before sealing. Turn it on in your account; nothing is sealed.',
    );
  const revisions = await revisionsOfSubmittal(trx, officeId, submittalId);
  const unchecked = await uncheckedOf(
    trx,
    officeId,
    revisions.map((r) => r.id),
  );
  const stale = revisions.find((r) => unchecked.includes(r.id));
  if (stale)
    refuse(
      'not-checked',
      '',
      `${sheetName(stale.sheet_number)} revision ${stale.number} is no longer checked. Nothing is sealed.`,
    );
  return { submittal, job, licence: await licenceFor(trx, actor, job, now) };
}

async function licenceFor(trx: Knex.Transaction, actor: Actor, job: JobRow, now: Date): Promise<LicenceRow> {
  const { jurisdiction } = job;
  const own = (await licencesOf(trx, actor.officeId)).filter(
    (l) => l.person_id === actor.personId && l.jurisdiction === jurisdiction,
  );
  const [latest] = own.toSorted((a, b) => b.expires.getTime() - a.expires.getTime());
  if (!latest)
    refuse('no-licence', '', `You have no licence for ${jurisdiction} in the register of the office.`);
  if (!licenceInForce(latest, now, actor.zone)) {
    const day = latest.expires.toISOString().slice(0, 10);
    refuse(
      'licence-expired',
      '',
      `Your licence ${latest.number} for ${jurisdiction} expired on ${day}. Nothing is sealed.`,
    );
  }
  return latest;
}
