// server only
import type { Knex } from 'knex';

export async function insertOneTimeToken(
  trx: Knex,
  row: { id: string; office_id: string; person_id: string; purpose: string; expires_at: Date },
): Promise<void> {
  await trx('one_time_tokens').insert(row);
}

/** Uses a token up: of several that come at once, one gets it. */
export async function takeOneTimeToken(
  db: Knex,
  id: string,
  purpose: string,
  now: Date,
): Promise<{ office_id: string; person_id: string; name: string } | undefined> {
  const taken = await db('one_time_tokens')
    .where({ id, purpose })
    .whereNull('used_at')
    .where('expires_at', '>', now)
    .update({ used_at: now });
  if (taken !== 1) return undefined;
  return db('one_time_tokens as t')
    .join('people as p', 'p.id', 't.person_id')
    .where('t.id', id)
    .first('t.office_id', 't.person_id', 'p.name');
}
