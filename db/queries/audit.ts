// server only
import type { Knex } from 'knex';

export interface AuditRow {
  office_id: string;
  at: Date;
  person: string;
  verb: string;
  subject: string;
  digest: string | null;
  before_hash: string;
  hash: string;
}

/** Hash of the office's last row. The office's own row is locked, so that entries form one chain. */
export async function lastHash(trx: Knex.Transaction, officeId: string): Promise<string> {
  await trx('offices').where({ id: officeId }).forUpdate().first('id');
  const row = await trx('audit').where({ office_id: officeId }).orderBy('id', 'desc').first('hash');
  return row ? String(row.hash) : '0'.repeat(64);
}

export async function insertAudit(trx: Knex.Transaction, row: AuditRow): Promise<void> {
  await trx('audit').insert(row);
}

export async function auditRows(db: Knex, officeId: string): Promise<AuditRow[]> {
  return db('audit').where({ office_id: officeId }).orderBy('id');
}
