import { randomUUID } from 'node:crypto';
import { hash } from '@node-rs/argon2';
import type { Knex } from 'knex';
import { fillAnsweredJob } from '../../lib/services/demo/fill-answered-job';
import { fillDemoJob } from '../../lib/services/demo/fill-demo-job';
import { actorById } from '../../lib/services/read-actor';
import { demoEngineer } from '../../lib/signing/demo-keys';
import { insertAuthority, insertJob, type JobRow, setJobPeople } from '../queries/jobs';
import { anyOffice, insertOffice } from '../queries/offices';
import { insertLicence, insertPerson } from '../queries/people';

const password = 'plumb-line-and-level';

const people = [
  { key: 'administrator', name: 'Ines Arrow', initials: 'IA', roles: ['administrator'] },
  {
    key: 'engineer-of-record',
    name: demoEngineer.name,
    initials: 'TL',
    roles: ['engineer', 'engineer-of-record'],
  },
  { key: 'engineer', name: 'Mira Oduya', initials: 'MO', roles: ['engineer'] },
  { key: 'checker', name: 'Jonas Weir', initials: 'JW', roles: ['checker'] },
] as const;

/** The invented demo office, once, in an empty database. */
export async function seed(knex: Knex): Promise<void> {
  if (await anyOffice(knex)) return;
  const office = randomUUID();
  await insertOffice(knex, { id: office, name: 'Lindqvist & Arrow', zone: 'America/Chicago' });
  const passwordHash = await hash(password);
  const ids = new Map<string, string>();
  for (const p of people) {
    const id = randomUUID();
    ids.set(p.key, id);
    const email = `${p.name.toLowerCase().replace(' ', '.')}@lindqvist-arrow.example`;
    await insertPerson(knex, office, {
      id,
      email,
      name: p.name,
      initials: p.initials,
      roles: [...p.roles],
      passwordHash,
    });
  }
  const id = (key: (typeof people)[number]['key']) => ids.get(key) as string;
  await insertLicence(knex, {
    id: randomUUID(),
    office_id: office,
    person_id: id('engineer-of-record'),
    jurisdiction: 'Orrin',
    profession: 'Structural Engineer',
    number: demoEngineer.licenceNumber,
    expires: new Date('2028-06-30'),
  });
  const authority = randomUUID();
  await insertAuthority(knex, {
    id: authority,
    office_id: office,
    name: 'City of Orrin Building Division',
    decisions: ['Approved', 'Approved as Noted', 'Revise and Resubmit'],
    reviewer: 'Dana Pell',
    email: 'dana.pell@orrin.example',
  });
  const addJob = async (job: Pick<JobRow, 'number' | 'title' | 'place' | 'units' | 'page_size'>) => {
    const jobId = randomUUID();
    await insertJob(knex, {
      ...job,
      id: jobId,
      office_id: office,
      jurisdiction: 'Orrin',
      authority_id: authority,
      codes: 'ASCE/SEI 7-16\nLocal code of the City of Orrin (invented)',
      changed_at: new Date(),
    });
    for (const part of ['engineer-of-record', 'checker'] as const)
      await setJobPeople(knex, office, jobId, part, [id(part)]);
    await setJobPeople(knex, office, jobId, 'originator', [id('engineer')]);
    return jobId;
  };
  const actor = async (key: (typeof people)[number]['key']) => {
    const found = await actorById(id(key));
    if (!found) throw new Error(`the demo has no ${key}`);
    return found;
  };
  const demo = {
    engineer: await actor('engineer'),
    checker: await actor('checker'),
    engineerOfRecord: await actor('engineer-of-record'),
  };
  const library = { number: '26-009', title: 'Corn Row Library', place: '18 Corn Row, Orrin' };
  await fillAnsweredJob(await addJob({ ...library, units: 'SI', page_size: 'A4' }), demo);
  const boathouse = { number: '26-014', title: 'Mill Race Boathouse', place: '4 Weir Lane, Orrin' };
  await fillDemoJob(await addJob({ ...boathouse, units: 'US', page_size: 'Letter' }), demo);
}
