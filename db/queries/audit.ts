// server only
import type { Knex } from 'knex';

export interface AuditRow {
  office_id: string;
  at: Date;
  person: string;
  person_id: string | null;
  verb: string;
  subject: string;
  digest: string | null;
  job_id: string | null;
  about_id: string | null;
  before_hash: string;
  hash: string;
}

export const firstHash = '0'.repeat(64);

/** Hash that the next entry of the office is bound to; other writers of the office wait until this transaction ends. */
export async function takeHead(trx: Knex.Transaction, officeId: string): Promise<string> {
  const head = await trx('audit_heads').where({ office_id: officeId }).forUpdate().first('hash');
  if (head) return String(head.hash);
  await trx('audit_heads').insert({ office_id: officeId, hash: firstHash }).onConflict('office_id').ignore();
  const made = await trx('audit_heads').where({ office_id: officeId }).forUpdate().first('hash');
  return String(made?.hash);
}

/** Adds an entry under the lock of `takeHead`. */
export async function insertAudit(trx: Knex.Transaction, row: AuditRow): Promise<void> {
  await trx('audit').insert(row);
  await trx('audit_heads').where({ office_id: row.office_id }).update({ hash: row.hash });
}

export interface AuditFilter {
  jobId?: string;
  aboutId?: string;
  personId?: string;
  /** Leaves out the drafts that are kept while someone types. */
  withoutDrafts?: boolean;
}

/** Entries of the office, newest first, of one job, thing or person if asked. */
export async function findAudit(
  db: Knex,
  officeId: string,
  filter: AuditFilter,
  page: { size: number; offset: number },
): Promise<AuditRow[]> {
  const query = db('audit').where({ office_id: officeId });
  if (filter.jobId) query.where({ job_id: filter.jobId });
  if (filter.aboutId) query.where({ about_id: filter.aboutId });
  if (filter.personId) query.where({ person_id: filter.personId });
  if (filter.withoutDrafts) query.whereNot({ verb: 'kept' });
  return query.orderBy('id', 'desc').limit(page.size).offset(page.offset);
}

/** The next entries of the office in the order they were made, after the entry with id `after`. */
export async function auditAfter(
  db: Knex,
  officeId: string,
  after: string | number,
  size: number,
): Promise<(AuditRow & { id: string | number })[]> {
  return db('audit').where({ office_id: officeId }).where('id', '>', after).orderBy('id').limit(size);
}

export async function auditHead(db: Knex, officeId: string): Promise<string | undefined> {
  const head = await db('audit_heads').where({ office_id: officeId }).first('hash');
  return head ? String(head.hash) : undefined;
}
