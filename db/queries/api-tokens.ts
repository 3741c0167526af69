// server only
import type { Knex } from 'knex';

export interface ApiTokenRow {
  id: string;
  office_id: string;
  person_id: string;
  name: string;
  made_at: Date;
  expires_at: Date;
  revoked_at: Date | null;
}

export async function insertApiToken(trx: Knex, row: ApiTokenRow): Promise<void> {
  await trx('api_tokens').insert(row);
}

/** The person a token stands for, while it is in force. */
export async function personOfApiToken(db: Knex, id: string, now: Date): Promise<string | undefined> {
  const row = await db('api_tokens')
    .where({ id })
    .whereNull('revoked_at')
    .where('expires_at', '>', now)
    .first('person_id');
  return row ? String(row.person_id) : undefined;
}

export async function apiTokensOf(db: Knex, officeId: string, personId: string): Promise<ApiTokenRow[]> {
  return db('api_tokens').where({ office_id: officeId, person_id: personId }).orderBy('made_at');
}

export async function revokeApiToken(
  trx: Knex,
  officeId: string,
  personId: string,
  id: string,
  at: Date,
): Promise<number> {
  return trx('api_tokens')
    .where({ office_id: officeId, person_id: personId, id })
    .whereNull('revoked_at')
    .update({ revoked_at: at });
}
