// server only
import type { Knex } from 'knex';

export interface PersonRow {
  id: string;
  office_id: string;
  email: string;
  name: string;
  initials: string;
  roles: string[];
  /** Blank for the office's own people. */
  organisation: string;
  password_hash: string | null;
  active: number;
}

export async function personByEmail(db: Knex, email: string): Promise<PersonRow | undefined> {
  return db('people').where({ email }).first();
}

export async function personWithOffice(
  db: Knex,
  id: string,
): Promise<(PersonRow & { office_name: string; zone: string }) | undefined> {
  return db('people as p')
    .join('offices as o', 'o.id', 'p.office_id')
    .where('p.id', id)
    .first('p.*', 'o.name as office_name', 'o.zone');
}

export async function peopleOf(db: Knex, officeId: string): Promise<PersonRow[]> {
  return db('people').where({ office_id: officeId }).orderBy('name');
}

export async function insertPerson(
  db: Knex,
  officeId: string,
  p: { id: string; email: string; name: string; initials: string; roles: string[]; passwordHash?: string },
): Promise<void> {
  await db('people').insert({
    id: p.id,
    office_id: officeId,
    email: p.email,
    name: p.name,
    initials: p.initials,
    roles: JSON.stringify(p.roles),
    password_hash: p.passwordHash ?? null,
  });
}

export async function setPassword(
  db: Knex,
  officeId: string,
  id: string,
  passwordHash: string,
): Promise<void> {
  await db('people').where({ office_id: officeId, id }).update({ password_hash: passwordHash });
}

export interface LicenceRow {
  id: string;
  person_id: string;
  jurisdiction: string;
  profession: string;
  number: string;
  /** The last day on which it is in force, as midnight UTC of that day. */
  expires: Date;
}

/** Licences of the office that were not withdrawn. */
export async function licencesOf(db: Knex, officeId: string): Promise<LicenceRow[]> {
  return db('licences').where({ office_id: officeId }).whereNull('withdrawn_at').orderBy('jurisdiction');
}

export async function withdrawLicence(trx: Knex, officeId: string, id: string, at: Date): Promise<number> {
  return trx('licences')
    .where({ office_id: officeId, id })
    .whereNull('withdrawn_at')
    .update({ withdrawn_at: at });
}

/** People of the office under a lock, so that two changes cannot both leave it without an administrator. */
export async function lockPeople(trx: Knex.Transaction, officeId: string): Promise<PersonRow[]> {
  return trx('people').where({ office_id: officeId }).forUpdate();
}

export async function changePerson(
  trx: Knex,
  officeId: string,
  id: string,
  change: { name: string; initials: string; roles: string[]; organisation?: string; active: boolean },
): Promise<void> {
  await trx('people')
    .where({ office_id: officeId, id })
    .update({ ...change, roles: JSON.stringify(change.roles) });
}

export async function insertLicence(db: Knex, row: LicenceRow & { office_id: string }): Promise<void> {
  await db('licences').insert(row);
}
