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
