// server only
import { database } from '@/db/connection';
import { auditAfter, auditHead, firstHash } from '@/db/queries/audit';
import type { Actor } from './actor';
import { auditHash } from './audit-hash';
import { allowAttempt, tooOften } from './limit-attempts';
import { everyone, requireRole } from './require-role';
import { done, mend, type Result } from './result';

export interface AuditReport {
  entries: number;
  /** Place, from 0, of the first entry that does not follow from the one before it; the count when the end is missing. */
  broken: number | undefined;
}

const perQuarterHour = 30;

/** Walks the office's record from its first entry to its end. */
export async function verifyAudit(actor: Actor): Promise<Result<AuditReport>> {
  requireRole(actor, ...everyone);
  if (!(await allowAttempt(`verify:${actor.officeId}`, perQuarterHour)))
    return mend('too-often', '', tooOften);
  return done(await walkAudit(actor.officeId));
}

/** A thousand entries at a time. */
export async function walkAudit(officeId: string): Promise<AuditReport> {
  let before = firstHash;
  let entries = 0;
  let broken: number | undefined;
  for (let after: string | number = 0; ; ) {
    const rows = await auditAfter(database(), officeId, after, 1000);
    for (const row of rows) {
      if (broken === undefined && (row.before_hash !== before || row.hash !== auditHash(row)))
        broken = entries;
      before = row.hash;
      entries++;
    }
    const last = rows.at(-1);
    if (!last) break;
    after = last.id;
  }
  const head = await auditHead(database(), officeId);
  if (broken === undefined && entries > 0 && head !== before) broken = entries;
  return { entries, broken };
}
