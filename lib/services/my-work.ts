// server only
import { database } from '@/db/connection';
import { openChecksOf } from '@/db/queries/checks';
import type { Actor } from './actor';
import { everyone, requireRole } from './require-role';
import { sheetName } from './sheet-state';

/** What waits on this person. */
export async function myWork(actor: Actor): Promise<{ text: string; href: string; job: string }[]> {
  requireRole(actor, ...everyone);
  const checks = await openChecksOf(database(), actor.officeId, actor.personId);
  return checks.map((c) => ({
    text: `Check ${sheetName(c.number)} ${c.title}`,
    href: `/jobs/${c.job_id}/checks/${c.id}`,
    job: c.job_title,
  }));
}
