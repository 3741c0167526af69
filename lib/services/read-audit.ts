// server only
import { z } from 'zod';
import { database } from '@/db/connection';
import { findAudit } from '@/db/queries/audit';
import { newestWalk } from '@/db/queries/record-walks';
import type { Actor } from './actor';
import { everyone, requireRole } from './require-role';

const input = z.object({
  jobId: z.string().max(36).optional(),
  aboutId: z.string().max(64).optional(),
  personId: z.string().max(36).optional(),
  withoutDrafts: z.boolean().optional(),
  page: z.coerce.number().int().min(1).max(100_000).catch(1),
});

const size = 50;

/**
 * The record, newest first: of the office, of one job, of one sheet or submittal, or of one person; and what the walk of
 * the last night found.
 */
export async function readAudit(actor: Actor, raw: unknown) {
  requireRole(actor, ...everyone);
  const { page, ...filter } = input.parse(raw);
  const { officeId } = actor;
  const offset = (page - 1) * size;
  const rows = await findAudit(database(), officeId, filter, { size: size + 1, offset });
  return {
    page,
    more: rows.length > size,
    entries: rows.slice(0, size).map((r) => ({
      at: r.at,
      person: r.person,
      verb: r.verb,
      subject: r.subject,
      digest: r.digest,
      hash: r.hash,
    })),
    walked: await newestWalk(database(), officeId),
  };
}
