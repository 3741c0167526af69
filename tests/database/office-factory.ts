import { randomUUID } from 'node:crypto';
import { hash } from '@node-rs/argon2';
import { database } from '@/db/connection';
import { insertAuthority } from '@/db/queries/jobs';
import { insertLicence, insertPerson } from '@/db/queries/people';
import type { Actor, Role } from '@/lib/services/actor';
import { createJob } from '@/lib/services/create-job';
import type { Result } from '@/lib/services/result';

export const password = 'a long enough password';

export interface Office {
  id: string;
  authorityId: string;
  people: Record<'administrator' | 'engineer' | 'checker' | 'engineerOfRecord', Actor>;
}

/** An invented office of its own for each test, so that tests do not meet. */
export async function makeOffice(): Promise<Office> {
  const id = randomUUID();
  await database()('offices').insert({ id, name: `Office ${id.slice(0, 4)}`, zone: 'UTC' });
  const passwordHash = await hash(password, { memoryCost: 1024, timeCost: 1 });
  const person = async (name: string, initials: string, roles: Role[]): Promise<Actor> => {
    const personId = randomUUID();
    const email = `${personId}@office.example`;
    await insertPerson(database(), id, { id: personId, email, name, initials, roles, passwordHash });
    return { personId, officeId: id, officeName: 'Office', zone: 'UTC', roles, name, initials, email };
  };
  const authorityId = randomUUID();
  await insertAuthority(database(), {
    id: authorityId,
    office_id: id,
    name: 'Invented Authority',
    decisions: ['Approved', 'Revise and Resubmit'],
    reviewer: 'R. Viewer',
    email: 'reviewer@authority.example',
  });
  const people = {
    administrator: await person('Ada Min', 'AM', ['administrator']),
    engineer: await person('Eno Gin', 'EG', ['engineer']),
    checker: await person('Che Ker', 'CK', ['checker']),
    engineerOfRecord: await person('Tomas Lindqvist', 'TL', ['engineer', 'engineer-of-record']),
  };
  await insertLicence(database(), {
    id: randomUUID(),
    office_id: id,
    person_id: people.engineerOfRecord.personId,
    jurisdiction: 'Orrin',
    profession: 'Structural Engineer',
    number: 'SE 20417',
    expires: new Date('2030-01-01'),
  });
  return { id, authorityId, people };
}

export async function makeJob(office: Office, number = '26-001'): Promise<string> {
  const made = await createJob(office.people.engineer, {
    number,
    title: 'Invented Hall',
    place: '',
    units: 'SI',
    pageSize: 'A4',
    jurisdiction: 'Orrin',
    authorityId: office.authorityId,
    codes: '',
  });
  return need(made).id;
}

/** The value of a result that must be good. */
export function need<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(result.errors.map((e) => `${e.path}: ${e.message}`).join('; '));
  return result.value;
}
