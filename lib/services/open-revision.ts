// server only
import { database } from '@/db/connection';
import type { Actor } from './actor';
import { readRevision } from './read-revision';
import { everyone, requireRole } from './require-role';
import { requireSeen } from './require-seen';

/** A frozen revision, its check and marks; not for a checker who works without it. */
export async function openRevision(actor: Actor, revisionId: string) {
  requireRole(actor, ...everyone);
  const opened = await readRevision(actor, revisionId);
  await requireSeen(database(), actor, [opened.revision.sheetId]);
  return opened;
}
