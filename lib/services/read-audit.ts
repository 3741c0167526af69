// server only
import { z } from 'zod';
import { database } from '@/db/connection';
import { findAudit } from '@/db/queries/audit';
import type { Actor } from './actor';
import { everyone, requireRole } from './require-role';

const input = z.object({
  jobId: z.string().max(36).optional(),
  aboutId: z.string().max(64).optional(),
  personId: z.string().max(36).optional(),
  page: z.coerce.number().int().min(1).max(100_000).catch(1),
});

const size = 50;

/** The record, newest first: of the office, of one job, of one sheet or submittal, or of one person. */
export async function readAudit(actor: Actor, raw: unknown) {
  requireRole(actor, ...everyone);
  const { page, ...filter } = input.parse(raw);
  const rows = await findAudit(database(), actor.officeId, filter, { size, offset: (page - 1) * size });
  return rows.map((r) => ({
    at: r.at,
    person: r.person,
    verb: r.verb,
    subject: r.subject,
    digest: r.digest,
    hash: r.hash,
  }));
}
