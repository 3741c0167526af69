// server only
import type { Knex } from 'knex';

export async function insertOneTimeToken(
  trx: Knex,
  row: { id: string; office_id: string; person_id: string; purpose: string; expires_at: Date },
): Promise<void> {
  await trx('one_time_tokens').insert(row);
}

/** Whom a token is for, whether or not it was used. */
export async function oneTimeToken(
  db: Knex,
  id: string,
  purpose: string,
): Promise<{ office_id: string; person_id: string; name: string } | undefined> {
  return db('one_time_tokens as t')
    .join('people as p', 'p.id', 't.person_id')
    .where({ 't.id': id, 't.purpose': purpose })
    .first('t.office_id', 't.person_id', 'p.name');
}

/** Uses a token up: of several that come at once, one gets it. Every other token of the person ends with it. */
export async function takeOneTimeToken(
  trx: Knex,
  officeId: string,
  id: string,
  personId: string,
  now: Date,
): Promise<boolean> {
  const taken = await trx('one_time_tokens')
    .where({ id, office_id: officeId })
    .whereNull('used_at')
    .where('expires_at', '>', now)
    .update({ used_at: now });
  if (taken !== 1) return false;
  await trx('one_time_tokens')
    .where({ office_id: officeId, person_id: personId })
    .whereNull('used_at')
    .update({ used_at: now });
  return true;
}
