// server only
import { createHash } from 'node:crypto';
import type { AuditRow } from '@/db/queries/audit';

/** SHA-256 over the row and the hash of the row before it. */
export function auditHash(row: Omit<AuditRow, 'hash'>): string {
  const text = JSON.stringify([
    row.before_hash,
    row.office_id,
    row.at.toISOString(),
    row.person,
    row.person_id,
    row.verb,
    row.subject,
    row.digest,
    row.job_id,
    row.about_id,
  ]);
  return createHash('sha256').update(text).digest('hex');
}
