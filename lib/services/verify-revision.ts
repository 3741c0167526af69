// server only
import { database } from '@/db/connection';
import { revisionById } from '@/db/queries/revisions';
import type { Actor } from './actor';
import { everyone, requireRole } from './require-role';
import { revisionDigest } from './revision-digest';
import { NotFound } from './service-error';

/** Whether what is stored of a revision still has the digest it was frozen with. */
export async function verifyRevision(actor: Actor, revisionId: string): Promise<boolean> {
  requireRole(actor, ...everyone);
  const r = await revisionById(database(), actor.officeId, revisionId);
  if (!r) throw new NotFound(`revision ${revisionId}`);
  return r.digest === revisionDigest(r);
}
