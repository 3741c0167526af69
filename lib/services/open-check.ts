// server only
import { database } from '@/db/connection';
import { checkById } from '@/db/queries/checks';
import type { Actor } from './actor';
import { openRevision } from './open-revision';
import { everyone, requireRole } from './require-role';
import { NotFound } from './service-error';

/** A check with the revision it is of. */
export async function openCheck(actor: Actor, checkId: string) {
  requireRole(actor, ...everyone);
  const check = await checkById(database(), actor.officeId, checkId);
  if (!check) throw new NotFound(`check ${checkId}`);
  return openRevision(actor, check.revision_id);
}
