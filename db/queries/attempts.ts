// server only
import type { Knex } from 'knex';

export async function countAttempts(db: Knex, subject: string, since: Date): Promise<number> {
  const row = await db('attempts').where({ subject }).where('at', '>', since).count({ n: '*' }).first();
  return Number(row?.n);
}

export async function forgetAttempts(db: Knex, subject: string): Promise<void> {
  await db('attempts').where({ subject }).delete();
}

export async function insertAttempt(db: Knex, subject: string, at: Date): Promise<void> {
  await db('attempts').insert({ subject, at });
}
