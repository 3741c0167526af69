// server only
import type { Knex } from 'knex';

export interface SecondFactorRow {
  person_id: string;
  office_id: string;
  /** Base32, as the person's device holds it. */
  secret: string;
  /** Null while the person has not shown that the device gives the right codes. */
  confirmed_at: Date | null;
  /** Time step of the last code that was taken; none is taken twice. */
  last_step: number;
}

export async function secondFactorOf(
  db: Knex,
  officeId: string,
  personId: string,
  lock = false,
): Promise<SecondFactorRow | undefined> {
  const query = db('second_factors').where({ office_id: officeId, person_id: personId });
  const row = await (lock ? query.forUpdate() : query).first();
  return row && { ...row, last_step: Number(row.last_step) };
}

/** People of the office whose second factor is confirmed. */
export async function peopleWithSecondFactor(db: Knex, officeId: string): Promise<string[]> {
  return db('second_factors').where({ office_id: officeId }).whereNotNull('confirmed_at').pluck('person_id');
}

export async function putSecondFactor(trx: Knex, row: SecondFactorRow): Promise<void> {
  await trx('second_factors').insert(row).onConflict('person_id').merge();
}

export async function removeSecondFactor(trx: Knex, officeId: string, personId: string): Promise<number> {
  await trx('recovery_codes').where({ office_id: officeId, person_id: personId }).delete();
  return trx('second_factors').where({ office_id: officeId, person_id: personId }).delete();
}

export async function insertRecoveryCodes(
  trx: Knex,
  officeId: string,
  personId: string,
  hashes: readonly string[],
): Promise<void> {
  await trx('recovery_codes').where({ office_id: officeId, person_id: personId }).delete();
  await trx('recovery_codes').insert(hashes.map((id) => ({ id, office_id: officeId, person_id: personId })));
}

/** Uses a recovery code up; of two that come at once, one gets it. */
export async function takeRecoveryCode(
  trx: Knex,
  officeId: string,
  personId: string,
  hash: string,
  at: Date,
): Promise<boolean> {
  const taken = await trx('recovery_codes')
    .where({ id: hash, office_id: officeId, person_id: personId })
    .whereNull('used_at')
    .update({ used_at: at });
  return taken === 1;
}

export async function countRecoveryCodes(db: Knex, officeId: string, personId: string): Promise<number> {
  const row = await db('recovery_codes')
    .where({ office_id: officeId, person_id: personId })
    .whereNull('used_at')
    .count({ n: '*' })
    .first();
  return Number(row?.n);
}
