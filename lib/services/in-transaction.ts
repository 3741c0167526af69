// server only
import type { Knex } from 'knex';
import { database } from '@/db/connection';
import { insertAudit, takeHead } from '@/db/queries/audit';
import { auditHash } from './audit-hash';
import { done, mend, type Result } from './result';
import { Refused } from './service-error';

/** Who the entries are by: a person of the office, or a reviewer with a link. */
export interface Author {
  officeId: string;
  name: string;
  personId?: string;
}

export interface About {
  digest?: string;
  jobId?: string;
  /** Id of the sheet, submittal, check or person that the entry is about. */
  aboutId?: string;
}

export type Record = (verb: string, subject: string, about?: About) => Promise<void>;

const triesAfterDeadlock = 6;

/**
 * Runs a verb in one transaction with its audit row. Each row is bound to the one before it in the office by its hash;
 * a verb that records nothing is undone, and so is one that refuses. A deadlock undoes the whole verb, which then runs
 * again; `work` must therefore touch nothing but the transaction. Isolation is "read committed": what is read after a lock
 * was taken is what stands there, not what stood there when the transaction began.
 */
export async function inTransaction<T>(
  who: Author,
  work: (trx: Knex.Transaction, record: Record) => Promise<T>,
): Promise<Result<T>> {
  for (let tries = 1; ; tries++) {
    try {
      const value = await database().transaction((trx) => runRecorded(trx, who, work), {
        isolationLevel: 'read committed',
      });
      return done(value);
    } catch (error) {
      if (error instanceof Refused) return mend(error.code, error.path, error.message);
      if (!isDeadlock(error) || tries === triesAfterDeadlock) throw error;
      await new Promise((resolve) => setTimeout(resolve, Math.random() * 20 * tries));
    }
  }
}

async function runRecorded<T>(
  trx: Knex.Transaction,
  who: Author,
  work: (trx: Knex.Transaction, record: Record) => Promise<T>,
): Promise<T> {
  let recorded = 0;
  const record: Record = async (verb, subject, about = {}) => {
    const row = {
      office_id: who.officeId,
      at: new Date(),
      person: who.name,
      person_id: who.personId ?? null,
      verb,
      subject,
      digest: about.digest ?? null,
      job_id: about.jobId ?? null,
      about_id: about.aboutId ?? null,
      before_hash: await takeHead(trx, who.officeId),
    };
    await insertAudit(trx, { ...row, hash: auditHash(row) });
    recorded++;
  };
  const value = await work(trx, record);
  if (recorded === 0) throw new Error('a transaction left no audit row');
  return value;
}

function isDeadlock(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'ER_LOCK_DEADLOCK';
}
