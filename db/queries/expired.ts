// server only
import type { Knex } from 'knex';

const day = 86_400_000;

/** Deletes what has done its time and is no part of the record. Answers how many rows went. */
export async function deleteExpired(db: Knex, now: Date): Promise<number> {
  const monthAgo = new Date(now.getTime() - 30 * day);
  const counts = [
    await db('prepared_seals').where('expires_at', '<', now).delete(),
    await db('attempts')
      .where('at', '<', new Date(now.getTime() - day))
      .delete(),
    await db('sessions').where('expires_at', '<', now).delete(),
    await db('one_time_tokens').where('expires_at', '<', monthAgo).delete(),
  ];
  return counts.reduce((a, b) => a + b, 0);
}
