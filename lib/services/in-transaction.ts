// server only
import { createHash } from 'node:crypto';
import type { Knex } from 'knex';
import { database } from '@/db/connection';
import { insertAudit, lastHash } from '@/db/queries/audit';

export type Record = (verb: string, subject: string, digest?: string) => Promise<void>;

/**
 * Runs a verb in one transaction with its audit row. Each row is bound to the one before it in the office by its hash;
 * a verb that records nothing is undone.
 */
export async function inTransaction<T>(
  who: { officeId: string; person: string },
  work: (trx: Knex.Transaction, record: Record) => Promise<T>,
): Promise<T> {
  return database().transaction(async (trx) => {
    let recorded = 0;
    const record: Record = async (verb, subject, digest) => {
      const before = await lastHash(trx, who.officeId);
      const at = new Date();
      const row = {
        office_id: who.officeId,
        at,
        person: who.person,
        verb,
        subject,
        digest: digest ?? null,
        before_hash: before,
      };
      await insertAudit(trx, { ...row, hash: auditHash(row) });
      recorded++;
    };
    const value = await work(trx, record);
    if (recorded === 0) throw new Error('a transaction left no audit row');
    return value;
  });
}

/** SHA-256 over the row and the hash of the row before it. */
export function auditHash(row: {
  office_id: string;
  at: Date;
  person: string;
  verb: string;
  subject: string;
  digest: string | null;
  before_hash: string;
}): string {
  const text = [
    row.before_hash,
    row.office_id,
    row.at.toISOString(),
    row.person,
    row.verb,
    row.subject,
    row.digest ?? '',
  ].join('\n');
  return createHash('sha256').update(text).digest('hex');
}
