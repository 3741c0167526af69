// server only
import { database } from '@/db/connection';
import { auditRows } from '@/db/queries/audit';
import type { Actor } from './actor';
import { auditHash } from './in-transaction';
import { requireRole } from './require-role';

/** Walks the office's record from its first entry; `broken` is the place of the first entry whose hash does not follow. */
export async function verifyAudit(actor: Actor): Promise<{ entries: number; broken: number | undefined }> {
  requireRole(actor, 'administrator');
  const rows = await auditRows(database(), actor.officeId);
  let before = '0'.repeat(64);
  const broken = rows.findIndex((row) => {
    const follows = row.before_hash === before && row.hash === auditHash(row);
    before = row.hash;
    return !follows;
  });
  return { entries: rows.length, broken: broken === -1 ? undefined : broken };
}
