import { randomUUID } from 'node:crypto';
import { hash } from '@node-rs/argon2';
import type { Knex } from 'knex';
import { fillDemoJob } from '../../lib/services/demo/fill-demo-job';
import { demoEngineer } from '../../lib/signing/demo-keys';
import { insertAuthority, insertJob, setJobPeople } from '../queries/jobs';
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
  const job = randomUUID();
  await insertJob(knex, {
    id: job,
    office_id: office,
    number: '26-014',
    title: 'Mill Race Boathouse',
    place: '4 Weir Lane, Orrin',
    jurisdiction: 'Orrin',
    authority_id: authority,
    units: 'US',
    page_size: 'Letter',
    codes: 'ASCE/SEI 7-16\nLocal code of the City of Orrin (invented)',
    changed_at: new Date(),
  });
  for (const part of ['engineer-of-record', 'checker'] as const)
    await setJobPeople(knex, office, job, part, [id(part)]);
  await setJobPeople(knex, office, job, 'originator', [id('engineer')]);
  await fillDemoJob(office, job, { engineer: id('engineer'), checker: id('checker') });
}
