// server only
import type { Knex } from 'knex';

export async function insertOffice(
  db: Knex,
  office: { id: string; name: string; zone: string },
): Promise<void> {
  await db('offices').insert(office);
}

export async function anyOffice(db: Knex): Promise<boolean> {
  return (await db('offices').first('id')) !== undefined;
}

export interface OfficeRow {
  id: string;
  name: string;
  zone: string;
  /** Days after which something that waits is called late. */
  late_after: number;
  /** Whether only a person with a second factor seals. */
  seal_needs_second: boolean | number;
}

export async function officeById(db: Knex, id: string): Promise<OfficeRow | undefined> {
  return db('offices').where({ id }).first();
}

export async function changeOffice(
  trx: Knex,
  id: string,
  change: Partial<Omit<OfficeRow, 'id'>>,
): Promise<void> {
  await trx('offices').where({ id }).update(change);
}
